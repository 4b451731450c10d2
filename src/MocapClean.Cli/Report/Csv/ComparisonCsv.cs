using CsvHelper;
using MocapClean.Core.Diff;

namespace MocapClean.Cli.Report.Csv;

/// <summary>The comparison of two takes as a table, one row a joint.</summary>
public static class ComparisonCsv
{
    /// <summary>Writes the table to a stream that stays open.</summary>
    public static void Write(TakeComparison comparison, Stream output)
    {
        using var csv = CsvWriter.Create(output, ReportCsv.Options, leaveOpen: true);
        csv.WriteHeader(["joint", "compared", "changed", "largest_deg", "largest_at_frame", "rms_deg", "p95_deg", "missing_before", "missing_after"]);
        foreach (var j in comparison.Joints)
        {
            csv.WriteField(j.Name);
            csv.WriteField(j.Compared, []);
            csv.WriteField(j.Changed, []);
            csv.WriteNumber(ReportDegrees.Of(j.Change.Largest));
            csv.WriteField(j.LargestAt, []);
            csv.WriteNumber(ReportDegrees.Of(j.Change.Rms));
            csv.WriteNumber(ReportDegrees.Of(j.Change.Percentile95));
            csv.WriteField(j.MissingBefore, []);
            csv.WriteField(j.MissingAfter, []);
            csv.EndRecord();
        }
    }
}
