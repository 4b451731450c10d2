using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Ingest;

/// <summary>Finds where the delivered time skips, stands still or runs back. Rows of the whole take.</summary>
internal static class ClockFaults
{
    /// <summary>A jump too wild to count frames by, such as a clock that changes to another epoch, is at least this many intervals.</summary>
    private const double WildAbove = 1e6;

    public static ImmutableArray<Finding> Find(Clock clock)
    {
        var found = ImmutableArray.CreateBuilder<Finding>();
        for (var n = 1; n < clock.Length && !clock.IsRegular; n++)
        {
            if (!clock.Rises(n))
            {
                Stands(found, n, clock.Delivered[n] - clock.Delivered[n - 1]);
            }
            else if (clock.Lost(n) is > 0 and var lost)
            {
                found.Add(Row(n, FaultKind.LostFrames, FaultAction.Left, $"{lost} {(lost == 1 ? "frame" : "frames")} lost here") with { Lost = lost });
            }
            else if ((clock.Delivered[n] - clock.Delivered[n - 1]) * clock.Rate > WildAbove)
            {
                found.Add(Row(n, FaultKind.Clock, FaultAction.Flagged, $"time jumps by {clock.Delivered[n] - clock.Delivered[n - 1]:0.###} s"));
            }
        }

        return found.ToImmutable();
    }

    /// <summary>Frames that follow each other in standing or running back are one row.</summary>
    private static void Stands(ImmutableArray<Finding>.Builder found, int n, double spacing)
    {
        var back = spacing < 0;
        if (found.Count > 0 && found[^1] is { Kind: FaultKind.Clock } before && before.Last == n - 1 && !back)
        {
            found[^1] = before with { Last = n };
            return;
        }

        found.Add(Row(n, FaultKind.Clock, FaultAction.Flagged, back ? $"time runs back by {-spacing:0.######} s" : "time stands still"));
    }

    private static Finding Row(int n, FaultKind kind, FaultAction action, string note) =>
        new() { Joint = -1, First = n, Last = n, Kind = kind, Action = action, Note = note };
}
