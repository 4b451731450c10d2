using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;

namespace MocapClean.Core.Tests.Invariants;

/// <summary>A generated take of three joints with faults of every kind that a track can have, and the whole flow over it.</summary>
internal static class SpoiltTake
{
    private const int Frames = 900;

    public static Take Make(uint seed)
    {
        var noise = new Noise(seed);
        var (a, b, c) = (Joint(noise, 1), Joint(noise, 0.4), Joint(noise, 2));
        Turn(a, 150, 152, Some.About(1, 0, 0, 40), inRoom: false);
        Clear(a, 400, 412);
        Turn(a, 600, Frames, Some.About(0, 1, 0, 25), inRoom: true);
        Turn(b, 200, 260, Some.About(0, 0.6, 0.8, 30), inRoom: true);
        Clear(b, 500, 501);
        Negate(b, 300, 420);
        Turn(c, 700, 704, Some.About(0, 0, 1, 90), inRoom: false);
        Negate(c, 100, 600);
        Clear(c, 800, 890);
        return Some.Take(120, Some.Track("a", a), Some.Track("b", b), Some.Track("c", c));
    }

    /// <summary>Every stage in order.</summary>
    public static Take Run(Take take, StageSettings? settings = null, int workers = 1)
    {
        var context = StageContext.Uniform(take, settings ?? new StageSettings(), workers);
        return StageCatalog.All.Aggregate(take, (t, entry) => entry.Stage.Run(t, context));
    }

    /// <summary>The same take with every delivered sample changed.</summary>
    public static Take With(this Take take, Func<int, int, Quat, Quat> change) => take with
    {
        Tracks = [.. take.Tracks.Select((t, j) => Some.Track(t.Name, [.. t.Delivered.Select((q, n) => change(j, n, q))]))],
    };

    private static Quat[] Joint(Noise noise, double liveliness)
    {
        var (phase, pace) = (noise.Next() * 3, 1 + (0.3 * noise.Next()));
        var track = new Quat[Frames];
        for (var n = 0; n < Frames; n++)
        {
            var t = n / 120.0 * pace;
            var swing = liveliness * new Vec3(0.8 * Math.Sin((1.9 * t) + phase), 0.5 * Math.Sin((3.1 * t) + 1), 0.3 * Math.Cos(5.3 * t));
            var jitter = 0.0007 * new Vec3(noise.Next(), noise.Next(), noise.Next());
            track[n] = (RotationVector.Exp(swing) * RotationVector.Exp(jitter)).Normalised();
            track[n] = n > 0 && Quat.Dot(track[n], track[n - 1]) < 0 ? -track[n] : track[n];
        }

        return track;
    }

    private static void Turn(Quat[] track, int from, int to, Quat turn, bool inRoom)
    {
        for (var n = from; n < to; n++)
        {
            track[n] = inRoom ? turn * track[n] : track[n] * turn;
        }
    }

    private static void Negate(Quat[] track, int from, int to)
    {
        for (var n = from; n < to; n++)
        {
            track[n] = -track[n];
        }
    }

    private static void Clear(Quat[] track, int from, int to) => track.AsSpan(from, to - from).Fill(Quat.Missing);

    /// <summary>Numbers in [-1, 1] that look random, by a linear congruence (Numerical Recipes' constants, from memory).</summary>
    private sealed class Noise(uint seed)
    {
        private uint state = seed;

        public double Next()
        {
            state = (state * 1664525) + 1013904223;
            return (state / 2147483648.0) - 1;
        }
    }
}
