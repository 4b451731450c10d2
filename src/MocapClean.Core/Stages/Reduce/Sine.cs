using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// Sine and cosine of four angles in [0, pi/2] radians by their Taylor series, without range reduction. Products and sums are rounded one by
/// one, never fused, so that every machine gives the same bits.
/// </summary>
internal static class Sine
{
    /// <summary>Sines and cosines, each within 1e-15 up to pi/2.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static (Vector256<double> Sine, Vector256<double> Cosine) Of(Vector256<double> angle)
    {
        var z = angle * angle;
        var s = Vector256.Create(1 / 51090942171709440000.0);
        s = Next(s, z, -1 / 121645100408832000.0);
        s = Next(s, z, 1 / 355687428096000.0);
        s = Next(s, z, -1 / 1307674368000.0);
        s = Next(s, z, 1 / 6227020800.0);
        s = Next(s, z, -1 / 39916800.0);
        s = Next(s, z, 1 / 362880.0);
        s = Next(s, z, -1 / 5040.0);
        s = Next(s, z, 1 / 120.0);
        s = Next(s, z, -1 / 6.0);
        var c = Vector256.Create(1 / 2432902008176640000.0);
        c = Next(c, z, -1 / 6402373705728000.0);
        c = Next(c, z, 1 / 20922789888000.0);
        c = Next(c, z, -1 / 87178291200.0);
        c = Next(c, z, 1 / 479001600.0);
        c = Next(c, z, -1 / 3628800.0);
        c = Next(c, z, 1 / 40320.0);
        c = Next(c, z, -1 / 720.0);
        c = Next(c, z, 1 / 24.0);
        c = Next(c, z, -0.5);
        return (angle + (angle * (z * s)), Next(c, z, 1));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> Next(Vector256<double> sum, Vector256<double> z, double coefficient) =>
        (sum * z) + Vector256.Create(coefficient);
}
