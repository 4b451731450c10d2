using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// A track as its turns from frame to frame: <c>v[i] = log(q[i]* q[i + 1])</c> in the joint's own frame, in radians for one nominal
/// interval. A turn is known only where both samples are trusted and no break lies between them.
/// </summary>
/// <remarks>
/// Turning the track as a whole leaves the lengths and inner products of these vectors as they are; reversing time negates them
/// and reverses their order.
/// </remarks>
internal sealed class Increments
{
    // How far away a neighbour may be, in multiples of the number asked for: past that, gaps make up most of the neighbourhood.
    private const int Reach = 4;

    private readonly JointTrack track;
    private readonly Clock clock;
    private readonly Vec3[] turns;
    private readonly bool[] measured;
    private readonly bool[] breaks;

    /// <summary>Looks at which turns of a track are known; they are measured where they are asked for.</summary>
    public Increments(JointTrack track, Clock clock)
    {
        var count = Math.Max(0, track.Length - 1);
        (this.track, this.clock) = (track, clock);
        (turns, measured, breaks, Known) = (new Vec3[count], new bool[count], new bool[count], new bool[count]);
        foreach (var b in track.Breaks)
        {
            if (b > 0 && b <= count)
            {
                breaks[b - 1] = true;
            }
        }

        for (var i = 0; i < count; i++)
        {
            Known[i] = !breaks[i] && OpenRun.IsTrusted(track.States[i]) && OpenRun.IsTrusted(track.States[i + 1]);
        }
    }

    /// <summary>Which turns are known.</summary>
    public bool[] Known { get; }

    /// <summary>Length of an interval in nominal intervals; exactly 1 on a regular clock.</summary>
    public double Tick(int i) => clock.IsRegular ? 1 : (clock.Steady[i + 1] - clock.Steady[i]) * clock.Rate;

    /// <summary>
    /// Middle of an interval, in nominal intervals from any origin; whole on a regular clock, so that equal lags are equal numbers.
    /// </summary>
    public double At(int i) => clock.IsRegular ? i : (clock.Steady[i + 1] + clock.Steady[i]) / 2 * clock.Rate;

    /// <summary>A turn in radians a nominal interval; zero where not known.</summary>
    public Vec3 Turn(int i) => Turns(i, i + 1)[0];

    /// <summary>The turns from one interval up to, not including, another.</summary>
    public ReadOnlySpan<Vec3> Turns(int from, int to)
    {
        for (var i = from; i < to; i++)
        {
            if (Known[i] && !measured[i])
            {
                (turns[i], measured[i]) = ((1 / Tick(i)) * RotationVector.From(track.Samples[i], track.Samples[i + 1]), true);
            }
        }

        return turns.AsSpan(from, to - from);
    }

    /// <summary>The interval exists and its turn is known.</summary>
    public bool IsKnown(int i) => i >= 0 && i < Known.Length && Known[i];

    /// <summary>How many turns are known from one interval up to, not including, another.</summary>
    public int CountKnown(int from, int to) => Known.AsSpan(from, to - from).Count(value: true);

    /// <summary>Length of a row of intervals in nominal intervals.</summary>
    public double Elapsed(int first, int count)
    {
        var sum = 0.0;
        for (var i = first; i < first + count; i++)
        {
            sum += Tick(i);
        }

        return sum;
    }

    /// <summary>
    /// The known intervals nearest to a row of intervals, at most so many on either side and none beyond a break, rising.
    /// </summary>
    public int[] Beside(int first, int count, int most)
    {
        var found = new List<int>(2 * most);
        Collect(found, first - 1, -1, most);
        found.Reverse();
        Collect(found, first + count, 1, most);
        return [.. found];
    }

    private void Collect(List<int> found, int edge, int step, int most)
    {
        var enough = found.Count + most;
        for (var i = edge; i >= 0 && i < Known.Length && Math.Abs(i - edge) < Reach * most && found.Count < enough && !breaks[i]; i += step)
        {
            if (Known[i])
            {
                found.Add(i);
            }
        }
    }
}
