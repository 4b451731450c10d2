namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// Tables of text (RFC 4180 and its common relatives): one row a frame with four columns a joint, or one row a joint and frame.
/// Separator, decimal comma, byte order mark, comments and lines before the header are found out from the file.
/// </summary>
public sealed class CsvFormat : ITakeFormat
{
    /// <inheritdoc/>
    public string Name => "csv";

    /// <inheritdoc/>
    public IReadOnlyList<string> Extensions { get; } = [".csv", ".tsv"];

    /// <inheritdoc/>
    public ITakeFile Read(TakeSource source, ReadSettings settings)
    {
        var start = CsvText.Start(source);
        var (header, columns) = CsvLayout.Find(source, start, settings);
        using var rows = CsvRows.Open(source, header, columns);
        var content = columns.IsLong ? LongReader.Read(rows, columns) : WideReader.Read(rows, columns);
        return new CsvTakeFile(source, header, columns, content, CsvTake.Build(source, header, settings, content));
    }
}
