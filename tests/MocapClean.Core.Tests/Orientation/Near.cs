using FsCheck;
using FsCheck.Fluent;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

/// <summary>Comparisons of quaternions and vectors within a tolerance, and random orientations.</summary>
internal static class Near
{
    public static void Equal(Quat expected, Quat actual, double tolerance) =>
        Assert.True((expected + (-actual)).Norm <= tolerance, $"expected {expected}, got {actual}");

    public static void Equal(Vec3 expected, Vec3 actual, double tolerance) =>
        Assert.True((expected - actual).Norm <= tolerance, $"expected {expected}, got {actual}");

    public static void SameOrientation(Quat expected, Quat actual, double degrees) =>
        Assert.True(Angle.ToDegrees(Angle.Between(expected, actual)) <= degrees, $"expected {expected}, got {actual}");

    /// <summary>Columns of a matrix given by rows are the images of the unit vectors.</summary>
    public static void Matrix(double[][] rows, Quat q, double tolerance)
    {
        Equal(new Vec3(rows[0][0], rows[1][0], rows[2][0]), q.Rotate(new(1, 0, 0)), tolerance);
        Equal(new Vec3(rows[0][1], rows[1][1], rows[2][1]), q.Rotate(new(0, 1, 0)), tolerance);
        Equal(new Vec3(rows[0][2], rows[1][2], rows[2][2]), q.Rotate(new(0, 0, 1)), tolerance);
    }
}

/// <summary>Generates unit quaternions all over the sphere, round ones such as half turns among them.</summary>
public static class AnyOrientation
{
    public static Arbitrary<Quat> Quats() =>
        Gen.Frequency(
            (3, Gen.Choose(-1000, 1000).Four().Select(t => new Quat(t.Item1, t.Item2, t.Item3, t.Item4))),
            (1, Gen.Choose(-1, 1).Four().Select(t => new Quat(t.Item1, t.Item2, t.Item3, t.Item4))))
        .Where(q => q.IsOrientation).Select(q => q.Normalised()).ToArbitrary();
}
