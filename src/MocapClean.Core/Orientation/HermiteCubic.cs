namespace MocapClean.Core.Orientation;

/// <summary>
/// Cubic curves of the four components with given tangents at the keys, brought back to length 1. Source: glTF 2.0 specification, appendix
/// C, CUBICSPLINE. Unlike slerp this takes the way that the signs say: neighbouring keys must lie on one side.
/// </summary>
public static class HermiteCubic
{
    /// <summary>The orientation at t in [0, 1] between two keys.</summary>
    /// <param name="a">The key before.</param>
    /// <param name="leaving">The change of the components per second on leaving it.</param>
    /// <param name="b">The key after.</param>
    /// <param name="arriving">The change of the components per second on arriving there.</param>
    /// <param name="seconds">Time from key to key.</param>
    /// <param name="t">Share of that time.</param>
    public static Quat At(Quat a, Quat leaving, Quat b, Quat arriving, double seconds, double t) =>
        t == 0 ? a : t == 1 ? b : Components(a, leaving, b, arriving, seconds, t).Normalised();

    /// <summary>The four components before they are brought to length 1.</summary>
    public static Quat Components(Quat a, Quat leaving, Quat b, Quat arriving, double seconds, double t)
    {
        var (t2, t3) = (t * t, t * t * t);
        return (((2 * t3) - (3 * t2) + 1) * a) + ((seconds * (t3 - (2 * t2) + t)) * leaving)
            + (((3 * t2) - (2 * t3)) * b) + ((seconds * (t3 - t2)) * arriving);
    }
}
