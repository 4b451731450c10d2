using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>A run of samples that are missing or rejected, as long as it goes.</summary>
/// <param name="First">First frame.</param>
/// <param name="Last">Last frame, included.</param>
/// <param name="Obstacle">Why no bridge can stand here whatever the settings, in plain words; empty where one can.</param>
internal readonly record struct OpenRun(int First, int Last, string Obstacle)
{
    /// <summary>Number of frames.</summary>
    public int Count => Last - First + 1;

    /// <summary>All open runs of a track, in order of frames.</summary>
    public static ImmutableArray<OpenRun> Of(JointTrack track)
    {
        var found = ImmutableArray.CreateBuilder<OpenRun>();
        for (var n = 0; n < track.Length; n++)
        {
            if (!IsOpen(track.States[n]))
            {
                continue;
            }

            var first = n;
            while (n + 1 < track.Length && IsOpen(track.States[n + 1]))
            {
                n++;
            }

            found.Add(new OpenRun(first, n, ObstacleOf(track, first, n)));
        }

        return found.ToImmutable();
    }

    /// <summary>A sample that waits for this stage.</summary>
    public static bool IsOpen(SampleState state) => state is SampleState.Missing or SampleState.Rejected;

    /// <summary>A sample that a bridge may lean on.</summary>
    public static bool IsTrusted(SampleState state) => state is SampleState.Good or SampleState.TurnedBack or SampleState.Filled;

    private static string ObstacleOf(JointTrack track, int first, int last)
    {
        if (first == 0 || last == track.Length - 1)
        {
            return first > 0 ? "at the end of the track"
                : last < track.Length - 1 ? "at the start of the track"
                : "nothing in the track is trusted";
        }

        if (!IsTrusted(track.States[first - 1]) || !IsTrusted(track.States[last + 1]))
        {
            return "beside a flagged sample";
        }

        // A break belongs to the frame it stands before, so one at last + 1 parts the run from its right edge.
        var at = track.Breaks.BinarySearch(first);
        at = at < 0 ? ~at : at;
        return at < track.Breaks.Length && track.Breaks[at] <= last + 1 ? "a step or lost time lies in it or at its edge" : "";
    }
}
