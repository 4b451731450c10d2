using System.Text.Json;

namespace MocapClean.Cli.Report.Json;

/// <summary>The session's report as JSON.</summary>
public static class SessionJson
{
    /// <summary>Writes the document to a stream that stays open.</summary>
    public static void Write(SessionReport session, Stream output)
    {
        JsonSerializer.Serialize(output, session, ReportJson.Indented.SessionReport);
        output.Write("\n"u8);
    }
}
