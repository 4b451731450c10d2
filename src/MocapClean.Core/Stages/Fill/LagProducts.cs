using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Fill;

/// <summary>Sums of products of a series with itself some lags later: the raw matter of an autocovariance.</summary>
internal static class LagProducts
{
    /// <summary>
    /// The autocovariance of weighted vectors, per axis: <c>sum w[i] w[i+l] v[i].v[i+l] / (3 sum w[i] w[i+l])</c> for lags 0 to
    /// <paramref name="longest"/>; 0 where no pair has weight. Summed directly: at some hundred lags as quick as a transform.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static double[] Autocovariance(ReadOnlySpan<Vec3> vectors, ReadOnlySpan<double> weights, int longest)
    {
        var count = vectors.Length;
        var (x, y, z) = (new double[count], new double[count], new double[count]);
        for (var i = 0; i < count; i++)
        {
            (x[i], y[i], z[i]) = (weights[i] * vectors[i].X, weights[i] * vectors[i].Y, weights[i] * vectors[i].Z);
        }

        var result = new double[longest + 1];
        for (var l = 0; l <= Math.Min(longest, count - 1); l++)
        {
            var pairs = Dot(weights[..^l], weights[l..]);
            var sum = Dot(x.AsSpan()[..^l], x.AsSpan(l)) + Dot(y.AsSpan()[..^l], y.AsSpan(l)) + Dot(z.AsSpan()[..^l], z.AsSpan(l));
            result[l] = pairs > 0 ? sum / (3 * pairs) : 0;
        }

        return result;
    }

    /// <summary>Inner product of two spans of equal length, several numbers at a time.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        var wide = MemoryMarshal.Cast<double, Vector<double>>(a);
        var wideB = MemoryMarshal.Cast<double, Vector<double>>(b);
        var (even, odd) = (Vector<double>.Zero, Vector<double>.Zero);
        var i = 0;
        for (; i + 1 < wide.Length; i += 2)
        {
            even += wide[i] * wideB[i];
            odd += wide[i + 1] * wideB[i + 1];
        }

        even += i < wide.Length ? wide[i] * wideB[i] : Vector<double>.Zero;
        var sum = Vector.Sum(even + odd);
        for (i = wide.Length * Vector<double>.Count; i < a.Length; i++)
        {
            sum += a[i] * b[i];
        }

        return sum;
    }
}
