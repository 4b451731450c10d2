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

        var curve = TCurve.Through(stretch, first, last);
        var most = Vector256.Create(limit);
        for (var k = 0; k < Suspects.Count; k += 4)
        {
            var (a, b) = (suspects.Inside(k, first, last), suspects.Inside(k + 1, first, last));
            var (c, d) = (suspects.Inside(k + 2, first, last), suspects.Inside(k + 3, first, last));
            var found = Beyond(curve, stretch.Times(a, b, c, d), stretch.Four(a, b, c, d), most);
            if (found != 0)
            {
                return BitOperations.TrailingZeroCount(found) switch { 0 => a, 1 => b, 2 => c, _ => d };
            }
        }

        for (var n = first + 1; n < last; n += 4)
        {
            var bits = Beyond(curve, stretch.Times(n), stretch.Four(n), most) & (last - n < 4 ? (1u << (last - n)) - 1 : 15);
            if (bits != 0)
            {
                return n + BitOperations.TrailingZeroCount(bits);
            }
        }

        return -1;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static uint Beyond<TCurve>(in TCurve curve, Vector256<double> times, in FourQuats samples, Vector256<double> most)
        where TCurve : struct, ICurve<TCurve> =>
        Vector256.GreaterThan(curve.SquaredChords(times, samples), most).ExtractMostSignificantBits();
}
