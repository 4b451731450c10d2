using System.CommandLine;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Demo;

namespace MocapClean.Cli.Commands;

/// <summary><c>mocapclean demo</c>: an invented session to try the program on.</summary>
internal static class DemoCommand
{
    /// <summary>The verb with its options.</summary>
    public static Command Create()
    {
        var folder = new Argument<string>("DIR") { Description = "folder to write to; made if it is not there" };
        var seed = new Option<int>("--seed") { HelpName = "N", DefaultValueFactory = _ => 1, Description = "another seed gives another session" };
        PathArguments.RefuseOptions(folder);
        var command = new Command("demo", "Writes an invented session with known faults, its truth and a config.") { folder, seed };
        command.SetAction(parsed => Write(parsed.GetRequiredValue(folder), (ulong)(uint)parsed.GetValue(seed)));
        return command;
    }

    private static int Write(string folder, ulong seed)
    {
        if (Directory.Exists(folder) && Directory.EnumerateFileSystemEntries(folder).Any())
        {
            Terminal.Error($"{folder}: is not empty; demo writes to a new or empty folder");
            return ExitCode.Usage;
        }

        try
        {
            var written = DemoSession.Write(new FolderOutput(folder), seed);
            Console.Out.WriteLine($"{written.Count} files in {folder}; next: mocapclean run {Path.Combine(folder, "session.yaml")}");
            return ExitCode.Done;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            Terminal.Error($"{folder}: cannot be written: {e.Message}");
            return ExitCode.Usage;
        }
    }
}
