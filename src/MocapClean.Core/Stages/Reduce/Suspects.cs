namespace MocapClean.Core.Stages.Reduce;

/// <summary>The last frames that refuted a span, latest first: they tend to refute the next one too.</summary>
internal sealed class Suspects
{
    /// <summary>How many are kept: two vectors full.</summary>
    public const int Count = 8;

    private readonly int[] frames = new int[Count];

    /// <summary>Puts a frame in front; true where it was among them already. Else the one in front longest ago drops out.</summary>
    public bool Add(int frame)
    {
        var at = Array.IndexOf(frames, frame);
        frames.AsSpan(0, at < 0 ? Count - 1 : at).CopyTo(frames.AsSpan(1));
        frames[0] = frame;
        return at >= 0;
    }

    /// <summary>Four of them, each replaced by the frame after the first key where it is not between the keys.</summary>
    public (int A, int B, int C, int D) Inside(int at, int first, int last) =>
        (One(at, first, last), One(at + 1, first, last), One(at + 2, first, last), One(at + 3, first, last));

    private int One(int at, int first, int last) => frames[at] > first && frames[at] < last ? frames[at] : first + 1;
}
