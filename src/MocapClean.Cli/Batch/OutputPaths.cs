namespace MocapClean.Cli.Batch;

/// <summary>Where each output of a take lies, relative to the output folder.</summary>
public static class OutputPaths
{
    /// <summary>The cleaned take.</summary>
    public static string Take(string take) => $"takes/{take}";

    /// <summary>Its keys.</summary>
    public static string Keys(string take) => $"keys/{take}.keys.csv";

    /// <summary>Its diff report as a table.</summary>
    public static string DiffCsv(string take) => $"reports/{take}.diff.csv";

    /// <summary>Its diff report as JSON.</summary>
    public static string DiffJson(string take) => $"reports/{take}.diff.json";

    /// <summary>The folders that hold outputs of takes.</summary>
    public static IReadOnlyList<string> Folders { get; } = ["takes", "keys", "reports"];
}
