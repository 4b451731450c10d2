using System.Runtime.CompilerServices;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Replaces the number in a field and keeps the quotes and the padding around it.</summary>
internal sealed class FieldWriter(CsvRows rows, SplicedOutput output, char separator)
{
    private readonly byte mark = rows.DecimalComma ? (byte)',' : (byte)'.';

    /// <summary>Writes a number into a field of the current row.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Write(int column, double value)
    {
        var raw = rows.Raw(column, out var offset);
        var (first, last) = NumberWithin(raw);
        output.Replace(offset + first, offset + last);

        // An empty field has no quotes yet to hold a decimal comma that is also the separator.
        var quote = mark == separator && !raw.Contains((byte)'"');
        var room = output.Room(FixedDecimals.Longest + 2);
        var length = quote ? 1 : 0;
        length += FixedDecimals.Write(value, room[length..], mark);
        if (quote)
        {
            room[0] = room[length++] = (byte)'"';
        }

        output.Advance(length);
    }

    /// <summary>Where the number starts and ends; where it would stand in an empty field.</summary>
    private static (int First, int Last) NumberWithin(ReadOnlySpan<byte> raw)
    {
        if (!raw.IsEmpty && raw[0] is >= (byte)'+' and <= (byte)'9' && raw[^1] is >= (byte)'.' and <= (byte)'9')
        {
            return (0, raw.Length);
        }

        var first = raw.IndexOfAnyExcept(" \t\""u8);
        if (first >= 0)
        {
            return (first, raw.LastIndexOfAnyExcept(" \t\""u8) + 1);
        }

        var quote = raw.IndexOf((byte)'"');
        return quote < 0 ? (raw.Length, raw.Length) : (quote + 1, quote + 1);
    }
}
