using System.CommandLine;
using MocapClean.Cli.Batch;

namespace MocapClean.Cli.Commands;

/// <summary>All verbs, and what happens to a line that none of them understands.</summary>
public static class CommandLine
{
    /// <summary>Runs the program.</summary>
    /// <param name="args">Words of the command line.</param>
    /// <returns>The exit code; see <see cref="ExitCode"/>.</returns>
    public static int Run(string[] args)
    {
        var terminal = new Terminal();
        var root = new RootCommand("Cleans the orientation channels of motion-capture takes: finds faults, mends or flags them, smooths, reduces keys, and lists what to shoot again.")
        {
            RunCommand.Create(terminal),
            InspectCommand.Create(),
            DiffCommand.Create(),
            SettingsCommand.Create(),
            DemoCommand.Create(),
        };
        var parsed = root.Parse(args);
        if (parsed.Errors.Count == 0)
        {
            return parsed.Invoke(new InvocationConfiguration { EnableDefaultExceptionHandler = false, ProcessTerminationTimeout = null });
        }

        foreach (var error in parsed.Errors)
        {
            Terminal.Error(error.Message);
        }

        var hint = parsed.CommandResult.Command == root ? "mocapclean --help" : $"mocapclean {parsed.CommandResult.Command.Name} --help";
        Terminal.Error($"See '{hint}'.");
        return ExitCode.Usage;
    }
}
