using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>Which frames of a take are bad: a joint that counts has a flagged or left row there, or frames are lost.</summary>
public static class BadFrames
{
    /// <summary>
    /// The row makes its frames bad. Flips, mends, lengths, rest poses and smoothing never do: the orientation there is as delivered
    /// or mended.
    /// </summary>
    public static bool Counts(Finding f) => f.Action is FaultAction.Flagged or FaultAction.Left
        && f.Kind is not (FaultKind.SignFlip or FaultKind.OffUnit or FaultKind.RestPose or FaultKind.Smoothing);

    /// <summary>The bad runs of the rows, merged, inside the frames given.</summary>
    public static ImmutableArray<Segment> Merge(IEnumerable<Finding> rows, Segment inside)
    {
        var merged = ImmutableArray.CreateBuilder<Segment>();
        foreach (var row in rows.Where(Counts).OrderBy(f => f.First))
        {
            var (first, last) = (Math.Max(row.First, inside.First), Math.Min(row.Last, inside.Last));
            if (first > last)
            {
                continue;
            }

            if (merged.Count > 0 && first <= merged[^1].Last + 1)
            {
                merged[^1] = merged[^1] with { Last = Math.Max(merged[^1].Last, last) };
            }
            else
            {
                merged.Add(new Segment(first, last));
            }
        }

        return merged.ToImmutable();
    }
}
