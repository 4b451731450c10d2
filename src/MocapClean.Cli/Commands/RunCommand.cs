using System.CommandLine;
using MocapClean.Cli.Batch;

namespace MocapClean.Cli.Commands;

/// <summary><c>mocapclean run</c>: cleans a session.</summary>
internal static class RunCommand
{
    private const int MostWorkers = 256;

    /// <summary>The verb with its options.</summary>
    public static Command Create(Terminal terminal)
    {
        var paths = new Argument<string[]>("CONFIG|FOLDER|FILE")
        {
            Arity = ArgumentArity.OneOrMore,
            Description = "a config (.yaml), or folders and files of takes to clean with the defaults",
        };
        var only = new Option<string[]>("--only") { AllowMultipleArgumentsPerToken = false, HelpName = "GLOB", Description = "only takes whose relative path matches; may be repeated" };
        var output = new Option<string?>("--out") { HelpName = "DIR", Description = "output folder; needed without a config" };
        var workers = new Option<int>("--workers") { HelpName = "N", DefaultValueFactory = _ => Environment.ProcessorCount, Description = "takes at the same time" };
        var fresh = new Option<bool>("--fresh") { Description = "do again what an earlier run has done" };
        var follow = new Option<bool>("--follow") { Description = "keep watching for new takes until interrupted" };
        var dryRun = new Option<bool>("--dry-run") { Description = "write nothing; print what a run of all takes would print" };
        var strict = new Option<bool>("--strict") { Description = "end with 3 when a re-shoot is suggested" };
        var quiet = new Option<bool>("--quiet") { Description = "no line for each take, no progress" };
        workers.Validators.Add(r =>
        {
            if (r.Tokens.Count > 0 && (!int.TryParse(r.Tokens[0].Value, out var n) || n is < 1 or > MostWorkers))
            {
                r.AddError($"--workers takes a whole number from 1 to {MostWorkers}");
            }
        });
        PathArguments.RefuseOptions(paths);
        var command = new Command("run", "Cleans a session: cleaned takes, keys, diff reports, the re-shoot list.")
        {
            paths, only, output, workers, fresh, follow, dryRun, strict, quiet,
        };
        command.SetAction(parsed => new RunSession(
            terminal,
            new RunOptions
            {
                Out = parsed.GetValue(output),
                Workers = parsed.GetValue(workers),
                Only = [.. parsed.GetValue(only) ?? []],
                Fresh = parsed.GetValue(fresh),
                Follow = parsed.GetValue(follow),
                DryRun = parsed.GetValue(dryRun),
                Strict = parsed.GetValue(strict),
                Quiet = parsed.GetValue(quiet),
            }).Run(parsed.GetRequiredValue(paths)));
        return command;
    }
}
