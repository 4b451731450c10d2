using System.CommandLine;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Formats;

namespace MocapClean.Cli.Commands;

/// <summary><c>mocapclean inspect</c>: what files hold and what looks wrong, before anyone writes a config.</summary>
internal static class InspectCommand
{
    /// <summary>The verb.</summary>
    public static Command Create()
    {
        var files = new Argument<string[]>("FILE") { Arity = ArgumentArity.OneOrMore, Description = "takes" };
        PathArguments.RefuseOptions(files);
        var command = new Command("inspect", "Says what takes hold and what looks wrong, and prints a config that would run them.") { files };
        command.SetAction(parsed => Inspect(parsed.GetRequiredValue(files)));
        return command;
    }

    private static int Inspect(string[] files)
    {
        var wrong = files.Where(f => !File.Exists(f)).ToList();
        if (wrong.Count > 0)
        {
            wrong.ForEach(f => Terminal.Error(Directory.Exists(f) ? $"{f}: is a folder; name takes" : $"{f}: no such file"));
            return ExitCode.Usage;
        }

        var looks = new TakeLook?[files.Length];
        var failures = new string?[files.Length];
        Parallel.For(0, files.Length, i =>
        {
            try
            {
                looks[i] = TakeLook.At(files[i]);
            }
            catch (Exception e)
            {
                failures[i] = e is InputFormatException ? e.Message : $"{files[i]}: not read: {e.Message}";
            }
        });
        for (var i = 0; i < files.Length; i++)
        {
            if (looks[i] is { } look)
            {
                Console.Out.WriteLine(string.Join('\n', look.Lines().Select(l => "# " + l)));
                Console.Out.WriteLine("#");
            }
            else
            {
                Terminal.Error(failures[i]!);
            }
        }

        foreach (var like in looks.OfType<TakeLook>().GroupBy(l => l.ReadingLines))
        {
            Console.Out.WriteLine(SuggestedConfig.For([.. like]) + "\n");
        }

        return failures.Any(f => f is not null) ? ExitCode.TakesFailed : ExitCode.Done;
    }
}
