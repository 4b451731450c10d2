using System.Reflection;

namespace MocapClean.Cli.Batch;

/// <summary>The version of this program, as <c>--version</c> prints it.</summary>
public static class ProgramVersion
{
    /// <summary>Such as <c>0.1.0</c>.</summary>
    public static string Text { get; } =
        typeof(ProgramVersion).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "0";
}
