using System.Reflection;

namespace MocapClean.Cli.Batch;

/// <summary>The version of this program, as <c>--version</c> prints it.</summary>
public static class ProgramVersion
{
    /// <summary>Such as <c>0.1.0</c>.</summary>
    public static string Text { get; } =
        typeof(ProgramVersion).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "0";

    /// <summary>Another text for every build of other sources: what an older build did is done again.</summary>
    public static string Build { get; } =
        $"{Text} {typeof(ProgramVersion).Module.ModuleVersionId} {typeof(Core.Stages.IStage).Module.ModuleVersionId}";
}
