using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>Suggests what to do with a take, from its findings alone.</summary>
public static class Judge
{
    /// <summary>The judgement on a take.</summary>
    /// <param name="take">The take after all stages.</param>
    /// <param name="action">The frames that count; null for the whole take.</param>
    /// <param name="settings">When a re-shoot is suggested.</param>
    /// <param name="matches">Whether a joint's name matches one of the globs.</param>
    public static Judgement Of(Take take, Segment? action, VerdictSettings settings, Func<string, ImmutableArray<string>, bool> matches)
    {
        var inside = action is { } frames && Meets(frames, take.Length) ? Clip(frames, take.Length) : new Segment(0, take.Length - 1);
        var rows = take.Findings
            .Where(f => f.First <= inside.Last && f.Last >= inside.First)
            .Where(f => f.Joint < 0 || !matches(take.Tracks[f.Joint].Name, settings.Ignore)).ToImmutableArray();
        var bad = BadFrames.Merge(rows, inside);
        var lost = rows.Sum(f => f.Lost);
        var (verdict, reason) = Decide(take, rows, bad.Sum(b => b.Count), lost, inside, settings, matches);
        var windows = verdict >= Verdict.LookFirst ? Windows.Of(take, rows, inside, settings) : [];
        return new Judgement(verdict, reason, windows, bad.Sum(b => b.Count), lost, inside.Count);
    }

    /// <summary>At least one frame of the action lies in the take; an action that does not counts as none.</summary>
    public static bool Meets(Segment action, int frames) => action.First < frames && action.Last >= 0 && action.First <= action.Last;

    private static Segment Clip(Segment action, int frames) =>
        new(Math.Clamp(action.First, 0, frames - 1), Math.Clamp(action.Last, 0, frames - 1));

    private static (Verdict Verdict, string Reason) Decide(
        Take take, ImmutableArray<Finding> rows, int bad, long lost, Segment inside, VerdictSettings settings,
        Func<string, ImmutableArray<string>, bool> matches)
    {
        var share = (bad + lost) / (double)(inside.Count + lost);
        if (share > settings.BadFrames)
        {
            return (Verdict.Reshoot, $"{100 * share:0.##} % of the frames are bad, more than {100 * settings.BadFrames:0.##} %: {Carriers(take, rows)}");
        }

        var critical = take.Tracks.Select((t, j) => (t.Name, Joint: j)).Where(t => matches(t.Name, settings.Critical))
            .Select(t => (t.Name, Bad: BadFrames.Merge(rows.Where(f => f.Joint == t.Joint), inside).Sum(b => b.Count)))
            .Where(t => t.Bad > settings.CriticalFrames).ToList();
        if (critical.Count > 0)
        {
            return (Verdict.Reshoot, "critical joint bad: " + string.Join(", ", critical.Select(c => $"{c.Name} {c.Bad} frames")));
        }

        if (LongGap(take, rows, inside, settings) is { } gap)
        {
            return (Verdict.Reshoot, gap);
        }

        // A take that only lost time, or whose sign was a guess, is looked at as well.
        if (rows.Any(f => f.Action is FaultAction.Flagged or FaultAction.Left))
        {
            return (Verdict.LookFirst, $"flagged or left missing: {Carriers(take, rows)}");
        }

        var mends = rows.Count(f => f.Action is FaultAction.Filled or FaultAction.TurnedBack);
        return mends > 0 ? (Verdict.AcceptWithMends, $"{mends} {(mends == 1 ? "mend" : "mends")}") : (Verdict.Accept, "");
    }

    private static string? LongGap(Take take, ImmutableArray<Finding> rows, Segment inside, VerdictSettings settings)
    {
        var longest = settings.LongestGap.ToFrames(take.Clock.Rate);
        foreach (var f in rows.Where(f => f.Action is FaultAction.Left or FaultAction.Flagged))
        {
            var frames = f.Kind switch
            {
                FaultKind.Gap => Math.Min(f.Last, inside.Last) - Math.Max(f.First, inside.First) + 1,
                FaultKind.LostFrames => f.Lost,
                _ => 0,
            };
            if (frames > longest)
            {
                var where = f.Joint < 0 ? "the whole take" : take.Tracks[f.Joint].Name;
                return $"{FindingWords.Length(frames, take.Clock.Rate)} missing in {where}, longer than the {FindingWords.Length(longest, take.Clock.Rate)} allowed";
            }
        }

        return null;
    }

    /// <summary>The joints that carried the verdict, the worst first, at most five named.</summary>
    private static string Carriers(Take take, ImmutableArray<Finding> rows)
    {
        var carriers = rows.Where(f => f.Action is FaultAction.Flagged or FaultAction.Left).GroupBy(f => f.Joint)
            .Select(g => (Name: g.Key < 0 ? "whole take" : take.Tracks[g.Key].Name, Frames: g.Sum(f => f.Count + f.Lost), Joint: g.Key))
            .OrderByDescending(c => c.Frames).ThenBy(c => c.Joint).ToList();
        var named = string.Join(", ", carriers.Take(5).Select(c => $"{c.Name} {c.Frames}"));
        return carriers.Count > 5 ? $"{named} and {carriers.Count - 5} more joints" : $"{named} {(carriers.Sum(c => c.Frames) == 1 ? "frame" : "frames")}";
    }
}
