namespace MocapClean.Cli.Formats.Bvh;

/// <summary>Walks over the words of the HIERARCHY section. A brace is a word of its own.</summary>
/// <param name="source">The file.</param>
/// <param name="start">Where to begin.</param>
internal sealed class BvhWords(TakeSource source, int start)
{
    private readonly byte[] bytes = source.Bytes;
    private int wordStart;

    /// <summary>Offset behind the last word.</summary>
    public int Position { get; private set; } = start;

    /// <summary>Number of the last word's line, from 1.</summary>
    public int Line { get; private set; } = 1;

    /// <summary>The word last read; empty at the end of the file.</summary>
    public ReadOnlySpan<byte> Word => bytes.AsSpan(wordStart, Position - wordStart);

    /// <summary>Goes to the next word and returns it.</summary>
    public ReadOnlySpan<byte> Next()
    {
        SkipSpace();
        wordStart = Position;
        if (Position < bytes.Length && IsBrace(bytes[Position]))
        {
            Position++;
            return Word;
        }

        while (Position < bytes.Length && !BvhText.IsSpace(bytes[Position]) && !IsBrace(bytes[Position]))
        {
            Position++;
        }

        return Word;
    }

    /// <summary>Goes to a name: everything up to the end of the line or an opening brace, blanks inside it included.</summary>
    public ReadOnlySpan<byte> NextName()
    {
        SkipSpace();
        wordStart = Position;
        var length = bytes.AsSpan(Position).IndexOfAny("\r\n{"u8);
        Position = length < 0 ? bytes.Length : Position + length;
        while (Position > wordStart && BvhText.IsSpace(bytes[Position - 1]))
        {
            Position--;
        }

        return Word;
    }

    /// <summary>Goes to the next word, which must be this one.</summary>
    public void Expect(string keyword)
    {
        if (!BvhText.Is(Next(), keyword))
        {
            throw Unexpected(keyword);
        }
    }

    /// <summary>The error of the word last read.</summary>
    public InputFormatException Unexpected(string expected, string joint = "") =>
        Fault(Word.IsEmpty ? "the end of the file" : BvhText.Quote(Word), expected, joint);

    /// <summary>An error at the word last read.</summary>
    public InputFormatException Fault(string found, string expected, string joint = "") =>
        new(source.Name, joint.Length > 0 ? $"line {Line}, joint '{joint}'" : $"line {Line}", found, expected);

    private static bool IsBrace(byte b) => b is (byte)'{' or (byte)'}';

    private void SkipSpace()
    {
        for (; Position < bytes.Length && BvhText.IsSpace(bytes[Position]); Position++)
        {
            // CR LF counts once, at its LF.
            var ends = bytes[Position] == '\n' || (bytes[Position] == '\r' && (Position + 1 == bytes.Length || bytes[Position + 1] != '\n'));
            Line += ends ? 1 : 0;
        }
    }
}
