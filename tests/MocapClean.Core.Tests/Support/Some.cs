using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Tests.Support;

/// <summary>Small takes and tracks whose truth is known.</summary>
internal static class Some
{
    public static JointTrack Track(string name, params Quat[] samples) => new()
    {
        Name = name,
        Delivered = [.. samples],
        Samples = [.. samples],
        States = [.. samples.Select(s => s.IsOrientation ? SampleState.Good : SampleState.Missing)],
    };

    public static Take Take(double rate, params JointTrack[] tracks) => new()
    {
        Name = "some.csv",
        Clock = Clock.Regular(tracks[0].Length, rate),
        Tracks = [.. tracks],
        Space = OrientationSpace.World,
    };

    /// <summary>A steady turn about z, degrees a frame.</summary>
    public static Quat[] Spin(int frames, double degreesAFrame) =>
        [.. Enumerable.Range(0, frames).Select(n => About(0, 0, 1, n * degreesAFrame))];

    public static Quat About(double x, double y, double z, double degrees) =>
        RotationVector.Exp(Angle.FromDegrees(degrees) * new Vec3(x, y, z));

    public static ImmutableArray<Finding> Of(this Take take, FaultKind kind) => [.. take.Findings.Where(f => f.Kind == kind)];
}
