using MocapClean.Cli.Report;

namespace MocapClean.Cli.Commands;

/// <summary>What a run prints: a line as each take ends, and at the end what the floor needs.</summary>
internal static class RunSummary
{
    private const int MostWindows = 40;

    /// <summary>Name, verdict, worst finding, time code.</summary>
    public static string Line(TakeSummary take, bool kept)
    {
        var worst = take.WorstFinding.Length > 0 ? $"  {take.WorstFinding}" : "";
        var at = take.WorstTimecode.Length > 0 ? $" at {take.WorstTimecode}" : "";
        return $"{take.Take}  {take.Verdict}{worst}{at}{(kept ? "  (done earlier)" : "")}";
    }

    /// <summary>The re-shoot list, counts of verdicts, what failed, where the report lies.</summary>
    public static void Print(Terminal terminal, SessionReport report, string closing)
    {
        terminal.Result("");
        PrintWindows(terminal, report);
        foreach (var failed in report.Takes.Where(t => t.Failure is not null))
        {
            terminal.Result($"not processed: {failed.Failure}");
        }

        foreach (var unmatched in report.UnmatchedJoints)
        {
            terminal.Result($"mistyped? {unmatched}");
        }

        PrintNames(terminal, "noisier than three times the median joint of their take", NoisyJoints(report));
        PrintNames(terminal, "not run", report.NotRun);
        PrintNames(terminal, "out of date", report.Stale);
        PrintNames(terminal, "left over in the output folder", report.Leftovers);
        var changed = report.Takes.Where(t => t.Failure is null).ToList();
        terminal.Result(
            $"samples: {changed.Sum(t => t.Samples.Identical)} kept to the byte, {changed.Sum(t => t.Samples.Rewritten)} same orientation rewritten, "
            + $"{changed.Sum(t => t.Samples.Smoothed)} smoothed{AtMost(changed)}, "
            + $"{changed.Sum(t => t.Samples.Mended)} mended, {changed.Sum(t => t.Samples.Missing)} missing; {changed.Sum(t => t.Keys.Count)} keys");
        terminal.Result("verdicts: " + string.Join(", ", report.Verdicts.Where(v => v.Takes > 0).Select(v => $"{v.Takes} {v.Verdict}")));
        terminal.Result(closing);
    }

    /// <summary>A joint three times noisier than its siblings is worth a look at its sensor.</summary>
    private static List<string> NoisyJoints(SessionReport report) =>
    [
        .. report.Takes.SelectMany(t =>
        {
            var noises = t.PerJoint.Select(j => j.NoiseDeg ?? 0).Where(n => n > 0).Order().ToList();
            return noises.Count < 3 ? [] : t.PerJoint.Where(j => j.NoiseDeg > 3 * noises[noises.Count / 2]).Select(j => j.Name);
        }).GroupBy(n => n, StringComparer.Ordinal).OrderByDescending(g => g.Count()).ThenBy(g => g.Key, StringComparer.Ordinal)
            .Select(g => $"{g.Key} in {g.Count()} {(g.Count() == 1 ? "take" : "takes")}"),
    ];

    private static string AtMost(List<TakeSummary> takes)
    {
        var largest = takes.Select(t => t.Samples.LargestSmoothingDeg ?? 0).DefaultIfEmpty().Max();
        return largest > 0 ? $" (by at most {largest:0.######} deg)" : "";
    }

    private static void PrintWindows(Terminal terminal, SessionReport report)
    {
        var rows = report.MostUrgentFirst().SelectMany(t => t.Windows.Select(w => (Take: t, Window: w))).ToList();
        if (rows.Count == 0)
        {
            terminal.Result("nothing to shoot again or to look at first");
            return;
        }

        terminal.Result("to shoot again or to look at first (suggestions; for a stunt the coordinator's and the performer's call):");
        var before = "";
        foreach (var (take, w) in rows.Take(MostWindows))
        {
            if (take.Take != before)
            {
                terminal.Result($"  {take.Verdict}  {take.Take}: {take.Reason}");
                before = take.Take;
            }

            var code = w.FirstTimecode.Length > 0 ? $"  {w.FirstTimecode} to {w.LastTimecode}" : "";
            terminal.Result($"    frames {w.FirstFrame} to {w.LastFrame}{code}  {w.Reason}");
        }

        if (rows.Count > MostWindows)
        {
            terminal.Result($"  and {rows.Count - MostWindows} more in reshoot.csv");
        }
    }

    private static void PrintNames(Terminal terminal, string what, IReadOnlyList<string> names)
    {
        if (names.Count > 0)
        {
            terminal.Result($"{what}: {string.Join(", ", names.Take(10))}{(names.Count > 10 ? $" and {names.Count - 10} more" : "")}");
        }
    }
}
