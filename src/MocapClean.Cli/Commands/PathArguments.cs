using System.CommandLine;

namespace MocapClean.Cli.Commands;

/// <summary>Arguments that are paths: a mistyped option must not pass for one.</summary>
internal static class PathArguments
{
    /// <summary>Adds the check to an argument.</summary>
    public static void RefuseOptions(Argument argument) => argument.Validators.Add(result =>
    {
        foreach (var token in result.Tokens.Where(t => t.Value.StartsWith("--", StringComparison.Ordinal)))
        {
            result.AddError($"unknown option '{token.Value}'");
        }
    });
}
