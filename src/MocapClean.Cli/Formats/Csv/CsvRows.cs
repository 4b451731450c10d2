using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using CsvHelper;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// The rows below a header, one after the other, read in place: every field's offset in the file is known. Comments, blank lines and,
/// where there is a time column, rows of nothing but separators are passed over.
/// </summary>
internal sealed class CsvRows : IDisposable
{
    private readonly TakeSource source;
    private readonly CsvHeader header;
    private readonly bool emptyRowsAreBlank;
    private readonly CsvReader reader;
    private int end;

    private CsvRows(TakeSource source, CsvHeader header, CsvColumns columns, bool decimalComma)
    {
        this.source = source;
        this.header = header;
        DecimalComma = decimalComma;
        end = header.End;
        emptyRowsAreBlank = columns.Time >= 0 || columns.IsLong;
        reader = CsvReader.Create(source.Bytes.AsMemory(header.End), new CsvReaderOptions
        {
            Separator = header.Separator,
            HasHeader = false,
            CommentPrefix = HashStartsRow(columns) ? null : '#',
            MalformedData = CsvMalformedDataHandling.Throw,
            FormatProvider = decimalComma ? NumberText.Comma : NumberText.Point,
        });
    }

    /// <summary>Index of the current row, from 0.</summary>
    public int Row { get; private set; } = -1;

    /// <summary>Numbers are written with a comma.</summary>
    public bool DecimalComma { get; }

    /// <summary>Rows that the rest of the file has by its line breaks and its number of columns; comments and blank lines count.</summary>
    public int Estimate
    {
        get
        {
            var rest = source.Bytes.AsSpan(header.End).TrimEnd("\r\n"u8);
            var breaks = Math.Max(rest.Count((byte)'\n'), rest.Count((byte)'\r'));
            return Math.Max(1, Math.Min(breaks, rest.Length / header.Names.Length));
        }
    }

    private int Offset => header.End + (int)reader.ByteOffset;

    /// <summary>Opens a table whose decimal mark is not known yet: the first number with a mark settles it.</summary>
    public static CsvRows Open(TakeSource source, CsvHeader header, CsvColumns columns)
    {
        using var rows = new CsvRows(source, header, columns, decimalComma: false);
        return new CsvRows(source, header, columns, rows.FindDecimalComma(columns));
    }

    /// <summary>Opens a table again.</summary>
    public static CsvRows Open(TakeSource source, CsvHeader header, CsvColumns columns, bool decimalComma) =>
        new(source, header, columns, decimalComma);

    /// <summary>Goes to the next row.</summary>
    /// <exception cref="InputFormatException">The row is ragged or its quotes break RFC 4180.</exception>
    public bool Next()
    {
        while (Advance())
        {
            if (reader.FieldCount != header.Names.Length)
            {
                if (!reader.RawRecord.ContainsAnyExcept(" \t"u8))
                {
                    continue;
                }

                Row++;
                throw Ragged();
            }

            if (!emptyRowsAreBlank || !IsEmpty())
            {
                Row++;
                end = Offset + reader.RawRecord.Length;
                return true;
            }
        }

        return false;
    }

    /// <summary>A field as a number; false where it is none. May be infinite or NaN.</summary>
    public bool TryNumber(int column, out double value) => reader.TryParse(column, out value);

    /// <summary>A field's text without quotes. Lives until the next row.</summary>
    public ReadOnlySpan<byte> Text(int column) => reader.GetSpan(column);

    /// <summary>A field's text without quotes.</summary>
    public string TextOf(int column) => reader.GetString(column);

    /// <summary>A field as delivered, with quotes and padding, and its offset in the file.</summary>
    public ReadOnlySpan<byte> Raw(int column, out int offset)
    {
        var raw = reader.GetRawSpan(column);
        ref var origin = ref MemoryMarshal.GetArrayDataReference(source.Bytes);
        offset = (int)Unsafe.ByteOffset(ref origin, ref MemoryMarshal.GetReference(raw));
        return (uint)offset <= (uint)source.Bytes.Length ? raw : throw new InvalidOperationException("the reader copied its input");
    }

