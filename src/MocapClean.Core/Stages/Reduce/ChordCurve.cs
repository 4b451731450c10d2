using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Components interpolated as written, then renormalised: along the chord between the two keys.</summary>
internal readonly struct ChordCurve : ICurve<ChordCurve>
{
    private readonly FourQuats from;
    private readonly FourQuats slope;
    private readonly Vector256<double> start;
    private readonly Vector256<double> rate;

    private ChordCurve(Quat a, Quat b, double start, double duration)
    {
        from = Spread(a);
        slope = Spread(b + (-a));
        this.start = Vector256.Create(start);
        rate = Vector256.Create(1 / duration);
    }

    /// <summary>
    /// With the half turn T and x the share of time from the middle, the chord runs ahead by atan(2 x tan(T/2)) - x T on the sphere of
    /// quaternions, most where 4 k^2 x^2 = 2 k / T - 1 with k = tan(T/2); as a turn, twice as much.
    /// </summary>
    public static double Stray(double turn)
    {
        var half = Math.Clamp(turn / 2, 1e-3, (Math.PI / 2) - 1e-6);
        var k = Math.Tan(half / 2);
        var root = Math.Sqrt((2 * k / half) - 1);
        return (2 * (Math.Atan(root) - (half * root / (2 * k)))) + 1e-12;
    }

    /// <summary>Signs are played as written, so a negative inner product is a turn of more than half a circle.</summary>
    public static double CosHalfTurn(double dot) => dot;

    /// <inheritdoc/>
    public static ChordCurve Through(Quat a, Quat b, double start, double end) => new(a, b, start, end - start);

    /// <inheritdoc/>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Vector256<double> SquaredChords(Vector256<double> time, in FourQuats samples)
    {
        var t = (time - start) * rate;
        var (w, x, y, z) = (from.W + (t * slope.W), from.X + (t * slope.X), from.Y + (t * slope.Y), from.Z + (t * slope.Z));
        var scale = Vector256<double>.One / Vector256.Sqrt((w * w) + (x * x) + (y * y) + (z * z));
        return FourQuats.SquaredChords(new(w * scale, x * scale, y * scale, z * scale), samples);
    }

    private static FourQuats Spread(Quat q) =>
        new(Vector256.Create(q.W), Vector256.Create(q.X), Vector256.Create(q.Y), Vector256.Create(q.Z));
}
