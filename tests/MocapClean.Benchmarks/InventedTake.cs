using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Benchmarks;

/// <summary>Invented motion, the same on every machine: slow and quick swings about three axes, pauses, and sensor noise.</summary>
internal static class InventedTake
{
    /// <summary>Frames of a track.</summary>
    public const int Frames = 3000;

    private const double Rate = 120;

    /// <summary>A take of some joints, as it stands after ingest.</summary>
    /// <param name="joints">Number of joints.</param>
    /// <param name="noiseDegrees">Noise of each sample, degrees an axis.</param>
    /// <param name="still">Only noise, no motion.</param>
    public static Take Of(int joints, double noiseDegrees, bool still = false) => new()
    {
        Name = "invented.csv",
        Clock = Clock.Regular(Frames, Rate),
        Space = OrientationSpace.World,
        Tracks = [.. Enumerable.Range(0, joints).Select(j => Track(j, noiseDegrees, still))],
    };

    /// <summary>One track of samples with continuous signs.</summary>
    public static Quat[] Samples(int seed, double noiseDegrees, bool still)
    {
        var random = new Random(seed);
        var phases = Enumerable.Range(0, 9).Select(_ => random.NextDouble() * 2 * Math.PI).ToArray();
        var samples = new Quat[Frames];
        for (var n = 0; n < Frames; n++)
        {
            var t = n / Rate;
            var swing = still ? Vec3.Zero : new Vec3(Swing(t, phases, 0), Swing(t, phases, 3), Swing(t, phases, 6));
            var q = RotationVector.Exp(swing) * RotationVector.Exp(Angle.FromDegrees(noiseDegrees) * Noise(random));
            samples[n] = n > 0 && Quat.Dot(samples[n - 1], q) < 0 ? -q : q;
        }

        return samples;
    }

    private static JointTrack Track(int joint, double noiseDegrees, bool still)
    {
        var samples = ImmutableArray.Create(Samples(joint, noiseDegrees, still));
        return new JointTrack
        {
            Name = $"joint{joint}",
            Delivered = samples,
            Samples = samples,
            States = [.. Enumerable.Repeat(SampleState.Good, Frames)],
        };
    }

    private static double Swing(double t, double[] phases, int at)
    {
        // A pause in every ten seconds: the swing fades out and in.
        var awake = Math.Clamp(4 * Math.Sin(2 * Math.PI * t / 10), 0, 1);
        var slow = 0.6 * Math.Sin((2 * Math.PI * 0.3 * t) + phases[at]);
        var quick = (0.3 * Math.Sin((2 * Math.PI * 0.9 * t) + phases[at + 1])) + (0.1 * Math.Sin((2 * Math.PI * 2.3 * t) + phases[at + 2]));
        return slow + (awake * quick);
    }

    private static Vec3 Noise(Random random) => new(Normal(random), Normal(random), Normal(random));

    private static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
