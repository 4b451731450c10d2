namespace MocapClean.Core.Orientation;

/// <summary>Spherical linear interpolation at constant speed along the shorter arc. Source: Shoemake 1985.</summary>
public static class Slerp
{
    /// <summary>
    /// The orientation at t in [0, 1] between two unit quaternions; t = 0 gives a, t = 1 gives b on a's side. Where both are exactly
    /// opposite orientations (inner product 0), b's own sign says which way to turn.
    /// </summary>
    public static Quat At(Quat a, Quat b, double t) => AsSigned(a, Quat.Dot(a, b) < 0 ? -b : b, t);

    /// <summary>The same on the sphere of quaternions, where b's sign counts: between a and -a there is no way, and a is given.</summary>
    internal static Quat AsSigned(Quat a, Quat b, double t)
    {
        // Half the angle by atan2 of chord lengths: exact for nearly equal and nearly opposite quaternions.
        var half = 2 * Math.Atan2((b + (-a)).Norm, (b + a).Norm);
        if (half < 1e-9)
        {
            return (((1 - t) * a) + (t * b)).Normalised();
        }

        var s = Math.Sin(half);
        return s < 1e-15 ? a : ((Math.Sin((1 - t) * half) / s) * a) + ((Math.Sin(t * half) / s) * b);
    }
}
