using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>Invented motion: slow sway, eased moves from pose to pose with holds, and now and then a fast turn.</summary>
internal static class DemoMotion
{
    /// <summary>Sensor noise about each axis, radians.</summary>
    private static readonly double Noise = Angle.FromDegrees(0.04);

    private static readonly (double Hertz, double Degrees)[] Sways = [(0.17, 14), (0.6, 8), (1.4, 3), (3.1, 0.5)];

    /// <summary>One joint's orientations, with sensor noise.</summary>
    /// <param name="numbers">Where the variety comes from.</param>
    /// <param name="frames">Number of frames.</param>
    /// <param name="rate">Frames per second.</param>
    /// <param name="liveliness">How far and fast: 1 a walk, 3 a fight, 0.1 a rest.</param>
    public static Quat[] Joint(SeededNumbers numbers, int frames, double rate, double liveliness)
    {
        var vectors = new Vec3[frames];
        foreach (var (hertz, degrees) in Sways)
        {
            AddSway(numbers, vectors, rate, hertz, liveliness * degrees);
        }

        AddMoves(numbers, vectors, rate, liveliness);
        var pose = RotationVector.Exp(numbers.Uniform(0, 1.5) * numbers.Direction());
        var track = new Quat[frames];
        for (var n = 0; n < frames; n++)
        {
            var jitter = Noise * new Vec3(numbers.Normal(), numbers.Normal(), numbers.Normal());
            track[n] = (pose * RotationVector.Exp(vectors[n]) * RotationVector.Exp(jitter)).Normalised();
            track[n] = n > 0 && Quat.Dot(track[n], track[n - 1]) < 0 ? -track[n] : track[n];
        }

        return track;
    }

    private static void AddSway(SeededNumbers numbers, Vec3[] vectors, double rate, double hertz, double degrees)
    {
        var size = Angle.FromDegrees(degrees * numbers.Uniform(0.4, 1.2)) * numbers.Direction();
        var (pace, phase) = (2 * Math.PI * hertz * numbers.Uniform(0.7, 1.3) / rate, numbers.Uniform(0, 2 * Math.PI));
        for (var n = 0; n < vectors.Length; n++)
        {
            vectors[n] += Math.Sin((pace * n) + phase) * size;
        }
    }

    private static void AddMoves(SeededNumbers numbers, Vec3[] vectors, double rate, double liveliness)
    {
        var (at, from) = (0, Vec3.Zero);
        while (at < vectors.Length)
        {
            var to = Angle.FromDegrees(numbers.Uniform(5, 40) * liveliness) * numbers.Direction();
            var lasts = Math.Max(2, (int)(rate * numbers.Uniform(0.25, 0.9)));
            var holds = (int)(rate * numbers.Uniform(0, 0.8));
            for (var n = at; n < Math.Min(vectors.Length, at + lasts + holds); n++)
            {
                vectors[n] += from + (Ease((n - at) / (double)lasts) * (to - from));
            }

            (at, from) = (at + lasts + holds, to);
        }
    }

    /// <summary>From 0 to 1 with speed and acceleration 0 at both ends (Perlin's quintic).</summary>
    private static double Ease(double x)
    {
        var t = Math.Clamp(x, 0, 1);
        return t * t * t * ((t * ((6 * t) - 15)) + 10);
    }
}
