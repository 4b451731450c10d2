using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Finds runs that repeat one sample to the last digit while the joint should move. It should move when the motion into the run and out
/// of it both say so, and when it is found elsewhere at the end of the run: a joint that comes to rest slows down first and goes on from
/// where it rested.
/// </summary>
/// <param name="path">The series; frozen runs lose their trust.</param>
/// <param name="shortest">Samples of the shortest freeze.</param>
/// <param name="noise">Robust spread of the length of one sample's noise, radians.</param>
internal sealed class FreezeSearch(MotionPath path, int shortest, double noise)
{
    /// <summary>Motion counts beyond this many times the rounding of the text and spreads of noise.</summary>
    private const double Roundings = 5;
    private const double Spreads = 3;

    /// <summary>Seconds over which speed is taken, and the fewest samples.</summary>
    private const double SpeedSeconds = 0.03;
    private const int SpeedSamples = 4;

    /// <summary>All freezes, in order: the repeats, not the sample that they repeat, and the turn from edge to edge.</summary>
    public List<(int First, int Last, double Turn)> Run()
    {
        var found = new List<(int, int, double)>();
        for (var n = 1; n < path.Length; n++)
        {
            var last = n - 1;
            while (last + 1 < path.Length && path.IsWhole(last, last + 1)
                && SlowUpdate.IsRepeat(path.Samples[last], path.Samples[last + 1]))
            {
                last++;
            }

            if (last - n + 1 >= shortest && Turn(n, last) is var turn && turn > 0)
            {
                path.Trusted.AsSpan(n, last - n + 1).Clear();
                found.Add((n, last, turn));
            }

            n = Math.Max(n, last);
        }

        return found;
    }

    private double Turn(int first, int last)
    {
        if (last + 1 >= path.Length || !path.IsWhole(last, last + 1))
        {
            return 0;
        }

        var least = Math.Max(Roundings * path.Rounding, Spreads * noise);
        var count = last - first + 1;
        var before = Speed(first - 1, -1);
        var after = Speed(last + 1, 1);
        // Against the jump back to the motion, one increment of it is no evidence.
        var turn = Chart.Log(path.Samples[last].Conjugate * path.Samples[last + 1]).Norm;
        var caughtUp = turn - Math.Max(before, after);
        return before * count > least && after * count > least && caughtUp > least ? turn : 0;
    }

    /// <summary>
    /// Turn per sample at a sample, seen from one side and carried on to it with the slowing down seen there; 0 where it comes to rest.
    /// </summary>
    private double Speed(int from, int direction)
    {
        var span = Math.Max(SpeedSamples, (int)Math.Round(SpeedSeconds * path.Rate));
        var (near, far) = (from + (direction * span), from + (2 * direction * span));
        if (!path.IsWhole(Math.Min(from, near), Math.Max(from, near)))
        {
            return 0;
        }

        var speed = Angle.Between(path.Samples[from], path.Samples[near]) / span;
        var earlier = path.IsWhole(Math.Min(near, far), Math.Max(near, far))
            ? Angle.Between(path.Samples[near], path.Samples[far]) / span
            : speed;
        return Math.Max(0, speed - Math.Max(0, (earlier - speed) / 2));
    }
}
