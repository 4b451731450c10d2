using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>Rotation vectors around a centre, where a short stretch of motion is a smooth curve in flat space.</summary>
internal static class Chart
{
    /// <summary>Beyond this angle from its centre a chart is too bent for polynomials, radians.</summary>
    public const double Edge = 2.1;

    /// <summary>
    /// As <see cref="RotationVector.Log"/>, several times as fast for turns below some 28 degrees, to 1e-9 of their size: the series of
    /// asin(s) / s.
    /// </summary>
    public static Vec3 Log(Quat q)
    {
        var s2 = (q.X * q.X) + (q.Y * q.Y) + (q.Z * q.Z);
        if (s2 > 0.06)
        {
            return RotationVector.Log(q);
        }

        var series = 1 + (s2 * ((1.0 / 6) + (s2 * ((3.0 / 40) + (s2 * ((5.0 / 112) + (s2 * ((35.0 / 1152) + (s2 * (63.0 / 2816))))))))));
        return (q.W < 0 ? -2 : 2) * series * q.Vector;
    }

    /// <summary>Half way between two orientations along the shorter arc.</summary>
    public static Quat Middle(Quat a, Quat b) => (Quat.Dot(a, b) < 0 ? a + (-b) : a + b).Normalised();
}
