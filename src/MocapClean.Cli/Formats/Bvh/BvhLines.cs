namespace MocapClean.Cli.Formats.Bvh;

/// <summary>Walks over the lines of a file that hold more than white space, counting them all.</summary>
/// <param name="bytes">The file.</param>
/// <param name="position">Where to begin.</param>
/// <param name="line">Number of the line that holds this position, from 1.</param>
internal ref struct BvhLines(ReadOnlySpan<byte> bytes, int position, int line)
{
    private readonly ReadOnlySpan<byte> bytes = bytes;
    private int next = position;
    private int nextLine = line;

    /// <summary>Offset of the line's first byte in the file.</summary>
    public int Start { get; private set; }

    /// <summary>Its number, from 1.</summary>
    public int Number { get; private set; }

    /// <summary>Its bytes without the line end.</summary>
    public ReadOnlySpan<byte> Line { get; private set; }

    /// <summary>Goes to the next line that is not blank; false at the end of the file.</summary>
    public bool MoveNext()
    {
        while (next < bytes.Length)
        {
            (Start, Number) = (next, nextLine);
            var length = bytes[next..].IndexOfAny((byte)'\n', (byte)'\r');
            var end = length < 0 ? bytes.Length : next + length;
            next = end + (end + 1 < bytes.Length && bytes[end] == '\r' && bytes[end + 1] == '\n' ? 2 : 1);
            nextLine++;
            Line = bytes[Start..end];
            if (!Line.Trim(BvhText.Spaces).IsEmpty)
            {
                return true;
            }
        }

        (Start, Number) = (bytes.Length, nextLine);
        Line = [];
        return false;
    }
}
