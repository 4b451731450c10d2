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
    /// <param name="suspect">A frame to try first; one that is not inside the span is not tried.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static int Breach<TCurve>(Stretch stretch, int first, int last, double limit, int suspect)
        where TCurve : struct, ICurve<TCurve>
    {
        var curve = TCurve.Through(stretch, first, last);
        var most = Vector256.Create(limit);
        if (suspect > first && suspect < last && Beyond(stretch, curve, most, suspect, last) is var at and >= 0)
        {
            return at;
        }

        for (var n = first + 1; n < last; n += 4)
        {
            if (Beyond(stretch, curve, most, n, last) is var found and >= 0)
            {
                return found;
            }
        }

        return -1;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static int Beyond<TCurve>(Stretch stretch, in TCurve curve, Vector256<double> most, int n, int last)
        where TCurve : struct, ICurve<TCurve>
    {
        var chords = curve.SquaredChords(stretch.Times(n), stretch.Four(n));
        var bits = Vector256.GreaterThan(chords, most).ExtractMostSignificantBits();
        bits &= last - n < 4 ? (1u << (last - n)) - 1 : 15;
        return bits == 0 ? -1 : n + BitOperations.TrailingZeroCount(bits);
    }
}
