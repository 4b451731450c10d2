using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Reduce;

namespace MocapClean.Core.Tests.Stages.Reduce;

/// <summary>
/// A second, slow answer: every pair of frames is played by other formulas than the program's (a share of the rotation vector; the chord
/// as a slerp of another share) and the shortest path is found frame by frame.
/// </summary>
internal sealed class EveryPair(Playback rule, Quat[] samples, double[] times)
{
    public double Error(int first, int last)
    {
        var (a, b) = (samples[first], samples[last]);
        var turn = RotationVector.From(a, b);
        var half = turn.Norm / 2;
        var largest = 0.0;
        for (var n = first + 1; n < last; n++)
        {
            var share = (times[n] - times[first]) / (times[last] - times[first]);
            if (rule == Playback.ComponentLinear && half > 1e-9)
            {
                share = Math.Atan2(share * Math.Sin(half), 1 - share + (share * Math.Cos(half))) / half;
            }

            largest = Math.Max(largest, Angle.Between(a * RotationVector.Exp(share * turn), samples[n]));
        }

        return largest;
    }

    public bool Plays(int first, int last, SpanLimits limits) =>
        last == first + 1 || (times[last] - times[first] <= limits.Longest && Turn(first, last) <= limits.Widest &&
            Error(first, last) <= limits.Tolerance);

    public int Fewest(SpanLimits limits)
    {
        var keys = new int[samples.Length];
        keys[0] = 1;
        for (var last = 1; last < keys.Length; last++)
        {
            keys[last] = Enumerable.Range(0, last).Where(n => keys[n] > 0 && Plays(n, last, limits)).Min(n => keys[n]) + 1;
        }

        return keys[^1];
    }

    /// <summary>Keys by always taking the longest good span.</summary>
    public int Greedy(SpanLimits limits)
    {
        var count = 1;
        for (var at = 0; at < samples.Length - 1; count++)
        {
            at = Enumerable.Range(at + 1, samples.Length - at - 1).Last(n => Plays(at, n, limits));
        }

        return count;
    }

    private double Turn(int first, int last)
    {
        var dot = Quat.Dot(samples[first], samples[last]);
        return 2 * Math.Acos(Math.Clamp(rule == Playback.Slerp ? Math.Abs(dot) : dot, -1, 1));
    }
}