    /// <summary>The complaint about a field of the current row.</summary>
    public InputFormatException Wrong(int column, string found, string expected) =>
        new(source.Name, $"{Place()}, column '{CsvText.Shown(header.Names[column])}'", found, expected);

    /// <summary>The complaint that a field holds something else.</summary>
    public InputFormatException Unreadable(int column, string expected) =>
        Wrong(column, Text(column).IsEmpty ? "an empty cell" : $"'{CsvText.Shown(TextOf(column))}'", expected);

    /// <summary>The complaint about the table as a whole.</summary>
    public InputFormatException Unusable(string found, string expected) => new(source.Name, "", found, expected);

    /// <inheritdoc/>
    public void Dispose() => reader.Dispose();

    private bool Advance()
    {
        try
        {
            return reader.Read();
        }
        catch (CsvFormatException e)
        {
            throw Misquoted(header.End + (int)e.ByteOffset);
        }
    }

    private bool IsEmpty()
    {
        var record = reader.RawRecord;
        var first = record.IsEmpty ? (byte)0 : record[0];
        return (first == header.Separator || first == ' ' || first == '\t')
            && !record.ContainsAnyExcept((byte)header.Separator, (byte)' ', (byte)'\t');
    }

    private bool FindDecimalComma(CsvColumns columns)
    {
        while (Next())
        {
            for (var i = -1; i < columns.Slots.Length; i++)
            {
                var column = i < 0 ? columns.Time : columns.Slots[i];
                if (column >= 0 && NumberText.HasDecimalComma(Text(column)) is { } comma)
                {
                    return comma;
                }
            }
        }

        return false;
    }

    private string Place() => $"row {Row + 1} (line {CsvText.LineAt(source.Bytes, Offset)})";

    private InputFormatException Ragged()
    {
        var cut = Offset + reader.RawRecord.Length == source.Bytes.Length && reader.FieldCount < header.Names.Length;
        return new InputFormatException(
            source.Name,
            Place(),
            $"{Count(reader.FieldCount)}{(cut ? ", where the file breaks off" : "")}",
            $"{Count(header.Names.Length)} as in the header{(LooksSplit() ? " (a decimal comma splits a number where commas part the fields)" : "")}");
    }

    private bool LooksSplit() => header.Separator == ',' && reader.FieldCount > 1.5 * header.Names.Length;

    /// <summary>
    /// Whether the mark of comments may also start a row: a spreadsheet writes "#N/A" for a number, and a joint may be called "#1". Where
    /// such a line has the fields of a row, none is taken for a comment, so that no sample is passed over in silence.
    /// </summary>
    private bool HashStartsRow(CsvColumns columns)
    {
        var rest = columns.Joint == 0 || columns.Slots.Contains(0) ? source.Bytes.AsSpan(header.End) : [];
        for (var at = rest.IndexOf("\n#"u8); at >= 0; at = rest.IndexOf("\n#"u8))
        {
            rest = rest[(at + 1)..];
            var length = rest.IndexOf((byte)'\n');
            if ((length < 0 ? rest : rest[..length]).Count((byte)header.Separator) == header.Names.Length - 1)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>The reader names the byte where it noticed: for an open quote that is the end, so the search for it starts at the row.</summary>
    private InputFormatException Misquoted(int offset)
    {
        var open = offset >= source.Bytes.Length;
        var line = CsvText.LineAt(source.Bytes, open ? StartAfterLast() : offset);
        return new InputFormatException(
            source.Name,
            $"row {Row + 2} (line {line})",
            open ? "a quoted field that is never closed" : "a quote in the middle of a field",
            "quotes around whole fields, doubled inside (RFC 4180)");
    }

    private int StartAfterLast()
    {
        var next = source.Bytes.AsSpan(end).IndexOfAnyExcept((byte)'\r', (byte)'\n');
        return next < 0 ? end : end + next;
    }

    private static string Count(int fields) => fields == 1 ? "1 field" : $"{fields} fields";
}
