using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;

namespace MocapClean.Cli.Report.Json;

/// <summary>How our JSON is written: snake case, nulls kept, indented, every letter as itself.</summary>
[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower)]
[JsonSerializable(typeof(SessionReport))]
[JsonSerializable(typeof(DiffDocument))]
[JsonSerializable(typeof(TakeSummary))]
public sealed partial class ReportJson : JsonSerializerContext
{
    /// <summary>For files that a person may open.</summary>
    public static ReportJson Indented { get; } = new(Style());

    private static JsonSerializerOptions Style() => new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        WriteIndented = true,
        NewLine = "\n",
        // These files are never pasted into a page as they are; the pages escape for themselves.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };
}
