namespace MocapClean.Cli.Commands;

/// <summary>A config that would run the takes that were looked at.</summary>
internal static class SuggestedConfig
{
    /// <summary>The text; all takes are read in the same way.</summary>
    public static string For(IReadOnlyList<TakeLook> takes)
    {
        var globs = takes.Select(t => Path.GetFullPath(t.Path)).Distinct(StringComparer.Ordinal).ToList();
        var list = globs.Count == 1 ? $" {Quoted(globs[0])}" : string.Concat(globs.Select(g => $"\n    - {Quoted(g)}"));
        return $"""
            # a config that would run {(takes.Count == 1 ? "it" : "them")}; save it as session.yaml, then: mocapclean run session.yaml
            ingest:
              takes:{list}
            {takes[0].ReadingLines}output:
              folder: cleaned
            """;
    }

    private static string Quoted(string text) => $"\"{text.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("\"", "\\\"", StringComparison.Ordinal)}\"";
}
