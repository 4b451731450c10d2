namespace MocapClean.Core.Orientation;

/// <summary>
/// The rule that plays keys back as three angles, each along a straight line of its own: what software does that keeps rotation curves as
/// angles. It follows neither the shortest arc nor an even speed.
/// </summary>
public static class EulerLinear
{
    /// <summary>The orientation at t in [0, 1] between two triples, in the given order; whole turns between them are turned.</summary>
    public static Quat At(EulerAngles a, EulerAngles b, double t, EulerOrder order) =>
        Euler.ToQuat(new(Between(a.First, b.First, t), Between(a.Second, b.Second, t), Between(a.Third, b.Third, t)), order);

    private static double Between(double a, double b, double t) => ((1 - t) * a) + (t * b);
}
