using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Plays one span and compares it with the samples, four frames at a time. <see cref="KeyPlayback"/> is the plain twin.</summary>
internal static class SpanCheck
{
    /// <summary>The squared chord of an angle in radians.</summary>
    public static double SquaredChord(double angle)
    {
        var s = 2 * Math.Sin(angle / 4);
        return s * s;
    }

    /// <summary>The angle in radians of a squared chord.</summary>
    public static double AngleOf(double squaredChord) => 4 * Math.Asin(Math.Min(1, Math.Sqrt(squaredChord) / 2));

    /// <summary>A frame inside the span that is missed by more than the limit, or -1.</summary>
    /// <param name="stretch">The samples.</param>
    /// <param name="first">First key.</param>
    /// <param name="last">Second key, after the first.</param>
    /// <param name="limit">Largest squared chord.</param>
    /// <param name="suspects">Frames to try first; those not inside the span are passed over.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int Breach<TCurve>(Stretch stretch, int first, int last, double limit, Suspects suspects)
        where TCurve : struct, ICurve<TCurve>
    {
        if (last - first < 2)
        {
            return -1;
        }

        var curve = Between<TCurve>(stretch, first, last);
        var most = Vector256.Create(limit);
        // The suspects come first, as blocks before the first frame, so that the curve stands in the code once and is inlined.
        for (var n = first + 1 - Suspects.Count; n < last; n += 4)
        {
            var (a, b, c, d) = n > first ? (n, n + 1, n + 2, n + 3) : suspects.Inside(n + Suspects.Count - first - 1, first, last);
            var times = n > first ? stretch.Times(n) : stretch.Times(a, b, c, d);
            var samples = n > first ? stretch.Four(n) : stretch.Four(a, b, c, d);
            var bits = Vector256.GreaterThan(curve.SquaredChords(times, samples), most).ExtractMostSignificantBits();
            bits &= n > first && last - n < 4 ? (1u << (last - n)) - 1 : 15;
            if (bits != 0)
            {
                return BitOperations.TrailingZeroCount(bits) switch { 0 => a, 1 => b, 2 => c, _ => d };
            }
        }

        return -1;
    }

    /// <summary>The largest squared chord inside a span; infinite as soon as it is found to be above the ceiling.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static double Largest<TCurve>(Stretch stretch, int first, int last, double ceiling)
        where TCurve : struct, ICurve<TCurve>
    {
        if (last - first < 2)
        {
            return 0;
        }

        var curve = Between<TCurve>(stretch, first, last);
        var (largest, most) = (Vector256<double>.Zero, Vector256.Create(ceiling));
        for (var n = first + 1; n < last; n += 4)
        {
            var chords = curve.SquaredChords(stretch.Times(n), stretch.Four(n)) & Lanes(last - n);
            largest = Vector256.MaxNative(largest, chords);
            if (Vector256.GreaterThanAny(chords, most))
            {
                return double.PositiveInfinity;
            }
        }

        return Math.Max(Math.Max(largest[0], largest[1]), Math.Max(largest[2], largest[3]));
    }

    /// <summary>All bits of the first lanes, as many as asked for, and none of the others.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Vector256<double> Lanes(int count) =>
        Vector256.LessThan(Vector256.Create(0.0, 1, 2, 3), Vector256.Create((double)count));

    private static TCurve Between<TCurve>(Stretch stretch, int first, int last)
        where TCurve : struct, ICurve<TCurve> =>
        TCurve.Through(stretch[first], stretch[last], stretch.Time[first], stretch.Time[last]);
}
