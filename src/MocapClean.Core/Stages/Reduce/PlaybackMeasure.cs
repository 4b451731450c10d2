using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Plays keys at every frame, four frames at a time, and measures how far each present sample is from what is played.</summary>
internal static class PlaybackMeasure
{
    /// <summary>Up to this squared chord the series below is exact within 1e-12 of the angle squared.</summary>
    private const double SeriesReach = 0.05;

    /// <summary>The measure of <see cref="KeyPlayback.Measure"/>.</summary>
    public static PlaybackError Of<TCurve>(
        ReadOnlySpan<int> frames, ReadOnlySpan<Quat> keys, ReadOnlySpan<double> times, ReadOnlySpan<Quat> samples)
        where TCurve : struct, ICurve<TCurve>
    {
        if (frames.IsEmpty)
        {
            return new PlaybackError(0, 0, -1);
        }

        var (first, last) = (frames[0], frames[^1]);
        using var stretch = new Stretch(samples.Slice(first, last - first + 1), times.Slice(first, last - first + 1));
        var sum = new ErrorSum { Largest = -1, LargestAt = -1 };
        for (var k = 0; k + 1 < frames.Length; k++)
        {
            var (a, b) = (frames[k] - first, frames[k + 1] - first);
            sum.Add(TCurve.Through(keys[k], keys[k + 1], stretch.Time[a], stretch.Time[b]), stretch, a, b);
        }

        // The last key stands for itself.
        var end = stretch.Time[last - first];
        sum.Add(TCurve.Through(keys[^1], keys[^1], end, end + 1), stretch, last - first, last - first + 1);
        return sum.Count == 0
            ? new PlaybackError(0, 0, -1)
            : new PlaybackError(SpanCheck.AngleOf(sum.Largest), Math.Sqrt(sum.Squares / sum.Count), sum.LargestAt + first);
    }

    /// <summary>
    /// Squares of the angles of squared chords c: 16 asin^2(sqrt(c) / 2), by its power series where c is small.
    /// </summary>
    private static Vector256<double> AnglesSquared(Vector256<double> c)
    {
        if (Vector256.GreaterThanAny(c, Vector256.Create(SeriesReach)))
        {
            var (a, b) = (SpanCheck.AngleOf(c[0]), SpanCheck.AngleOf(c[1]));
            var (d, e) = (SpanCheck.AngleOf(c[2]), SpanCheck.AngleOf(c[3]));
            return Vector256.Create(a * a, b * b, d * d, e * e);
        }

        var sum = Vector256.Create(8 / 33264.0);
        sum = (sum * c) + Vector256.Create(8 / 6300.0);
        sum = (sum * c) + Vector256.Create(8 / 1120.0);
        sum = (sum * c) + Vector256.Create(8 / 180.0);
        sum = (sum * c) + Vector256.Create(8 / 24.0);
        sum = (sum * c) + Vector256.Create(4.0);
        return sum * c;
    }

    private struct ErrorSum
    {
        public double Largest;
        public int LargestAt;
        public double Squares;
        public int Count;

        [MethodImpl(MethodImplOptions.AggressiveOptimization)]
        public void Add<TCurve>(in TCurve curve, Stretch stretch, int from, int to)
            where TCurve : struct, ICurve<TCurve>
        {
            for (var n = from; n < to; n += 4)
            {
                var chords = curve.SquaredChords(stretch.Times(n), stretch.Four(n));
                // What is missing is not a number, and unequal to itself.
                var there = Vector256.Equals(chords, chords) & SpanCheck.Lanes(to - n);
                chords &= there;
                var above = (Vector256.GreaterThan(chords, Vector256.Create(Largest)) & there).ExtractMostSignificantBits();
                for (; above != 0; above &= above - 1)
                {
                    var k = BitOperations.TrailingZeroCount(above);
                    (Largest, LargestAt) = chords[k] > Largest ? (chords[k], n + k) : (Largest, LargestAt);
                }

                Count += BitOperations.PopCount(there.ExtractMostSignificantBits());
                Squares += Vector256.Sum(AnglesSquared(chords));
            }
        }
    }
}
