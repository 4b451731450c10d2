using System.Text.Json.Nodes;

namespace MocapClean.Cli.Batch;

/// <summary>Where the time went, for <c>log/timings.json</c>: differs from run to run.</summary>
internal static class TimingsJson
{
    public static void Write(StageTimes times, double elapsedSeconds, long samples, Stream output)
    {
        var parts = new JsonObject();
        foreach (var (part, seconds) in times.Seconds())
        {
            parts[part] = Math.Round(seconds, 3);
        }

        var root = new JsonObject
        {
            ["elapsed_seconds"] = Math.Round(elapsedSeconds, 3),
            ["samples"] = samples,
            ["samples_per_second"] = elapsedSeconds > 0 ? Math.Round(samples / elapsedSeconds) : 0,
            ["seconds_by_part_over_workers"] = parts,
        };
        output.Write(System.Text.Encoding.UTF8.GetBytes(root.ToJsonString(new() { WriteIndented = true, NewLine = "\n" }) + "\n"));
    }
}
