using System.Collections.Immutable;
using MocapClean.Cli.Config;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Report;
using MocapClean.Cli.Report.Csv;
using MocapClean.Cli.Report.Json;
using MocapClean.Core.Diff;
using MocapClean.Core.Stages;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Batch;

/// <summary>The whole flow of one take, from its bytes to its outputs.</summary>
public sealed class TakeJob(SessionPlan plan, IOutput output, StageTimes times)
{
    /// <summary>Reads, cleans, compares, judges and writes a take.</summary>
    /// <param name="source">The take in memory.</param>
    /// <param name="sha256">Its fingerprint.</param>
    /// <param name="workers">Threads that may be used within the take.</param>
    /// <param name="cancel">Ends the work early; nothing half written stays.</param>
    /// <exception cref="InputFormatException">The take cannot be processed.</exception>
    /// <exception cref="IOException">An output could not be written.</exception>
    public TakeOutcome Run(TakeSource source, string sha256, int workers, CancellationToken cancel)
    {
        var file = times.Measure("read", () => Read(source));
        var labels = plan.LabelsFor(file);
        var action = plan.ActionFor(source.Name);
        var take = Clean(file.Take, workers, cancel);
        take = take with { Notes = [.. take.Notes, .. Notes(take, labels, action)] };
        var (keysText, keys) = times.Measure("keys", () => KeysCsv.Replayed(take, SettingsOf(take), labels));
        var diff = times.Measure("diff", () => TakeDiff.Of(take));
        var judgement = Judge.Of(take, action, plan.Verdict, JointGlobs.MatchesAny);
        var report = new TakeReport(take, diff, judgement, labels, keys);
        var summary = TakeSummary.Of(report, sha256);
        return new TakeOutcome(summary, times.Measure("write", () => Write(file, report, summary, keysText)));
    }

    private static IEnumerable<string> Notes(Take take, FrameLabels labels, Segment? action)
    {
        if (labels.Note.Length > 0)
        {
            yield return labels.Note;
        }

        if (action is { } frames && !Judge.Meets(frames, take.Length))
        {
            yield return "the slate's action lies outside the take: the whole take counts";
        }
    }

    private ITakeFile Read(TakeSource source)
    {
        var format = FormatCatalog.For(source.Name)
            ?? throw new InputFormatException(source.Name, "", "an unknown kind of file", $"one of {FormatCatalog.Endings}");
        return format.Read(source, plan.Read);
    }

    private Take Clean(Take take, int workers, CancellationToken cancel)
    {
        var context = new StageContext(SettingsOf(take), workers, cancel);
        foreach (var entry in StageCatalog.All)
        {
            var before = take;
            take = times.Measure(entry.Name, () => entry.Stage.Run(before, context));
        }

        return take;
    }

    private ImmutableArray<StageSettings> SettingsOf(Take take) => [.. take.Tracks.Select(t => plan.SettingsFor(take.Name, t.Name))];

    private ImmutableArray<WrittenFile> Write(ITakeFile file, TakeReport report, TakeSummary summary, byte[] keys)
    {
        var name = report.Take.Name;
        var written = ImmutableArray.CreateBuilder<WrittenFile>();
        void Put(string path, Action<Stream> write) => written.Add(new WrittenFile(path, output.Write(path, write)));

        Put(OutputPaths.Take(name), s => file.Write(report.Take, s));
        if (plan.WriteKeys)
        {
            Put(OutputPaths.Keys(name), s => s.Write(keys));
        }

        Put(OutputPaths.DiffCsv(name), s => DiffCsv.Write(report, s));
        Put(OutputPaths.DiffJson(name), s => DiffDocument.Write(report, summary, s));
        return written.ToImmutable();
    }
}

/// <summary>What came of a take.</summary>
/// <param name="Summary">For the session's reports.</param>
/// <param name="Files">What was written.</param>
public sealed record TakeOutcome(TakeSummary Summary, ImmutableArray<WrittenFile> Files);

/// <summary>A file that was written.</summary>
/// <param name="Path">Relative to the output folder.</param>
/// <param name="Sha256">Lower-case hexadecimal.</param>
public sealed record WrittenFile(string Path, string Sha256);
