using CsvHelper;

namespace MocapClean.Cli.Report.Csv;

/// <summary>The re-shoot list: windows of every take that is not accepted, the most urgent take first.</summary>
public static class ReshootCsv
{
    /// <summary>Writes the table to a stream that stays open.</summary>
    public static void Write(SessionReport session, Stream output)
    {
        using var csv = CsvWriter.Create(output, ReportCsv.Options, leaveOpen: true);
        csv.WriteHeader(["take", "verdict", "first_frame", "last_frame", "first_timecode", "last_timecode", "joints", "reason"]);
        foreach (var take in session.MostUrgentFirst())
        {
            foreach (var window in take.Windows)
            {
                csv.WriteField(take.Take);
                csv.WriteField(take.Verdict);
                csv.WriteField(window.FirstFrame, []);
                csv.WriteField(window.LastFrame, []);
                csv.WriteField(window.FirstTimecode);
                csv.WriteField(window.LastTimecode);
                csv.WriteField(string.Join("; ", window.Joints));
                csv.WriteField(window.Reason);
                csv.EndRecord();
            }
        }
    }
}
