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
    private readonly Vector256<double>[] _effects;
    private readonly Vector256<double>[] _misfits;
    private readonly Matrix<double> _solver;

    /// <summary>Prepares the ends for series of this length, at least 3.</summary>
    public TwoPassFilter(ButterworthDesign design, int length)
    {
        _design = design;
        _effects = new Vector256<double>[length];
        _misfits = new Vector256<double>[length];
        FollowStates();
        Span<Vector256<double>> gram = stackalloc Vector256<double>[4];
        foreach (var m in _misfits)
        {
            for (var k = 0; k < 4; k++)
            {
                gram[k] += m[k] * m;
            }
        }

        var squares = gram.ToArray();
        _solver = Matrix<double>.Build.Dense(4, 4, (k, j) => squares[k][j]).PseudoInverse();
    }

    /// <summary>Filters a series of this filter's length.</summary>
    public void Run(ReadOnlySpan<Vector256<double>> x, Span<Vector256<double>> y)
    {
        var other = new Vector256<double>[x.Length];
        x.CopyTo(y);
        Pass(y, default, default);
        y.Reverse();
        Pass(y, default, default);
        y.Reverse();
        x.CopyTo(other);
        Array.Reverse(other);
        Pass(other, default, default);
        Array.Reverse(other);
        Pass(other, default, default);
        AddEnds(other, y);
    }

    // A lane for each of four states that may differ from 0: the two at the start of the forward pass, the two at the start of the backward
    // one. Their effect on the result when the forward pass comes first, and how much that differs from the effect when it comes last.
    private void FollowStates()
    {
        var n = _effects.Length;
        var last = new Vector256<double>[n];
        Pass(last, Vector256.Create(1.0, 0, 0, 0), Vector256.Create(0, 1.0, 0, 0));
        var first = last.Reverse().ToArray();
        Pass(first, default, default);
        Array.Reverse(first);
        for (var i = 0; i < n; i++)
        {
            var (near, far) = (last[i], last[n - 1 - i]);
            var (passed, passedFar) = (first[i], first[n - 1 - i]);
            _effects[i] = Vector256.Create(passed[0], passed[1], far[0], far[1]);
            _misfits[i] = _effects[i] - Vector256.Create(near[0], near[1], passedFar[0], passedFar[1]);
        }
    }

    // Least squares for the four states that bring the two orders of passes closest, added to the first order's result.
    private void AddEnds(ReadOnlySpan<Vector256<double>> other, Span<Vector256<double>> y)
    {
        Span<Vector256<double>> misfit = stackalloc Vector256<double>[4];
        for (var n = 0; n < y.Length; n++)
        {
            var difference = other[n] - y[n];
            for (var k = 0; k < 4; k++)
            {
                misfit[k] += _misfits[n][k] * difference;
            }
        }

        Span<Vector256<double>> states = stackalloc Vector256<double>[4];
        for (var k = 0; k < 4; k++)
        {
            states[k] = (_solver[k, 0] * misfit[0]) + (_solver[k, 1] * misfit[1]) + (_solver[k, 2] * misfit[2]) + (_solver[k, 3] * misfit[3]);
        }

        for (var n = 0; n < y.Length; n++)
        {
            var effect = _effects[n];
            y[n] += (effect[0] * states[0]) + (effect[1] * states[1]) + (effect[2] * states[2]) + (effect[3] * states[3]);
        }
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
