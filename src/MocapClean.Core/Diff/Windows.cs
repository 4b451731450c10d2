using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>Merges the bad frames of a take into windows with a lead before and after.</summary>
internal static class Windows
{
    private const int NamedFindings = 4;

    public static ImmutableArray<ReshootWindow> Of(Take take, ImmutableArray<Finding> rows, Segment inside, VerdictSettings settings)
    {
        var before = settings.Before.WholeFrames(take.Clock.Rate);
        var after = settings.After.WholeFrames(take.Clock.Rate);
        var bad = rows.Where(f => BadFrames.Counts(f) || f is { Kind: FaultKind.SignFlip, Action: FaultAction.Flagged }).ToList();
        var spans = Merge(bad.Select(f => new Segment(
            Math.Max(0, f.First - before), Math.Min(take.Length - 1, f.Last + after))));
        return [.. spans.Select(s => Describe(take, s, bad, inside))];
    }

    private static List<Segment> Merge(IEnumerable<Segment> spans)
    {
        var merged = new List<Segment>();
        foreach (var span in spans.OrderBy(s => s.First))
        {
            if (merged.Count > 0 && span.First <= merged[^1].Last + 1)
            {
                merged[^1] = merged[^1] with { Last = Math.Max(merged[^1].Last, span.Last) };
            }
            else
            {
                merged.Add(span);
            }
        }

        return merged;
    }

    private static ReshootWindow Describe(Take take, Segment window, List<Finding> bad, Segment inside)
    {
        var within = bad.Where(f => f.First <= window.Last && f.Last >= window.First).ToList();
        ImmutableArray<string> joints = [.. within.Where(f => f.Joint >= 0).Select(f => f.Joint).Distinct().Order().Select(j => take.Tracks[j].Name)];
        // The same frames in most joints are one event of the take, not one finding a joint.
        var words = within.GroupBy(f => (f.Kind, f.First, f.Last)).SelectMany(g => 2 * g.Count() > take.Tracks.Length && g.Count() > 2
                ? [(Finding: g.First(), Who: $"{g.Count()} joints ")]
                : g.Select(f => (Finding: f, Who: f.Joint < 0 ? "" : take.Tracks[f.Joint].Name + " ")))
            .OrderByDescending(w => w.Finding.Count + w.Finding.Lost).ThenBy(w => w.Finding.First).ThenBy(w => w.Finding.Joint)
            .Select(w => w.Who + FindingWords.What(w.Finding, take.Clock.Rate)).ToList();
        var reason = string.Join("; ", words.Take(NamedFindings)) + (words.Count > NamedFindings ? $"; and {words.Count - NamedFindings} more" : "");
        return new ReshootWindow(window.First, window.Last, joints, reason, BadFrames.Merge(within, inside).Sum(b => b.Count));
    }
}
