using System.Text;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Complaints that a table is laid out otherwise than the settings say, with what would fit it.</summary>
internal static class CsvAdvice
{
    /// <summary>No line names the columns that were looked for.</summary>
    public static InputFormatException NoHeader(TakeSource source, int start, ReadSettings settings)
    {
        var components = string.Join(", ", settings.CsvComponents);
        var found = settings.CsvLayout == "long"
            ? $"no header with columns joint, frame or {settings.CsvTime}, {components}"
            : $"no column named like '{settings.CsvJointColumns}' with {components}";
        var expected = CsvGuess.From(source, start) is { } guess
            ? $"those; this file would fit {guess.Settings}"
            : $"a header with such columns (the first line is '{FirstLine(source.Bytes.AsSpan(start))}')";
        return new InputFormatException(source.Name, "", found, expected);
    }

    /// <summary>There is neither a time nor a rate.</summary>
    public static InputFormatException NoTime(TakeSource source, CsvHeader header, ReadSettings settings)
    {
        var likely = header.Names.FirstOrDefault(TimeColumn.IsLikely);
        return new InputFormatException(
            source.Name,
            header.Place(source),
            $"no column '{settings.CsvTime}' for the time",
            $"one, or frames per second as ingest.rate{(likely is null ? "" : $"; column '{CsvText.Shown(likely)}' may be meant (ingest.csv.time)")}");
    }

    private static string FirstLine(ReadOnlySpan<byte> bytes)
    {
        var text = bytes.TrimStart("\r\n"u8);
        var end = text.IndexOfAny((byte)'\r', (byte)'\n');
        return CsvText.Shown(Encoding.UTF8.GetString(text[..Math.Min(end < 0 ? text.Length : end, 1000)]));
    }
}
