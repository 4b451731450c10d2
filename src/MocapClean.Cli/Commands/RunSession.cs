using System.Collections.Immutable;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Sources;
using MocapClean.Cli.Report;
using Serilog;

namespace MocapClean.Cli.Commands;

/// <summary>Runs a session for the command line: checks what can be checked before the first take, then processes, then prints.</summary>
internal sealed class RunSession(Terminal terminal)
{
    private static readonly TimeSpan FollowEvery = TimeSpan.FromSeconds(2);

    /// <summary>Runs and returns the exit code.</summary>
    public int Run(string[] paths, RunOptions options)
    {
        try
        {
            var config = Load(paths, options);
            var (plan, notes) = SessionPlanner.Plan(config, options.Workers);
            if (Chosen(plan, options).IsEmpty)
            {
                throw new ConfigException($"--only: no take matches {string.Join(", ", options.Only)}; the session has {plan.Takes.Length}");
            }

            return options.DryRun ? Dry(plan, notes, options) : Wet(config, plan, notes, options);
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

    private static SessionConfig Load(string[] paths, RunOptions options)
    {
        var isConfig = paths.Length == 1 && Path.GetExtension(paths[0]).ToLowerInvariant() is ".yaml" or ".yml";
        if (isConfig && (File.Exists(paths[0]) || Directory.Exists(paths[0]) || !Path.Exists(paths[0])))
        {
            var config = ConfigReader.Load(paths[0]);
            return options.Out is { } folder ? config with { Output = config.Output with { Folder = Path.GetFullPath(folder) } } : config;
        }

        return options.Out is { } output
            ? SessionConfig.ForPaths(paths, output)
            : throw new ConfigException("without a config, --out DIR says where results go");
    }

    private static ImmutableArray<PlannedTake> Chosen(SessionPlan plan, RunOptions options)
    {
        var globs = options.Only.Select(o => new PathGlob(o)).ToList();
        return globs.Count == 0 ? plan.Takes : [.. plan.Takes.Where(t => globs.Any(g => g.Matches(t.Name)))];
    }

    private int Dry(SessionPlan plan, ImmutableArray<string> notes, RunOptions options)
    {
        using var log = terminal.CreateLogger(file: null, options.Quiet);
        using var signals = new Signals();
        var report = Pass(new SessionPass(new DryOutput(), journal: null), plan, notes, options, log, signals);
        RunSummary.Print(terminal, report, "nothing was written (--dry-run)");
        return Code(report, options, signals);
    }

    private int Wet(SessionConfig config, SessionPlan plan, ImmutableArray<string> notes, RunOptions options)
    {
        try
        {
            var output = new FolderOutput(config.OutputFolder);
            Directory.CreateDirectory(output.Place("log"));
            using var held = FolderLock.TryTake(output.Place("log/lock"))
                ?? throw new ConfigException($"output folder '{config.OutputFolder}' is in use by another run");
            OutputFolderState.RemoveUnfinished(output);
            using var log = terminal.CreateLogger(output.Place("log/session.log"), options.Quiet);
            using var journal = Journal.Open(output.Place("log/journal.jsonl"), options.Fresh);
            using var signals = new Signals();
            var session = new SessionPass(output, journal);
            var report = Pass(session, plan, notes, options, log, signals);
            report = options.Follow ? Follow(config, session, report, options, log, signals) : report;
            RunSummary.Print(terminal, report, $"report: {output.Place("session.json")}");
            return Code(report, options, signals);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new ConfigException($"output folder '{config.OutputFolder}' cannot be written: {e.Message}");
        }
    }

    private SessionReport Pass(
        SessionPass session, SessionPlan plan, ImmutableArray<string> notes, RunOptions options, ILogger log, Signals signals)
    {
        foreach (var note in notes)
        {
            log.Warning("{Note}", note);
        }

        var chosen = Chosen(plan, options);
        SessionReport? report = null;
        terminal.WithProgress(chosen.Length, options.Quiet, step => report = session.Run(
            plan, chosen, (summary, kept) => Ended(summary, kept, options, log, step), signals.Stop));
        return report!;
    }

    private void Ended(TakeSummary summary, bool kept, RunOptions options, ILogger log, Action step)
    {
        step();
        if (summary.Failure is { } failure)
        {
            log.Error("{Failure}", failure);
        }
        else if (!options.Quiet)
        {
            foreach (var note in summary.Notes)
            {
                log.Warning("{Take}: {Note}", summary.Take, note);
            }

            terminal.Result(RunSummary.Line(summary, kept));
        }
    }

    /// <summary>Looks again and again for takes that are new or changed and whose size has settled.</summary>
    private SessionReport Follow(SessionConfig config, SessionPass session, SessionReport report, RunOptions options, ILogger log, Signals signals)
    {
        log.Information("following {Takes}; interrupt to end", string.Join(", ", config.Source.Takes));
        var settled = new SettledFiles();
        while (!signals.Stop.WaitHandle.WaitOne(FollowEvery))
        {
            var (plan, _) = SessionPlanner.Plan(config, options.Workers);
            var ready = settled.Ready(Chosen(plan, options));
            if (ready.Length > 0)
            {
                report = session.Run(plan, ready, (summary, kept) => Ended(summary, kept, options, log, () => { }), signals.Stop);
            }
        }

        return report;
    }

    private static int Code(SessionReport report, RunOptions options, Signals signals) => ExitCode.Of(
        report.Takes.Any(t => t.Failure is not null),
        report.Takes.Any(t => t.Verdict == Core.Diff.VerdictNames.Text(Core.Diff.Verdict.Reshoot)),
        options.Strict, signals.Code);
}
