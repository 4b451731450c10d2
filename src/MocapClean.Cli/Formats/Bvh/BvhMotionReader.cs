using System.Collections.Immutable;
using System.Globalization;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>Reads the MOTION section: number of frames, frame time, and one line of values a frame.</summary>
/// <param name="source">The file.</param>
/// <param name="columns">Names of the channels in the order of a line.</param>
internal sealed class BvhMotionReader(TakeSource source, ImmutableArray<string> columns)
{
    // What any recording stays within; far beyond it neither a rate nor the time of the last frame could be computed.
    private const double ShortestFrame = 1e-6;
    private const double LongestFrame = 1e6;

    /// <summary>Reads the section from behind the word MOTION.</summary>
    /// <param name="position">Offset in the file.</param>
    /// <param name="line">Number of the line that holds it.</param>
    public BvhMotion Read(int position, int line)
    {
        var lines = new BvhLines(source.Bytes, position, line);
        var count = ReadHeader(ref lines, "Frames");
        if (!long.TryParse(count, NumberStyles.Integer, CultureInfo.InvariantCulture, out var frames) || frames <= 0)
        {
            throw Fault($"line {lines.Number}, Frames", BvhText.Quote(count), "a whole number of frames, at least 1");
        }

        var text = ReadHeader(ref lines, "Frame Time");
        if (!BvhText.TryNumber(text, out var frameTime) || frameTime is not (>= ShortestFrame and <= LongestFrame))
        {
            throw Fault($"line {lines.Number}, Frame Time", BvhText.Quote(text), $"a number of seconds above 0 (from {ShortestFrame} to {LongestFrame})");
        }

        var surplus = CountSurplus(lines, frames);
        var (starts, values) = ReadValues(ref lines, (int)frames);
        return new BvhMotion(frameTime, BvhText.HalfUnit(BvhText.Decimals(text)), columns.Length, starts, values) { Surplus = surplus };
    }

    private ReadOnlySpan<byte> ReadHeader(ref BvhLines lines, string key)
    {
        if (!lines.MoveNext())
        {
            throw Fault($"line {lines.Number}", "the end of the file", $"'{key}:'");
        }

        var text = lines.Line.Trim(BvhText.Spaces);
        var colon = text.IndexOf((byte)':');
        return colon >= 0 && BvhText.Is(text[..colon].Trim(BvhText.Spaces), key)
            ? text[(colon + 1)..].Trim(BvhText.Spaces)
            : throw Fault($"line {lines.Number}", BvhText.Quote(text), $"'{key}:'");
    }

    /// <summary>A file with fewer lines than it says is not whole; lines beyond those are no harm.</summary>
    private long CountSurplus(BvhLines lines, long expected)
    {
        var found = 0L;
        while (lines.MoveNext())
        {
            found++;
        }

        return found >= expected
            ? found - expected
            : throw Fault("MOTION", $"{found} lines of values", $"{expected}, as 'Frames:' says");
    }

    private (int[] Starts, double[] Values) ReadValues(ref BvhLines lines, int frames)
    {
        // A value takes two bytes at least: a file whose lines are too short asks for no more memory than it is large.
        var most = ((source.Bytes.Length - lines.Start) / 2) + 1L;
        var values = new double[Math.Min((long)frames * columns.Length, most)];
        var starts = new int[frames];
        for (var n = 0; n < frames; n++)
        {
            lines.MoveNext();
            starts[n] = lines.Start;
            ReadLine(lines, n, values.AsSpan((int)Math.Min((long)n * columns.Length, values.Length)));
        }

        return (starts, values);
    }

    private void ReadLine(BvhLines lines, int frame, Span<double> values)
    {
        var fields = new BvhFields(lines.Line);
        var column = 0;
        while (fields.MoveNext())
        {
            if (column == columns.Length)
            {
                break;
            }

            if (!BvhText.TryNumber(fields.Field, out var value))
            {
                throw Fault(
                    $"row {frame + 1} (line {lines.Number}), column {column + 1} '{columns[column]}'", BvhText.Quote(fields.Field), "a number");
            }

            values[column++] = value;
        }

        var found = column + fields.CountFromHere();
        if (found != columns.Length)
        {
            throw Fault($"row {frame + 1} (line {lines.Number})", $"{found} values", $"{columns.Length}, one for each channel");
        }
    }

    private InputFormatException Fault(string where, string found, string expected) => new(source.Name, where, found, expected);
}
