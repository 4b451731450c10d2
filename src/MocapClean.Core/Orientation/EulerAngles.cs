namespace MocapClean.Core.Orientation;

/// <summary>Three angles in radians, in the order of the axes they turn about: the outermost first. Any number of whole turns.</summary>
public readonly record struct EulerAngles(double First, double Second, double Third)
{
    /// <summary>From degrees.</summary>
    public static EulerAngles FromDegrees(double first, double second, double third) =>
        new(Angle.FromDegrees(first), Angle.FromDegrees(second), Angle.FromDegrees(third));

    /// <summary>The angles in degrees.</summary>
    public (double First, double Second, double Third) ToDegrees() =>
        (Angle.ToDegrees(First), Angle.ToDegrees(Second), Angle.ToDegrees(Third));

    /// <summary>How far apart two triples are: the root of the sum of squared differences, in radians. Not an angle between orientations.</summary>
    public static double Distance(EulerAngles a, EulerAngles b)
    {
        var (x, y, z) = (a.First - b.First, a.Second - b.Second, a.Third - b.Third);
        return Math.Sqrt((x * x) + (y * y) + (z * z));
    }

    /// <summary>The same turns, each angle moved by whole turns to be as near as possible to another triple.</summary>
    public EulerAngles Nearest(EulerAngles other) =>
        new(Angle.Nearest(First, other.First), Angle.Nearest(Second, other.Second), Angle.Nearest(Third, other.Third));
}
