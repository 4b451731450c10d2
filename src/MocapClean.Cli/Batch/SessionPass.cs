using System.Collections.Immutable;
using System.Diagnostics;
using MocapClean.Cli.Report;
using MocapClean.Cli.Report.Csv;
using MocapClean.Cli.Report.Json;

namespace MocapClean.Cli.Batch;

/// <summary>One pass over a session: the chosen takes are processed, then the reports of the whole session are written.</summary>
/// <param name="output">Where outputs go.</param>
/// <param name="journal">What was finished; null for a dry run.</param>
public sealed class SessionPass(IOutput output, Journal? journal)
{
    /// <summary>Runs a pass.</summary>
    /// <param name="plan">The session.</param>
    /// <param name="chosen">The takes to process, a part of the plan's.</param>
    /// <param name="ended">Told of each take as it ends, on any thread: its summary, and whether an earlier run had done it.</param>
    /// <param name="stop">No further take is begun once this is set.</param>
    /// <exception cref="IOException">A report of the session could not be written.</exception>
    public SessionReport Run(SessionPlan plan, ImmutableArray<PlannedTake> chosen, Action<TakeSummary, bool> ended, CancellationToken stop)
    {
        var (times, start) = (new StageTimes(), Stopwatch.GetTimestamp());
        var runner = new SessionRunner(plan, output, journal, times, ended);
        var now = chosen.Zip(runner.Run(chosen, stop)).ToDictionary(r => r.First.Name, r => r.Second, StringComparer.Ordinal);
        var all = plan.Takes.Select(take =>
        {
            var (summary, stale) = now.GetValueOrDefault(take.Name) is { } done ? (done, false) : runner.Earlier(take);
            return (take, summary, stale);
        }).ToList();
        var leftovers = output is FolderOutput folder ? OutputFolderState.Leftovers(folder, plan, all.Where(t => t.summary?.Failure is not null).Select(t => t.take.Name).ToHashSet(StringComparer.Ordinal)) : [];
        var report = SessionAssembly.Build(plan, all, leftovers);
        output.Write("reshoot.csv", s => ReshootCsv.Write(report, s));
        output.Write("session.json", s => SessionJson.Write(report, s));
        var samples = now.Values.Where(t => t is not null).Sum(t => (long)t!.Joints * t.Frames);
        output.Write("log/timings.json", s => TimingsJson.Write(times, Stopwatch.GetElapsedTime(start).TotalSeconds, samples, s));
        return report;
    }
}
