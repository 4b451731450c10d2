using CsvHelper;

namespace MocapClean.Cli.Report.Csv;

/// <summary>How our own tables are written: comma, LF, and text that a spreadsheet would run as a formula made safe.</summary>
internal static class ReportCsv
{
    public static CsvWriterOptions Options { get; } = new() { NewLine = "\n", Injection = CsvInjection.Escape };

    /// <summary>A number by its shortest text, or an empty cell.</summary>
    public static void WriteNumber(this CsvWriter csv, double? value)
    {
        if (value is { } number)
        {
            csv.WriteField(number, []);
        }
        else
        {
            csv.WriteField("");
        }
    }
}
