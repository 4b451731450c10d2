namespace MocapClean.Cli.Formats.Bvh;

/// <summary>Walks over the values of a line.</summary>
internal ref struct BvhFields(ReadOnlySpan<byte> line)
{
    private readonly ReadOnlySpan<byte> line = line;

    /// <summary>Offset of the value's first byte in the line.</summary>
    public int Start { get; private set; }

    /// <summary>Offset behind its last byte.</summary>
    public int End { get; private set; }

    /// <summary>Its text; empty behind the last value.</summary>
    public readonly ReadOnlySpan<byte> Field => line[Start..End];

    /// <summary>Goes to the next value; false at the end of the line.</summary>
    public bool MoveNext()
    {
        var start = End;
        while (start < line.Length && BvhText.IsSpace(line[start]))
        {
            start++;
        }

        var end = start;
        while (end < line.Length && !BvhText.IsSpace(line[end]))
        {
            end++;
        }

        (Start, End) = (start, end);
        return end > start;
    }

    /// <summary>How many values there are from the current one on.</summary>
    public readonly int CountFromHere()
    {
        var rest = this;
        var count = 0;
        for (var there = !Field.IsEmpty; there; there = rest.MoveNext())
        {
            count++;
        }

        return count;
    }
}
