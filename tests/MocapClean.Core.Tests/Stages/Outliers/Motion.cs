using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Tests.Stages.Outliers;

/// <summary>Invented motion with known truth, the same on every machine: orientations as functions of time, and a sensor's noise.</summary>
internal static class Motion
{
    /// <summary>A joint that swings about two axes at a few hundred degrees a second.</summary>
    public static Quat Swing(double t) =>
        Turn(0, 0, 1, 50 * Math.Sin(2.1 * t)) * Turn(0.6, 0.8, 0, (35 * Math.Sin((4.3 * t) + 1)) + (8 * Math.Sin(9 * t)));

    /// <summary>Stillness.</summary>
    public static Quat Rest(double t) => Turn(0.3, 0.5, 0.8, 40 + (0 * t));

    /// <summary>
    /// Ten seconds of a stage fight: a guard that sways, blows that stop dead and ring, one that bounces back,
    /// spins of two turns at up to 1930 degrees a second, and a landing.
    /// </summary>
    public static Quat Fight(double t) =>
        Turn(0, 1, 0, 12 * Math.Sin(1.7 * t)) * Turn(0, 0, 1, 720 * (Ease((t - 3.2) / 0.7) - Ease((t - 7.4) / 0.7)))
        * Turn(1, 0, 0, Blow(t - 1) - Blow(t - 2.1) + Blow(t - 5) + (1.4 * Blow(t - 6.2)))
        * Turn(0.6, 0, 0.8, Bounce(t - 2.5) + Landing(t - 8.6));

    /// <summary>A turn by degrees about an axis.</summary>
    public static Quat Turn(double x, double y, double z, double degrees)
    {
        var axis = new Vec3(x, y, z);
        return RotationVector.Exp(Angle.FromDegrees(degrees) / axis.Norm * axis);
    }

    /// <summary>Samples at a rate with white noise, degrees an axis, turned on in the joint's frame.</summary>
    public static Quat[] Sample(Func<double, Quat> motion, double rate, double seconds, double noise = 0.03, uint seed = 7)
    {
        var samples = new Quat[(int)(rate * seconds)];
        for (var n = 0; n < samples.Length; n++)
        {
            var shake = new Vec3(Normal(ref seed), Normal(ref seed), Normal(ref seed));
            samples[n] = motion(n / rate) * RotationVector.Exp(Angle.FromDegrees(noise) * shake);
        }

        return samples;
    }

    /// <summary>A take with these joints; NaN samples are missing.</summary>
    public static Take Take(double rate, params Quat[][] joints) => new()
    {
        Name = "invented.csv",
        Clock = Clock.Regular(joints[0].Length, rate),
        Space = OrientationSpace.World,
        Tracks = [.. joints.Select((samples, j) => Track($"joint-{j}", [.. samples]))],
    };

    private static JointTrack Track(string name, ImmutableArray<Quat> samples) => new()
    {
        Name = name,
        Delivered = samples,
        Samples = samples,
        States = [.. samples.Select(q => q.IsOrientation ? SampleState.Good : SampleState.Missing)],
    };

    /// <summary>80 degrees in 120 ms, faster and faster, stopped dead at 1330 degrees a second, with a ring of 2 degrees; back within 0.6 s.</summary>
    private static double Blow(double t) => (80 * (Strike(t / 0.12) - Ease((t - 0.2) / 0.6))) + Ring(t - 0.12, 2, 14, 0.05);

    /// <summary>A blow that bounces off at once, a third of its speed.</summary>
    private static double Bounce(double t) => (60 * Strike(t / 0.1)) - (20 * Settle((t - 0.1) / 0.1)) - (40 * Ease((t - 0.3) / 0.4));

    private static double Landing(double t) => (25 * Settle(t / 0.08)) + Ring(t, 6, 9, 0.12);

    private static double Strike(double x) => x <= 0 ? 0 : x >= 1 ? 1 : x * x;

    private static double Settle(double x) => x <= 0 ? 0 : 1 - Math.Exp(-3 * x);

    private static double Ring(double t, double size, double hertz, double decay) =>
        t <= 0 ? 0 : size * Math.Sin(2 * Math.PI * hertz * t) * Math.Exp(-t / decay);

    /// <summary>From 0 to 1 with no jerk at either end.</summary>
    private static double Ease(double x)
    {
        var s = Math.Clamp(x, 0, 1);
        return s * s * s * (10 - (15 * s) + (6 * s * s));
    }

    /// <summary>Near enough to normal: the sum of twelve even numbers from a linear congruential generator.</summary>
    private static double Normal(ref uint seed)
    {
        var sum = -6.0;
        for (var i = 0; i < 12; i++)
        {
            seed = (1664525 * seed) + 1013904223;
            sum += seed / 4294967296.0;
        }

        return sum;
    }
}
