namespace MocapClean.Core.Orientation;

/// <summary>Angles: radians inside, degrees at every surface a person sees.</summary>
public static class Angle
{
    /// <summary>Radians from degrees.</summary>
    public static double FromDegrees(double degrees) => degrees * (Math.PI / 180);

    /// <summary>Degrees from radians.</summary>
    public static double ToDegrees(double radians) => radians * (180 / Math.PI);

    /// <summary>The angle moved by whole periods (full turns, where not said) to be as near as possible to another.</summary>
    public static double Nearest(double angle, double other, double period = 2 * Math.PI) =>
        angle + (period * Math.Round((other - angle) / period));

    /// <summary>
    /// The angle of the turn from one orientation to the other, radians in [0, pi]. Signs and lengths do not matter.
    /// By atan2 of the vector part and the inner product, so it is accurate near 0 and near pi alike, where 2 acos(dot) is not.
    /// </summary>
    public static double Between(Quat a, Quat b)
    {
        var x = (a.W * b.X) - (a.X * b.W) - (a.Y * b.Z) + (a.Z * b.Y);
        var y = (a.W * b.Y) - (a.Y * b.W) - (a.Z * b.X) + (a.X * b.Z);
        var z = (a.W * b.Z) - (a.Z * b.W) - (a.X * b.Y) + (a.Y * b.X);
        return 2 * Math.Atan2(Math.Sqrt((x * x) + (y * y) + (z * z)), Math.Abs(Quat.Dot(a, b)));
    }
}
