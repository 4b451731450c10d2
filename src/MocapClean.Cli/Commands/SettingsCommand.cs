using System.CommandLine;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Config;

namespace MocapClean.Cli.Commands;

/// <summary><c>mocapclean settings</c>: what is in force and where it came from; the JSON schema; a starter.</summary>
internal static class SettingsCommand
{
    /// <summary>The verb with its options.</summary>
    public static Command Create()
    {
        var config = new Argument<string?>("CONFIG") { Arity = ArgumentArity.ZeroOrOne, Description = "a config (.yaml)" };
        var joint = new Option<string?>("--joint") { HelpName = "NAME", Description = "the settings of one joint" };
        var schema = new Option<bool>("--schema") { Description = "print the JSON schema of configs" };
        var starter = new Option<bool>("--starter") { Description = "print a commented config to start from" };
        PathArguments.RefuseOptions(config);
        var command = new Command("settings", "Prints the effective settings and where each came from.") { config, joint, schema, starter };
        command.Validators.Add(result =>
        {
            if (result.GetValue(config) is null && !result.GetValue(schema) && !result.GetValue(starter))
            {
                result.AddError("settings takes a CONFIG, --schema or --starter");
            }
        });
        command.SetAction(parsed => parsed.GetValue(schema) ? Print(ConfigSchema.Text())
            : parsed.GetValue(starter) ? Print(ConfigStarter.Text())
            : List(parsed.GetValue(config)!, parsed.GetValue(joint)));
        return command;
    }

    private static int Print(string text)
    {
        Console.Out.Write(text);
        return ExitCode.Done;
    }

    private static int List(string path, string? joint)
    {
        try
        {
            var config = ConfigReader.Load(path);
            var rows = joint is null ? SettingsListing.ForSession(config) : SettingsListing.ForJoint(config, joint);
            var (key, value) = (rows.Max(r => r.Key.Length), rows.Max(r => r.Value.Length));
            foreach (var row in rows)
            {
                Console.Out.WriteLine($"{row.Key.PadRight(key)}  {row.Value.PadRight(Math.Min(value, 40))}  {row.Origin}");
            }

            return ExitCode.Done;
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
}
