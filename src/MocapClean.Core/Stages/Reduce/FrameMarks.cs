using System.Buffers;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Which frames a breadth-first search has reached, in what order, and from which key.</summary>
internal sealed class FrameMarks : IDisposable
{
    private readonly int frames;
    private readonly int[] before;
    private readonly int[] next;
    private readonly int[] order;

    /// <summary>No frame reached yet.</summary>
    public FrameMarks(int frames)
    {
        this.frames = frames;
        before = ArrayPool<int>.Shared.Rent(frames);
        next = ArrayPool<int>.Shared.Rent(frames + 1);
        order = ArrayPool<int>.Shared.Rent(frames);
        for (var n = 0; n <= frames; n++)
        {
            next[n] = n;
        }
    }

    /// <summary>How many frames are marked.</summary>
    public int Count { get; private set; }

    /// <summary>Whether the frame is marked.</summary>
    public bool Contains(int frame) => next[frame] != frame;

    /// <summary>Marks a frame, once.</summary>
    /// <param name="frame">The frame.</param>
    /// <param name="from">The key before it, -1 for the first frame.</param>
    public void Mark(int frame, int from)
    {
        before[frame] = from;
        next[frame] = frame + 1;
        order[Count++] = frame;
    }

    /// <summary>The first unmarked frame at or after the given one; the number of frames where there is none.</summary>
    public int Unmarked(int frame)
    {
        var end = frame;
        while (next[end] != end)
        {
            end = next[end];
        }

        // Shortens the way just gone for the next to ask.
        while (next[frame] != end)
        {
            (frame, next[frame]) = (next[frame], end);
        }

        return end;
    }

    /// <summary>The frames marked from one count to another, put in rising order.</summary>
    public ReadOnlySpan<int> Rising(int from, int to)
    {
        var level = order.AsSpan(from, to - from);
        for (var n = 1; n < level.Length; n++)
        {
            // Most levels were marked in this order.
            if (level[n] < level[n - 1])
            {
                level.Sort();
                break;
            }
        }

        return level;
    }

    /// <summary>The marked keys that lead to the last frame.</summary>
    public List<int> Path()
    {
        var path = new List<int>();
        for (var n = frames - 1; n >= 0; n = before[n])
        {
            path.Add(n);
        }

        path.Reverse();
        return path;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        ArrayPool<int>.Shared.Return(before);
        ArrayPool<int>.Shared.Return(next);
        ArrayPool<int>.Shared.Return(order);
    }
}
