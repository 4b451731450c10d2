using System.Text;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>One frame's line while it is being written: its values as delivered, and the texts that take their place.</summary>
/// <param name="bytes">The file as delivered.</param>
/// <param name="motion">Its values.</param>
internal sealed class BvhLine(byte[] bytes, BvhMotion motion)
{
    private readonly (int Start, int End)[] fields = new (int, int)[motion.Columns];
    private readonly string?[] texts = new string?[motion.Columns];
    private int frame;
    private bool isParted;
    private bool isChanged;

    /// <summary>Goes to a frame.</summary>
    public void GoTo(int n)
    {
        (frame, isParted) = (n, false);
        if (isChanged)
        {
            Array.Clear(texts);
            isChanged = false;
        }
    }

    /// <summary>The delivered text of a value.</summary>
    public ReadOnlySpan<byte> Field(int column)
    {
        Part();
        return bytes.AsSpan(fields[column].Start..fields[column].End);
    }

    /// <summary>Puts a text in the place of a value.</summary>
    public void Replace(int column, string text)
    {
        texts[column] = text;
        isChanged = true;
    }

    /// <summary>Writes what changed, with the delivered bytes before it.</summary>
    /// <param name="copied">Offset up to which the file has been written.</param>
    /// <param name="output">Receives the bytes.</param>
    /// <returns>Offset up to which the file has been written now.</returns>
    public int Write(int copied, Stream output)
    {
        for (var column = 0; isChanged && column < texts.Length; column++)
        {
            if (texts[column] is { } text)
            {
                Part();
                output.Write(bytes, copied, fields[column].Start - copied);
                output.Write(Encoding.ASCII.GetBytes(text));
                copied = fields[column].End;
            }
        }

        return copied;
    }

    private void Part()
    {
        if (isParted)
        {
            return;
        }

        var start = motion.LineStarts[frame];
        var found = new BvhFields(motion.Line(bytes, frame));
        for (var column = 0; found.MoveNext(); column++)
        {
            fields[column] = (start + found.Start, start + found.End);
        }

        isParted = true;
    }
}
