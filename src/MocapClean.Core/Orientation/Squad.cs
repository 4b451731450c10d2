namespace MocapClean.Core.Orientation;

/// <summary>
/// A smooth curve through evenly timed orientations: slerp between the slerp of two keys and the slerp of two inner points, so that the
/// turning speed has no jump at a key. Source: Shoemake 1987, where the factors stand in another order.
/// </summary>
public static class Squad
{
    /// <summary>The inner point of a key that has a neighbour on either side: q exp(-(log(q* next) + log(q* previous)) / 4).</summary>
    public static Quat Inner(Quat previous, Quat key, Quat next) =>
        key * RotationVector.Exp(-0.25 * (RotationVector.From(key, next) + RotationVector.From(key, previous)));

    /// <summary>The orientation at t in [0, 1] between two keys with their inner points; the keys must lie on one side of the sphere.</summary>
    public static Quat At(Quat a, Quat innerA, Quat innerB, Quat b, double t) =>
        Slerp.AsSigned(Slerp.AsSigned(a, b, t), Slerp.AsSigned(innerA, innerB, t), 2 * t * (1 - t));
}
