using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// A bridge that turns by more than half a turn arrives at the other sign of its right edge. So that the curve goes on without a leap,
/// the signs after it change, and the rows that tell of changed signs with them.
/// </summary>
internal static class SignSettlement
{
    /// <summary>Signs and sign rows after all bridges; the track and findings as they were where no bridge arrived negated.</summary>
    public static JointResult Settle(int joint, JointTrack track, ImmutableArray<Finding> findings, ImmutableArray<SettledRun> runs)
    {
        var turning = runs.Where(r => r.Bridge is { ArrivesNegated: true }).Select(r => r.Run.Last + 1).ToArray();
        if (turning.Length == 0)
        {
            return new JointResult(track, findings);
        }

        var negate = Negated(track, turning);
        var samples = track.Samples.Select((q, n) => negate[n] ? -q : q);
        return new JointResult(track with { Samples = [.. samples] }, Rows(joint, track, findings, negate));
    }

    /// <summary>
    /// Which samples change sign: those after an odd number of turning bridges, or all others where that leaves more as delivered.
    /// </summary>
    private static bool[] Negated(JointTrack track, int[] turning)
    {
        var negate = new bool[track.Length];
        var (at, flip, balance) = (0, false, 0);
        for (var n = 0; n < negate.Length; n++)
        {
            while (at < turning.Length && turning[at] == n)
            {
                (flip, at) = (!flip, at + 1);
            }

            negate[n] = flip;
            balance += !WasDelivered(track, n) ? 0 : IsFlipped(track, n) != flip ? 1 : -1;
        }

        return balance > 0 ? Array.ConvertAll(negate, n => !n) : negate;
    }

    private static bool WasDelivered(JointTrack track, int n) => track.States[n] is not (SampleState.Missing or SampleState.Filled);

    private static bool IsFlipped(JointTrack track, int n) => Quat.Dot(track.Samples[n], track.Delivered[n]) < 0;

    /// <summary>One row for each run of samples whose final sign is not the delivered one, in place of the rows before.</summary>
    private static ImmutableArray<Finding> Rows(int joint, JointTrack track, ImmutableArray<Finding> findings, bool[] negate)
    {
        var rows = findings.RemoveAll(f => f.Kind == FaultKind.SignFlip && f.Action == FaultAction.Flipped).ToBuilder();
        for (var n = 0; n < negate.Length; n++)
        {
            var first = n;
            while (n < negate.Length && WasDelivered(track, n) && IsFlipped(track, n) != negate[n])
            {
                n++;
            }

            if (n > first)
            {
                var (kind, action) = (FaultKind.SignFlip, FaultAction.Flipped);
                rows.Add(new Finding { Joint = joint, First = first, Last = n - 1, Kind = kind, Action = action });
            }
        }

        return [.. rows.OrderBy(f => f.First)];
    }
}
