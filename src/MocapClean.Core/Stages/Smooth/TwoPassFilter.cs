using System.Runtime.Intrinsics;
using MathNet.Numerics.LinearAlgebra;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// A second-order filter run forwards and backwards with the initial states of Gustafsson 1996: those for which forwards-then-backwards and
/// backwards-then-forwards differ least. So the result of a reversed series is the reversed result. Four series side by side.
/// </summary>
internal sealed class TwoPassFilter
{
    private readonly ButterworthDesign _design;
    private readonly double[][] _ways;
    private readonly Matrix<double> _solver;

    /// <summary>Prepares the ends for series of this length, at least 3.</summary>
    public TwoPassFilter(ButterworthDesign design, int length)
    {
        _design = design;
        _ways = [.. Ways(0, length), .. Ways(1, length)];
        _solver = Matrix<double>.Build.Dense(4, 4, (k, m) => Enumerable.Range(0, length).Sum(n => Misfit(k, n) * Misfit(m, n))).PseudoInverse();
    }

    /// <summary>Filters a series of this filter's length.</summary>
    public void Run(ReadOnlySpan<Vector256<double>> x, Span<Vector256<double>> y)
    {
        var other = new Vector256<double>[x.Length];
        x.CopyTo(y);
        x.CopyTo(other);
        Pass(y, default, default);
        y.Reverse();
        Pass(y, default, default);
        y.Reverse();
        Array.Reverse(other);
        Pass(other, default, default);
        Array.Reverse(other);
        Pass(other, default, default);
        AddEnds(other, y);
    }

    private double Misfit(int k, int n) => _ways[2 * k][n] - _ways[(2 * k) + 1][n];

    // Least squares for the four states that bring the two orders of passes closest, added to the first order's result.
    private void AddEnds(ReadOnlySpan<Vector256<double>> other, Span<Vector256<double>> y)
    {
        Span<Vector256<double>> misfit = stackalloc Vector256<double>[4];
        for (var n = 0; n < y.Length; n++)
        {
            for (var k = 0; k < 4; k++)
            {
                misfit[k] += Misfit(k, n) * (other[n] - y[n]);
            }
        }

        for (var k = 0; k < 4; k++)
        {
            var state = (_solver[k, 0] * misfit[0]) + (_solver[k, 1] * misfit[1]) + (_solver[k, 2] * misfit[2]) + (_solver[k, 3] * misfit[3]);
            for (var n = 0; n < y.Length; n++)
            {
                y[n] += _ways[2 * k][n] * state;
            }
        }
    }

    // What a unit of the k-th state at the start of the forward pass does to the result, when that pass is first and when it is last;
    // and the same for the backward pass.
    private double[][] Ways(int k, int length)
    {
        var alone = new Vector256<double>[length];
        Pass(alone, Vector256.Create(k == 0 ? 1.0 : 0), Vector256.Create(k == 1 ? 1.0 : 0));
        var last = alone.Select(v => v[0]).ToArray();
        Array.Reverse(alone);
        Pass(alone, default, default);
        Array.Reverse(alone);
        var first = alone.Select(v => v[0]).ToArray();
        return [first, last, [.. last.Reverse()], [.. first.Reverse()]];
    }

    private void Pass(Span<Vector256<double>> series, Vector256<double> one, Vector256<double> two)
    {
        var (b0, a1, a2) = _design;
        for (var n = 0; n < series.Length; n++)
        {
            var x = series[n];
            var y = (b0 * x) + one;
            one = (2 * b0 * x) - (a1 * y) + two;
            two = (b0 * x) - (a2 * y);
            series[n] = y;
        }
    }
}
