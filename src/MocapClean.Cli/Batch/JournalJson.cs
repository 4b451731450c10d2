using System.Text.Json.Serialization;

namespace MocapClean.Cli.Batch;

/// <summary>How journal lines are written.</summary>
[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower)]
[JsonSerializable(typeof(JournalEntry))]
internal sealed partial class JournalJson : JsonSerializerContext
{
    public static JournalJson OneLine => Default;
}
