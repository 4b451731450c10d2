using CsvHelper;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report.Csv;

/// <summary>The diff report of a take as a table: one row a finding, and one a smoothed segment after all others.</summary>
public static class DiffCsv
{
    /// <summary>Writes the table to a stream that stays open.</summary>
    public static void Write(TakeReport report, Stream output)
    {
        using var csv = CsvWriter.Create(output, ReportCsv.Options, leaveOpen: true);
        csv.WriteHeader([
            "joint", "first_frame", "last_frame", "kind", "action", "largest_deg", "expected_error_deg", "spreads",
            "first_timecode", "last_timecode", "note",
        ]);
        foreach (var row in report.Diff.Rows)
        {
            var f = row.Finding;
            csv.WriteField(report.JointName(f));
            csv.WriteField(report.Labels.Number(f.First), []);
            csv.WriteField(report.Labels.Number(f.Last), []);
            csv.WriteField(f.Kind.Text());
            csv.WriteField(f.Action.Text());
            csv.WriteNumber(ReportDegrees.Of(row.LargestRadians));
            csv.WriteNumber(ReportDegrees.Of(f.ExpectedErrorRadians));
            csv.WriteNumber(f.Spreads is { } s ? Math.Round(s, 2) : null);
            csv.WriteField(report.Labels.TimeCode(f.First));
            csv.WriteField(report.Labels.TimeCode(f.Last));
            csv.WriteField(f.Note);
            csv.EndRecord();
        }
    }
}
