using System.Buffers;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// The fewest key frames of a stretch: a shortest path over its frames, where an edge is a span that plays within the tolerance. Exact, as
/// every edge is either refuted by a necessary condition, accepted by a sufficient one, or played and measured.
/// </summary>
/// <remarks>
/// Breadth first: all frames that k keys reach, then all that k + 1 keys reach, each level searched from its latest frame back; a frame is
/// marked once, by the first to reach it. Most keys of a level add nothing to what later ones reached, and a few frames spread before the
/// first unmarked one show it. Only where an end survives those are all frames between looked at.
/// Sources: Imai and Iri 1988, Chan and Chin 1996 (fewest vertices within a tolerance).
/// </remarks>
internal sealed class KeySearch<TCurve> : IDisposable
    where TCurve : struct, ICurve<TCurve>
{
    /// <summary>Spans up to this long are looked at whole at once; longer ones by spread frames first.</summary>
    private const int Short = 8;

    private readonly Stretch stretch;
    private readonly FrameMarks marks;
    private readonly int[] latest;
    private readonly double tolerance;
    private readonly double widest;
    private readonly double chord;
    private readonly double cosWidest;
    private readonly double cosHopeless;
    private readonly double widestStray;
    private readonly Suspects suspects = new();

    // What is known from the key at work: the balls of frames, what they leave, and whether every frame before the first unmarked is in.
    private VelocityBalls balls;
    private Corridor corridor;
    private bool isWhole;
    private int spent;

    private KeySearch(Stretch stretch, SpanLimits limits)
    {
        this.stretch = stretch;
        marks = new FrameMarks(stretch.Count);
        tolerance = limits.Tolerance * SpanLimits.Hair;
        widest = limits.Widest * SpanLimits.Hair;
        chord = SpanCheck.SquaredChord(tolerance);
        cosWidest = limits.CosWidest;
        // A frame turned further than the widest key and the tolerance: playback that never turns back cannot pass it and return.
        cosHopeless = Math.Cos(Math.Min(Math.PI, limits.Widest + limits.Tolerance) / 2) - 1e-9;
        widestStray = TCurve.Stray(widest);
        latest = ArrayPool<int>.Shared.Rent(stretch.Count);
        var time = stretch.Time;
        for (var (n, end) = (0, 0); n < stretch.Count; n++)
        {
            while (end + 1 < stretch.Count && time[end + 1] - time[n] <= limits.Longest)
            {
                end++;
            }

            latest[n] = end;
        }
    }

    /// <summary>Frames of a smallest set of keys, from the first frame to the last.</summary>
    public static List<int> Run(Stretch stretch, SpanLimits limits)
    {
        using var search = new KeySearch<TCurve>(stretch, limits);
        return search.Path();
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        marks.Dispose();
        ArrayPool<int>.Shared.Return(latest);
    }

    private List<int> Path()
    {
        marks.Mark(0, -1);
        for (var (from, to) = (0, 1); !marks.Contains(stretch.Count - 1); (from, to) = (to, marks.Count))
        {
            var level = marks.Rising(from, to);
            for (var at = level.Length - 1; at >= 0; at--)
            {
                Reach(level[at]);
            }
        }

        return marks.Path();
    }

    /// <summary>Marks every unmarked frame that one span from this key reaches.</summary>
    private void Reach(int key)
    {
        var first = marks.Unmarked(key + 1);
        if (first == key + 1 && first < stretch.Count)
        {
            marks.Mark(first, key);
            first = marks.Unmarked(first);
        }

        if (first <= latest[key])
        {
            Scan(key, first);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Scan(int key, int first)
    {
        var (last, stray) = widestStray > 0 ? Horizon(key, first) : (latest[key], 0);

        Begin(key, stray);
        if (last < first || !Survey(key, first))
        {
            return;
        }

        FourBalls four = default;
        for (var block = first; block <= last; block += 4)
        {
            balls.Of(stretch.Four(block), stretch.Times(block), ref four);
            for (var (n, k) = (block, 0); k < 4 && n <= last; n++, k++)
            {
                var facing = FourBalls.At(ref four.Facing, k);
                if (Math.Abs(facing) < cosHopeless)
                {
                    return;
                }

                var velocity = four.Centre(k);
                if (!marks.Contains(n) && TCurve.CosHalfTurn(facing) >= cosWidest &&
                    !corridor.Refutes(velocity) && Plays(key, first, n, velocity))
                {
                    marks.Mark(n, key);
                }

                corridor.Narrow(velocity, FourBalls.At(ref four.Outer, k), FourBalls.At(ref four.Inner, k));
                if (corridor.IsEmpty)
                {
                    return;
                }
            }
        }
    }

    private void Begin(int key, double stray)
    {
        balls = new VelocityBalls(stretch, key, tolerance + stray, tolerance - stray);
        corridor.Open();
        (isWhole, spent) = (false, 0);
    }

    /// <summary>
    /// For a playback that strays from constant speed: no end after the frame returned is possible, and how far playback to any end up to
    /// it can stray. With the widest stray allowed, frames ever further out are put in until nothing is left.
    /// </summary>
    private (int Last, double Stray) Horizon(int key, int first)
    {
        Begin(key, widestStray);
        var last = latest[key];
        var length = first - key;
        var (a, b, c, d) = (key + ((length + 1) / 2), first, Math.Min(last, first + (length / 2)), Math.Min(last, first + length));
        var isOpen = Put(a, b, c, d);
        for (var step = length; isOpen && d < last; step *= 2)
        {
            (a, b) = (Math.Min(last, d + step), Math.Min(last, d + (2 * step)));
            (c, d) = (Math.Min(last, d + (3 * step)), Math.Min(last, d + (4 * step)));
            isOpen = Put(a, b, c, d);
        }

        last = isOpen ? last : d - 1;
        var least = Vector256<double>.One;
        for (var n = first; n <= last; n += 4)
        {
            least = Vector256.MinNative(least, Vector256.Abs(balls.Facing(stretch.Four(n))));
        }

        var cosine = Math.Min(Math.Min(least[0], least[1]), Math.Min(least[2], least[3]));
        return (last, TCurve.Stray(Math.Min(widest, 2 * Math.Acos(Math.Min(1, cosine)))));
    }

    /// <summary>
    /// Puts in frames before the first unmarked one: all of a short span, else frames spread over it, ever closer to its ends. False as
    /// soon as nothing is left.
    /// </summary>
    private bool Survey(int key, int first)
    {
        var length = first - key;
        if (length <= Short)
        {
            return Fill(key, first);
        }

        if (!Put(first - 1, key + (length / 2), key + (3 * length / 4), key + (length / 4)))
        {
            return false;
        }

        for (var step = length / 8; step > 0; step /= 2)
        {
            if (!Put(first - step, key + step, first - (3 * step), key + (3 * step)))
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Puts in all frames between the key and the first unmarked frame, far ones first. False as soon as nothing is left.</summary>
    private bool Fill(int key, int first)
    {
        isWhole = true;
        var block = first - 4;
        for (; block > key + 1; block -= 4)
        {
            if (!Put(stretch.Four(block), stretch.Times(block)))
            {
                return false;
            }
        }

        // The four next to the key, some of them perhaps a second time, which does no harm.
        return first - key > 4 ? Put(stretch.Four(key + 1), stretch.Times(key + 1)) : Put(key + 1, key + 1, Math.Min(key + 2, first - 1), first - 1);
    }

    /// <summary>Puts in any four frames.</summary>
    private bool Put(int a, int b, int c, int d) => Put(stretch.Four(a, b, c, d), stretch.Times(a, b, c, d));

    /// <summary>Puts in four frames. False where nothing is left, or where one of them cannot be passed.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private bool Put(in FourQuats samples, Vector256<double> times)
    {
        FourBalls four = default;
        balls.Of(samples, times, ref four);
        corridor.Narrow(ref four);
        if (Vector256.LessThanAny(Vector256.Abs(four.Facing), Vector256.Create(cosHopeless)))
        {
            corridor.Close();
        }

        return !corridor.IsEmpty;
    }

    /// <summary>
    /// Whether the span from the key to an end that the corridor does not refute plays within the tolerance. Once playing has cost as much
    /// as looking at all frames would, they are looked at: then many ends need not be played.
    /// </summary>
    private bool Plays(int key, int first, int end, in Corridor.Reading velocity)
    {
        if (!isWhole && spent > first - key && (!Fill(key, first) || corridor.Refutes(velocity)))
        {
            return false;
        }

        if (isWhole && corridor.Accepts(velocity))
        {
            return true;
        }

        var breach = SpanCheck.Breach<TCurve>(stretch, key, end, chord, suspects);
        if (breach < 0)
        {
            spent += end - key;
            return true;
        }

        spent += suspects.Add(breach) ? Short : breach - key;
        if (breach < first && !isWhole)
        {
            Put(breach, Math.Min(breach + 1, first - 1), Math.Min(breach + 2, first - 1), Math.Min(breach + 3, first - 1));
        }

        return false;
    }
}
