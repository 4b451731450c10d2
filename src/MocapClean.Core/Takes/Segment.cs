using System.Collections.Immutable;

namespace MocapClean.Core.Takes;

/// <summary>A run of frames, first and last included.</summary>
public readonly record struct Segment(int First, int Last)
{
    /// <summary>Number of frames.</summary>
    public int Count => Last - First + 1;

    /// <summary>Runs of samples that may be differenced and smoothed: good, filled or turned back, and not across a break.</summary>
    public static ImmutableArray<Segment> Trusted(JointTrack track) =>
        Runs(track, s => s is SampleState.Good or SampleState.Filled or SampleState.TurnedBack);

    /// <summary>Runs of samples that are there at all, and not across a break.</summary>
    public static ImmutableArray<Segment> Present(JointTrack track) => Runs(track, s => s != SampleState.Missing);

    /// <summary>Runs of samples in the given state, not across a break.</summary>
    public static ImmutableArray<Segment> Runs(JointTrack track, Func<SampleState, bool> belongs)
    {
        var found = ImmutableArray.CreateBuilder<Segment>();
        var (first, nextBreak) = (-1, 0);
        for (var n = 0; n < track.Length; n++)
        {
            var breaks = nextBreak < track.Breaks.Length && track.Breaks[nextBreak] == n;
            nextBreak += breaks ? 1 : 0;
            var inside = belongs(track.States[n]);
            if (first >= 0 && (!inside || breaks))
            {
                found.Add(new Segment(first, n - 1));
                first = -1;
            }

            if (inside && first < 0)
            {
                first = n;
            }
        }

        if (first >= 0)
        {
            found.Add(new Segment(first, track.Length - 1));
        }

        return found.ToImmutable();
    }
}
