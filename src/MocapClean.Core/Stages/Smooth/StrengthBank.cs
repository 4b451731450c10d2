using System.Buffers;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>A curve smoothed with each of a ladder of strengths: residuals and leverages of each, four strengths side by side.</summary>
internal sealed class StrengthBank : IDisposable
{
    /// <summary>Strengths that stand side by side in a vector.</summary>
    public const int Lanes = 4;

    private readonly int _length;
    private readonly Vector256<double>[][] _squared;
    private readonly Vector256<double>[][] _leverage;
    private readonly double[,] _totals;

    /// <summary>Smooths the curve with every strength.</summary>
    /// <param name="fit">A fit with the curve's rows.</param>
    /// <param name="curve">Four components a sample.</param>
    /// <param name="logLooseness">Logarithms of one over the strength, evenly rising, a multiple of four of them.</param>
    /// <param name="local">Looseness of each row that these multiply; empty where it is 1.</param>
    public StrengthBank(
        PenalisedFit fit, ReadOnlySpan<Vector256<double>> curve, double[] logLooseness, ReadOnlySpan<double> local)
    {
        _length = curve.Length;
        LogLooseness = logLooseness;
        _squared = new Vector256<double>[logLooseness.Length / Lanes][];
        _leverage = new Vector256<double>[Groups][];
        _totals = new double[logLooseness.Length, 5];
        for (var g = 0; g < Groups; g++)
        {
            _squared[g] = ArrayPool<Vector256<double>>.Shared.Rent(_length);
            _leverage[g] = ArrayPool<Vector256<double>>.Shared.Rent(_length);
            Smooth(fit, curve, local, g);
        }
    }

    /// <summary>Logarithms of one over the strength, evenly rising.</summary>
    public double[] LogLooseness { get; }

    /// <summary>Number of vectors of strengths.</summary>
    public int Groups => _squared.Length;

    /// <summary>Squared length of sample minus smoothed sample, for the strengths of a group.</summary>
    public ReadOnlySpan<Vector256<double>> Squared(int group) => _squared[group].AsSpan(0, _length);

    /// <summary>Leverage of each sample, for the strengths of a group.</summary>
    public ReadOnlySpan<Vector256<double>> Leverage(int group) => _leverage[group].AsSpan(0, _length);

    /// <summary>
    /// The strength with the least generalised cross-validation score over all components (Craven and Wahba 1979), and its looseness by the
    /// parabola through its neighbours.
    /// </summary>
    public (int Rung, double Looseness) LeastCrossValidation() =>
        Least(k => Math.Log(Math.Max(Total(k, 0) + Total(k, 1) + Total(k, 2) + Total(k, 3), double.Epsilon))
            - (2 * Math.Log(Math.Max(_length - Trace(k), double.Epsilon))));

    /// <summary>The looseness with the least estimated error of one component, given the noise: Mallows' criterion (1973).</summary>
    public double LeastError(int component, double variance) =>
        Least(k => Total(k, component) + (2 * LocalStrength.Caution * variance * Trace(k))).Looseness;

    /// <summary>Noise variance of an axis, in the curve's units, by what the strength of a rung took away.</summary>
    public double NoiseVariance(int rung, double least)
    {
        var (squared, leverage) = (new double[_length], new double[_length]);
        for (var i = 0; i < _length; i++)
        {
            squared[i] = _squared[rung / Lanes][i][rung % Lanes];
            leverage[i] = _leverage[rung / Lanes][i][rung % Lanes];
        }

        return NoiseEstimate.Variance(squared, leverage, least);
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        for (var g = 0; g < Groups; g++)
        {
            ArrayPool<Vector256<double>>.Shared.Return(_squared[g]);
            ArrayPool<Vector256<double>>.Shared.Return(_leverage[g]);
        }
    }

    private void Smooth(PenalisedFit fit, ReadOnlySpan<Vector256<double>> curve, ReadOnlySpan<double> local, int group)
    {
        Span<Vector256<double>> totals = stackalloc Vector256<double>[5];
        fit.Factor(Vector256.Exp(Vector256.Create(LogLooseness, group * Lanes)), local);
        fit.Leverage(_leverage[group]);
        fit.SquaredResiduals(curve, _squared[group], totals[..4]);
        foreach (var h in Leverage(group))
        {
            totals[4] += h;
        }

        for (var n = 0; n < Lanes * 5; n++)
        {
            _totals[(group * Lanes) + (n / 5), n % 5] = totals[n % 5][n / 5];
        }
    }

    private double Total(int rung, int component) => _totals[rung, component];

    private double Trace(int rung) => _totals[rung, 4];

    private (int Rung, double Looseness) Least(Func<int, double> score)
    {
        var scores = Enumerable.Range(0, LogLooseness.Length).Select(score).ToArray();
        var best = Array.IndexOf(scores, scores.Min());
        return (best, Math.Exp(LogLooseness[best] + ((LogLooseness[1] - LogLooseness[0]) * Parabola.Lowest(scores, best))));
    }
}
