using System.Collections.Immutable;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Sources;
using MocapClean.Cli.Report;
using MocapClean.Core.Diff;
using Serilog;

namespace MocapClean.Cli.Commands;

/// <summary>Runs a session for the command line: checks what can be checked before the first take, then processes, then prints.</summary>
internal sealed class RunSession(Terminal terminal, RunOptions options)
{
    private static readonly TimeSpan FollowEvery = TimeSpan.FromSeconds(2);

    /// <summary>Runs and returns the exit code.</summary>
    public int Run(string[] paths)
    {
        try
        {
            var config = Load(paths);
            return options.DryRun ? Dry(config) : Wet(config);
        }
        catch (ConfigException e)
        {
            foreach (var problem in e.Problems)
            {
                Terminal.Error(problem.ToString());
            }

            return ExitCode.Usage;
        }
    }

    private SessionConfig Load(string[] paths)
    {
        if (paths.Length == 1 && Path.GetExtension(paths[0]).ToLowerInvariant() is ".yaml" or ".yml")
        {
            var config = ConfigReader.Load(paths[0]);
            return options.Out is { } folder ? config with { Output = config.Output with { Folder = Path.GetFullPath(folder) } } : config;
        }

        return options.Out is { } output
            ? SessionConfig.ForPaths(paths, output)
            : throw new ConfigException("without a config, --out DIR says where results go");
    }

    private (SessionPlan Plan, ImmutableArray<PlannedTake> Chosen, ImmutableArray<string> Notes) Plan(SessionConfig config)
    {
        var (plan, notes) = SessionPlanner.Plan(config, options.Workers);
        var globs = options.Only.Select(o => new PathGlob(o)).ToList();
        var chosen = globs.Count == 0 ? plan.Takes : [.. plan.Takes.Where(t => globs.Any(g => g.Matches(t.Name)))];
        return chosen.Length > 0
            ? (plan, chosen, notes)
            : throw new ConfigException($"--only: no take matches {string.Join(", ", options.Only)}; the session has {plan.Takes.Length}");
    }

    private int Dry(SessionConfig config)
    {
        var (plan, chosen, notes) = Plan(config);
        using var log = terminal.CreateLogger(file: null, options.Quiet);
        using var signals = new Signals();
        var report = Pass(new SessionPass(new DryOutput(), journal: null), plan, chosen, notes, log, signals);
        RunSummary.Print(terminal, report, "nothing was written (--dry-run)");
        return Code(report, signals);
    }

    private int Wet(SessionConfig config)
    {
        // What is wrong with the takes is said before anything is written; a watch may begin before the first take.
        var first = options.Follow ? default : Plan(config);
        try
        {
            var output = new FolderOutput(config.OutputFolder);
            foreach (var folder in OutputPaths.Folders)
            {
                output.Place($"{folder}/take");
            }

            Directory.CreateDirectory(Path.GetDirectoryName(output.Place("log/lock"))!);
            using var held = FolderLock.TryTake(output.Place("log/lock"))
                ?? throw new ConfigException($"output folder '{config.OutputFolder}' is in use by another run");
            OutputFolderState.RemoveUnfinished(output);
            using var log = terminal.CreateLogger(output.Place("log/session.log"), options.Quiet);
            using var journal = Journal.Open(output.Place("log/journal.jsonl"), options.Fresh);
            using var signals = new Signals();
            var session = new SessionPass(output, journal);
            var report = options.Follow
                ? Follow(config, session, log, signals)
                : Pass(session, first.Plan, first.Chosen, first.Notes, log, signals);
            if (report is null)
            {
                terminal.Result("no take came");
                return signals.Code ?? ExitCode.Done;
            }

            var closing = signals.Code is null ? "" : "interrupted: what was finished stays, the next run does the rest; ";
            RunSummary.Print(terminal, report, $"{closing}report: {output.Place("session.json")}");
            return Code(report, signals);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new ConfigException($"output folder '{config.OutputFolder}' cannot be written: {e.Message}");
        }
    }

    private SessionReport Pass(
        SessionPass session, SessionPlan plan, ImmutableArray<PlannedTake> takes, ImmutableArray<string> notes, ILogger log, Signals signals)
    {
        foreach (var note in notes)
        {
            log.Warning("{Note}", note);
        }

        SessionReport? report = null;
        terminal.WithProgress(takes.Length, options.Quiet, step => report = session.Run(
            plan, takes, (summary, kept) => Ended(summary, kept, log, step), signals.Stop));
        return report!;
    }

    private void Ended(TakeSummary summary, bool kept, ILogger log, Action step)
    {
        step();
        if (summary.Failure is { } failure)
        {
            log.Error("{Failure}", failure);
            return;
        }

        foreach (var note in summary.Notes)
        {
            log.Warning("{Take}: {Note}", summary.Take, note);
        }

        log.Information(
            "{Take} {Verdict} kept {Kept} mended {Mended} missing {Missing} keys {Keys}",
            summary.Take, summary.Verdict, kept, summary.Samples.Mended, summary.Samples.Missing, summary.Keys.Count);
        if (!options.Quiet)
        {
            terminal.Result(RunSummary.Line(summary, kept));
        }
    }

    /// <summary>Looks again and again for takes that are new or changed and whose size has settled; null where none came.</summary>
    private SessionReport? Follow(SessionConfig config, SessionPass session, ILogger log, Signals signals)
    {
        log.Warning("following {Takes}; interrupt to end", string.Join(", ", config.Source.Takes));
        var (settled, report, trouble) = (new SettledFiles(), (SessionReport?)null, "");
        do
        {
            try
            {
                var (plan, chosen, _) = Plan(config);
                var ready = settled.Ready(chosen, plan.SlateTextFor);
                report = ready.Length > 0 ? Pass(session, plan, ready, [], log, signals) : report;
                trouble = "";
            }
            catch (ConfigException e) when (e.Message != trouble)
            {
                // No take yet, a slates file that is being saved, a share that is away: said once, then waited for.
                trouble = e.Message;
                log.Warning("{Trouble}", trouble);
            }
            catch (ConfigException)
            {
                // Said already.
            }
        }
        while (!signals.Stop.WaitHandle.WaitOne(FollowEvery));
        return report;
    }

    private int Code(SessionReport report, Signals signals) => ExitCode.Of(
        report.Takes.Any(t => t.Failure is not null), report.Takes.Any(t => t.Verdict == Verdict.Reshoot.Text()), options.Strict, signals.Code);
}
