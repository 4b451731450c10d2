using System.Buffers;
using System.Runtime.CompilerServices;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// The fewest key frames of a stretch: a shortest path over its frames, where an edge is a span that plays within the tolerance. Exact, as
/// every edge is either refuted by a necessary condition, accepted by a sufficient one, or played and measured.
/// </summary>
/// <remarks>
/// Breadth first: all frames that k keys reach, then all that k + 1 keys reach, each level searched from its latest frame back; a frame is
/// marked once, by the first to reach it. Sources: Imai and Iri 1988, Chan and Chin 1996 (fewest vertices within a tolerance).
/// </remarks>
internal sealed class KeySearch<TCurve> : IDisposable
    where TCurve : struct, ICurve<TCurve>
{
    private readonly Stretch stretch;
    private readonly SpanLimits limits;
    private readonly double tolerance;
    private readonly double chord;
    private readonly double cosWidest;
    private readonly double cosHopeless;

    // For each frame the key before it, the next unmarked frame at or after it, the last frame that is not too late; and the marked frames.
    private readonly int[] before;
    private readonly int[] unmarked;
    private readonly int[] marked;
    private int count;
    private int suspect;

    private KeySearch(Stretch stretch, SpanLimits limits)
    {
        this.stretch = stretch;
        this.limits = limits;
        // A hair less than asked for, so that the rounding of the written keys cannot pass it.
        const double Hair = 1 - 1e-9;
        tolerance = limits.Tolerance * Hair;
        chord = SpanCheck.SquaredChord(tolerance);
        cosWidest = Math.Cos(limits.Widest * Hair / 2);
        cosHopeless = Math.Cos(Math.Min(Math.PI, limits.Widest + limits.Tolerance) / 2) - 1e-9;
        before = ArrayPool<int>.Shared.Rent(stretch.Count);
        unmarked = ArrayPool<int>.Shared.Rent(stretch.Count + 1);
        marked = ArrayPool<int>.Shared.Rent(stretch.Count);
        for (var n = 0; n <= stretch.Count; n++)
        {
            unmarked[n] = n;
        }
    }

    /// <summary>Frames of a smallest set of keys, from the first frame to the last.</summary>
    public static List<int> Run(Stretch stretch, SpanLimits limits)
    {
        using var search = new KeySearch<TCurve>(stretch, limits);
        search.Mark(0, -1);
        for (var (from, to) = (0, 1); search.unmarked[stretch.Count - 1] == stretch.Count - 1; (from, to) = (to, search.count))
        {
            search.marked.AsSpan(from, to - from).Sort();
            for (var at = to - 1; at >= from; at--)
            {
                search.Reach(search.marked[at]);
            }
        }

        return search.Path();
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        ArrayPool<int>.Shared.Return(before);
        ArrayPool<int>.Shared.Return(unmarked);
        ArrayPool<int>.Shared.Return(marked);
    }

    private List<int> Path()
    {
        var path = new List<int>();
        for (var n = stretch.Count - 1; n >= 0; n = before[n])
        {
            path.Add(n);
        }

        path.Reverse();
        return path;
    }

    private void Mark(int frame, int from)
    {
        before[frame] = from;
        unmarked[frame] = frame + 1;
        marked[count++] = frame;
    }

    /// <summary>The first unmarked frame at or after the given one; the number of frames where there is none. Shortens the way it went.</summary>
    private int Unmarked(int frame)
    {
        var end = frame;
        while (unmarked[end] != end)
        {
            end = unmarked[end];
        }

        while (unmarked[frame] != end)
        {
            (frame, unmarked[frame]) = (unmarked[frame], end);
        }

        return end;
    }

    /// <summary>Marks every unmarked frame that one span from this key reaches.</summary>
    private void Reach(int key)
    {
        var first = Unmarked(key + 1);
        if (first == key + 1 && first < stretch.Count)
        {
            Mark(first, key);
            first = Unmarked(first);
        }

        if (first < stretch.Count && stretch.Time[first] - stretch.Time[key] <= limits.Longest)
        {
            Scan(key, first);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Scan(int key, int first)
    {
        var stray = TCurve.Stray(limits.Widest);
        var balls = new VelocityBalls(stretch, key, tolerance + stray, tolerance - stray);
        var corridor = Corridor.Open;
        FourBalls four = default;
        var until = stretch.Time[key] + limits.Longest;
        for (var block = key + 1; block < stretch.Count; block += 4)
        {
            balls.Of(stretch.Four(block), stretch.Times(block), ref four);
            for (var k = 0; k < 4 && block + k < stretch.Count; k++)
            {
                var n = block + k;
                if (stretch.Time[n] > until || Math.Abs(four.Facing[k]) < cosHopeless)
                {
                    return;
                }

                corridor.Look(four.X[k], four.Y[k], four.Z[k]);
                if (n >= first && unmarked[n] == n && TCurve.CosHalfTurn(four.Facing[k]) >= cosWidest && Plays(corridor, key, n))
                {
                    Mark(n, key);
                }

                corridor.Narrow(four.Outer[k], four.Inner[k]);
                if (corridor.IsEmpty)
                {
                    return;
                }
            }
        }
    }

    private bool Plays(in Corridor corridor, int key, int end)
    {
        if (corridor.Refutes())
        {
            return false;
        }

        if (corridor.Accepts())
        {
            return true;
        }

        var breach = SpanCheck.Breach<TCurve>(stretch, key, end, chord, suspect);
        suspect = breach < 0 ? suspect : breach;
        return breach < 0;
    }
}
