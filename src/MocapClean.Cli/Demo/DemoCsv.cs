using CsvHelper;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>Writes an invented take as a wide table, with a carried contact column.</summary>
internal static class DemoCsv
{
    private static readonly CsvWriterOptions Options = new() { NewLine = "\n" };

    public static void Write(DemoTake take, double[] times, Quat[][] tracks, Stream output)
    {
        using var csv = CsvWriter.Create(output, Options, leaveOpen: true);
        csv.WriteHeader([
            "time", .. DemoTakes.Joints.SelectMany(j => new[] { $"{j}.qw", $"{j}.qx", $"{j}.qy", $"{j}.qz" }), "foot_l.contact",
        ]);
        for (var n = 0; n < times.Length; n++)
        {
            csv.WriteField(times[n], "F6");
            foreach (var track in tracks)
            {
                WriteSample(csv, track[n]);
            }

            // Contacts are carried data: invented, one step a second.
            csv.WriteField(n / (int)take.Rate % 2, []);
            csv.EndRecord();
        }
    }

    private static void WriteSample(CsvWriter csv, Quat q)
    {
        foreach (var component in (ReadOnlySpan<double>)[q.W, q.X, q.Y, q.Z])
        {
            if (double.IsNaN(component))
            {
                csv.WriteField("");
            }
            else
            {
                csv.WriteField(component, "F8");
            }
        }
    }
}
