using MocapClean.Core.Orientation;

namespace MocapClean.Core.Tests.Stages.Reduce;

/// <summary>Invented tracks, the same for the same seed.</summary>
internal static class Motions
{
    /// <summary>Angular velocity wanders; <paramref name="jitter"/> is noise in radians an axis.</summary>
    public static Quat[] Wander(int frames, int seed, double pace, double jitter)
    {
        var random = new Random(seed);
        var (q, turning) = (RotationVector.Exp(3 * Noise(random)), Vec3.Zero);
        var samples = new Quat[frames];
        for (var n = 0; n < frames; n++)
        {
            turning = (0.9 * turning) + (pace * Noise(random));
            q = (q * RotationVector.Exp(turning)).Normalised();
            var sample = (q * RotationVector.Exp(jitter * Noise(random))).Normalised();
            samples[n] = n > 0 && Quat.Dot(samples[n - 1], sample) < 0 ? -sample : sample;
        }

        return samples;
    }

    public static double[] Times(int frames, int seed, bool regular)
    {
        var random = new Random(seed);
        var times = new double[frames];
        for (var n = 1; n < frames; n++)
        {
            times[n] = times[n - 1] + (regular ? 1 / 120.0 : 0.004 + (0.01 * random.NextDouble()));
        }

        return times;
    }

    /// <summary>Three normal deviates, by Box and Muller.</summary>
    public static Vec3 Noise(Random random) => new(Normal(random), Normal(random), Normal(random));

    private static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
