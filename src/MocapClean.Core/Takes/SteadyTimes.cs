using System.Collections.Immutable;

namespace MocapClean.Core.Takes;

/// <summary>Strictly rising times for computing, made from delivered ones: see <see cref="Clock.Steady"/>.</summary>
/// <param name="measured">Seconds between frames in the delivered times.</param>
/// <param name="exact">The rate that is meant; null where the measured one is the best known.</param>
/// <param name="slack">What rounding can move a time by, seconds.</param>
internal sealed class SteadyTimes(double measured, FrameRate? exact, double slack)
{
    // A frame whose time does not rise is squeezed in before the next good time, but no tighter than this share of an interval.
    private const double Tightest = 0.4;

    // A time further ahead than so many intervals (a hundred days at 120 Hz) is no time of this take.
    private const double Wild = 1e9;

    // A line through two rounded times can miss the others by twice the rounding.
    private readonly double allowed = exact is null ? 2 * slack : slack;

    /// <summary>The times, one for each delivered one.</summary>
    public ImmutableArray<double> Place(ReadOnlySpan<double> times)
    {
        var ticks = Ticks(times);
        var steady = times.ToArray();
        SnapToGrid(times, ticks, steady);
        PlaceOthers(ticks, steady);
        return ImmutableArray.Create(steady);
    }

    /// <summary>The tick of the grid that each frame belongs to, -1 where its time cannot be believed.</summary>
    private long[] Ticks(ReadOnlySpan<double> times)
    {
        var ticks = new long[times.Length];
        var first = FirstBelieved(times);
        Array.Fill(ticks, -1, 0, first);
        var (last, tick, ahead) = (times[first], 0L, 0);
        for (var n = first + 1; n < times.Length; n++)
        {
            var step = times[n] - last;
            var jumps = step > (1.5 * measured) + (2 * slack);
            var comesBack = n + 1 < times.Length && times[n + 1] < times[n] && times[n + 1] > last;
            if (jumps && (comesBack || step > Wild * measured))
            {
                ticks[n] = -1; // far ahead, and the next one back in place
            }
            else if (ClockReading.Stalls(step, measured, slack))
            {
                ticks[n] = -1;
                ahead = NextAbove(times, last, Math.Max(ahead, n));
                var room = ahead < times.Length ? times[ahead] - last : 0;
                if (room >= Tightest * measured * (ahead - n + 1))
                {
                    Array.Fill(ticks, -1, n, ahead - n);
                    n = ahead - 1;
                }
                else
                {
                    (last, tick) = (last + measured, tick + 1); // the clock is lost: count on
                }
            }
            else
            {
                (last, tick) = (times[n], tick + (jumps ? (long)Math.Round(step / measured) : 1));
                ticks[n] = tick;
            }
        }

        return ticks;
    }

    /// <summary>Frame 0, or 1 where the clock runs back or leaps ages between the two: then the first time is the wrong one.</summary>
    private int FirstBelieved(ReadOnlySpan<double> times)
    {
        var step = times.Length > 2 ? times[1] - times[0] : measured;
        return step < -2 * slack || step > Wild * measured ? 1 : 0;
    }

    private static int NextAbove(ReadOnlySpan<double> times, double last, int from)
    {
        while (from < times.Length && times[from] <= last)
        {
            from++;
        }

        return from;
    }

    /// <summary>Puts each stretch of frames that agrees with an even grid on it; others keep their delivered times.</summary>
    private void SnapToGrid(ReadOnlySpan<double> times, long[] ticks, double[] steady)
    {
        for (var first = FirstBelieved(times); first < times.Length;)
        {
            var (low, high, end) = (double.NegativeInfinity, double.PositiveInfinity, first);
            for (; end < times.Length; end++)
            {
                if (ticks[end] < 0)
                {
                    continue;
                }

                // Where the grid's origin may lie for this time to be on it.
                var origin = times[end] - ((ticks[end] - ticks[first]) * measured);
                var (lower, upper) = (Math.Max(low, origin - allowed), Math.Min(high, origin + allowed));
                if (lower > upper + (1e-6 * slack))
                {
                    break;
                }

                (low, high) = (lower, upper);
            }

            first = Snap(times[first], (low, high), ticks, steady, first, end);
        }
    }
    /// <summary>Writes the grid of frames first to end, its origin as near to the delivered time as it may lie; returns end.</summary>
    private int Snap(double delivered, (double Low, double High) origin, long[] ticks, double[] steady, int first, int end)
    {
        var start = Math.Clamp(delivered, Math.Min(origin.Low, origin.High), Math.Max(origin.Low, origin.High));
        for (var n = first; n < end; n++)
        {
            var ran = ticks[n] - ticks[first];
            steady[n] = ticks[n] < 0 ? steady[n] : start + (exact?.TimeOf(ran) ?? (ran * measured));
        }

        return end;
    }

    /// <summary>Gives the frames without a tick a time between their neighbours, or one interval on; then all times rise.</summary>
    private void PlaceOthers(long[] ticks, double[] steady)
    {
        steady[0] = ticks[0] < 0 ? steady[1] - measured : steady[0];
        for (var n = 1; n < steady.Length; n++)
        {
            var next = n;
            while (next < steady.Length && ticks[next] < 0)
            {
                next++;
            }

            var room = next < steady.Length ? (steady[next] - steady[n - 1]) / (next - n + 1) : measured;
            var step = room >= 0.9 * Tightest * measured ? Math.Min(room, measured) : measured;
            for (; n < next; n++)
            {
                steady[n] = Later(steady[n - 1], step);
            }

            if (n < steady.Length && steady[n] <= steady[n - 1])
            {
                steady[n] = Later(steady[n - 1], measured);
            }
        }
    }

    private static double Later(double time, double step) => Math.Max(time + step, Math.BitIncrement(time));
}
