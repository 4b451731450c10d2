namespace MocapClean.Cli.Formats.Bvh;

/// <summary>What the MOTION section holds.</summary>
/// <param name="FrameTime">Seconds a frame lasts, above 0.</param>
/// <param name="FrameTimeRounding">Half a unit of its last printed digit.</param>
/// <param name="Columns">Values in a line.</param>
/// <param name="LineStarts">Offset in the file of each frame's line.</param>
/// <param name="Values">All values, line after line; not finite where the text said so.</param>
internal sealed record BvhMotion(double FrameTime, double FrameTimeRounding, int Columns, int[] LineStarts, double[] Values)
{
    /// <summary>Lines of values beyond the number of frames that the file states.</summary>
    public long Surplus { get; init; }

    /// <summary>Number of frames.</summary>
    public int Frames => LineStarts.Length;

    /// <summary>The bytes of a frame's line, without the line end.</summary>
    public ReadOnlySpan<byte> Line(ReadOnlySpan<byte> file, int frame)
    {
        var rest = file[LineStarts[frame]..];
        var length = rest.IndexOfAny((byte)'\n', (byte)'\r');
        return length < 0 ? rest : rest[..length];
    }

    /// <summary>One value.</summary>
    public double this[int frame, int column] => Values[((long)frame * Columns) + column];
}
