using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Replaces the number in a field and keeps the quotes and the padding around it.</summary>
internal sealed class FieldWriter(CsvRows rows, SplicedOutput output, char separator)
{
    private readonly byte mark = rows.DecimalComma ? (byte)',' : (byte)'.';

    /// <summary>Writes a component of an orientation into a field of the current row.</summary>
    public void Write(int column, in Quat sample, int component)
    {
        var value = component switch { 0 => sample.W, 1 => sample.X, 2 => sample.Y, _ => sample.Z };
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
