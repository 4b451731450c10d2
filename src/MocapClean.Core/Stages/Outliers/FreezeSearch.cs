using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Finds runs that repeat one sample to the last digit while the joint should move. It should move when the motion into the run and out
/// of it both say so, and when it is found elsewhere at one end of the run: a joint that comes to rest slows down first and goes on from
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

    /// <summary>Increments over which speed is taken: few, since it is the speed at the edge that counts.</summary>
    private const int SpeedSamples = 4;

    /// <summary>All freezes, in order: the samples to doubt and the jump that tells.</summary>
    public List<(int First, int Last, double Turn)> Run()
    {
        var found = new List<(int, int, double)>();
        for (var n = 0; n < path.Length; n++)
        {
            var last = n;
            while (path.IsWhole(last, last + 1) && UpdateRhythm.IsRepeat(path.Samples[last], path.Samples[last + 1]))
            {
                last++;
            }

            if (last - n >= shortest && Frozen(n, last) is var (first, end, turn))
            {
                path.Trusted.AsSpan(first, end - first + 1).Clear();
                found.Add((first, end, turn));
            }

            n = last;
        }

        return found;
    }

    /// <summary>
    /// Which samples of a run of equal ones are frozen: all but the first where the jump comes after them, as a sensor that holds its last
    /// value does; all but the last where it comes before them. Null where it is no freeze.
    /// </summary>
    private (int First, int Last, double Turn)? Frozen(int first, int last)
    {
        var held = CaughtUp(last, Speed(first, -1), Speed(last + 1, 1), last - first);
        var foretold = CaughtUp(first - 1, Speed(first - 1, -1), Speed(last, 1), last - first);
        return held == 0 && foretold == 0 ? null : held >= foretold ? (first + 1, last, held) : (first, last - 1, foretold);
    }

    /// <summary>The jump after a sample where motion on both sides says that the samples should move; 0 otherwise.</summary>
    private double CaughtUp(int n, double before, double after, int count)
    {
        var least = Math.Max(Roundings * path.Rounding, Spreads * noise);
        var turn = path.IsWhole(n, n + 1) ? Angle.Between(path.Samples[n], path.Samples[n + 1]) : 0;
        return Math.Min(before, after) * count > least && turn - Math.Max(before, after) > least ? turn : 0;
    }

    /// <summary>
    /// Turn per sample at a sample, seen from one side and carried on to it with the slowing down seen there; 0 where it comes to rest.
    /// </summary>
    private double Speed(int from, int direction)
    {
        var near = from + (direction * SpeedSamples);
        if (Pace(from, near) is not { } speed)
        {
            return 0;
        }

        var earlier = Pace(near, near + (direction * SpeedSamples)) ?? speed;
        return Math.Max(0, speed - Math.Max(0, (earlier - speed) / 2));
    }

    /// <summary>Mean length of the increments between two samples; null where they are not all there.</summary>
    private double? Pace(int from, int to)
    {
        var (first, last) = (Math.Min(from, to), Math.Max(from, to));
        if (!path.IsWhole(first, last))
        {
            return null;
        }

        var sum = 0.0;
        for (var n = first; n < last; n++)
        {
            sum += Angle.Between(path.Samples[n], path.Samples[n + 1]);
        }

        return sum / (last - first);
    }
}
