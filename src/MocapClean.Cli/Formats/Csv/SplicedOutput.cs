using System.Buffers;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Copies a delivered file to a stream with some stretches replaced, in the order in which they stand in it.</summary>
internal sealed class SplicedOutput(byte[] delivered, Stream output) : IDisposable
{
    private const int BufferSize = 1 << 18;

    private readonly byte[] buffer = ArrayPool<byte>.Shared.Rent(BufferSize);
    private int used;
    private int copied;

    /// <summary>Copies up to an offset and leaves out what follows up to another.</summary>
    public void Replace(int start, int end)
    {
        CopyTo(start);
        copied = end;
    }

    /// <summary>Room for new bytes at the place reached.</summary>
    /// <param name="length">Bytes that may be written, far fewer than the buffer has.</param>
    public Span<byte> Room(int length)
    {
        if (buffer.Length - used < length)
        {
            Flush();
        }

        return buffer.AsSpan(used, length);
    }

    /// <summary>Takes the bytes written into the room.</summary>
    public void Advance(int length) => used += length;

    /// <summary>Copies the rest of the file.</summary>
    public void Finish()
    {
        CopyTo(delivered.Length);
        Flush();
    }

    /// <inheritdoc/>
    public void Dispose() => ArrayPool<byte>.Shared.Return(buffer);

    private void CopyTo(int end)
    {
        // Between two numbers there is mostly one separator.
        if (end - copied == 1 && used < buffer.Length)
        {
            buffer[used++] = delivered[copied++];
            return;
        }

        var stretch = delivered.AsSpan(copied, end - copied);
        if (stretch.Length > buffer.Length - used)
        {
            Flush();
        }

        if (stretch.Length > buffer.Length)
        {
            output.Write(stretch);
        }
        else
        {
            stretch.CopyTo(buffer.AsSpan(used));
            used += stretch.Length;
        }

        copied = end;
    }

    private void Flush()
    {
        output.Write(buffer, 0, used);
        used = 0;
    }
}
