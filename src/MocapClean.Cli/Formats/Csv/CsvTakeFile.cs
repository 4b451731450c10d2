using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>A table as delivered, with the take that was read from it.</summary>
internal sealed class CsvTakeFile(TakeSource source, CsvHeader header, CsvColumns columns, CsvContent content, Take take) : ITakeFile
{
    /// <inheritdoc/>
    public Take Take { get; } = take;

    /// <inheritdoc/>
    /// <remarks>Of a long table, the text in the first row of each frame.</remarks>
    public IReadOnlyList<string>? Column(string name)
    {
        var column = header.Find(source, name);
        if (column < 0)
        {
            return null;
        }

        var texts = new string?[Take.Length];
        using var rows = Reopen();
        while (rows.Next())
        {
            texts[content.Places?.Frames[rows.Row] ?? rows.Row] ??= rows.TextOf(column);
        }

        return texts!;
    }

    /// <inheritdoc/>
    public void Write(Take cleaned, Stream output)
    {
        if (cleaned.Tracks.Length != Take.Tracks.Length || cleaned.Length != Take.Length)
        {
            throw new ArgumentException("The cleaned take has other joints or frames than the delivered one", nameof(cleaned));
        }

        using var rows = Reopen();
        using var spliced = new SplicedOutput(source.Bytes, output);
        var writer = new FieldWriter(rows, spliced, header.Separator);
        var order = FieldsInOrder();
        var changed = new ChangedSamples(cleaned, columns.Slots.Length / 4);
        while (rows.Next())
        {
            if (changed.Find(content.Places?.Joints[rows.Row] ?? 0, content.Places?.Frames[rows.Row] ?? rows.Row))
            {
                WriteChanged(writer, changed, order);
            }
        }

        spliced.Finish();
    }

    /// <summary>Nearly all time of writing goes by in here.</summary>
    private static void WriteChanged(FieldWriter writer, ChangedSamples changed, (int Column, int Slot)[] order)
    {
        foreach (var (column, slot) in order)
        {
            if (changed[slot / 4])
            {
                writer.Write(column, changed.Components[slot]);
            }
        }
    }

    private CsvRows Reopen() => CsvRows.Open(source, header, columns, content.DecimalComma);

    /// <summary>The fields of orientations as they stand in a row.</summary>
    private (int Column, int Slot)[] FieldsInOrder() => [.. columns.Slots.Select((column, slot) => (column, slot)).Order()];
}
