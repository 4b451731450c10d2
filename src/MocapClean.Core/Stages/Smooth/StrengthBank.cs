using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>A curve smoothed with one strength throughout, for a ladder of strengths: residuals and leverages of each.</summary>
internal sealed class StrengthBank
{
    /// <summary>A joint that turns to and fro slower than once in four seconds is at rest, as far as noise is concerned.</summary>
    private const double LowestCutoff = 0.25;

    /// <summary>Above this share of the rate nearly everything passes.</summary>
    private const double HighestShare = 0.45;

    /// <summary>
    /// The cutoffs rise by a factor of e^(1/3), 1.4; finer ladders left the same error. A penalty goes with the sixth power of the cutoff.
    /// </summary>
    private const double LogStep = 2;

    /// <summary>Smooths the curve with every strength.</summary>
    public StrengthBank(JointCurve curve, PenaltyRows rows, PenalisedFit fit)
    {
        Cutoffs = Ladder(curve.Rate);
        LogLooseness = [.. Cutoffs.Select(f => 6 * Math.Log(2 * Math.Sin(Math.PI * f / curve.Rate)))];
        Squared = new double[Cutoffs.Length][];
        Leverage = new double[Cutoffs.Length][];
        var squared = new Vector256<double>[rows.Length];
        var leverage = new Vector256<double>[rows.Length];
        for (var k = 0; k < Cutoffs.Length; k += Vector256<double>.Count)
        {
            fit.Factor(Vector256.Create(Looseness(k), Looseness(k + 1), Looseness(k + 2), Looseness(k + 3)), []);
            fit.Leverage(leverage);
            fit.SquaredResiduals(curve.Samples, squared);
            for (var lane = 0; lane < Vector256<double>.Count && k + lane < Cutoffs.Length; lane++)
            {
                Squared[k + lane] = Lane(squared, lane);
                Leverage[k + lane] = Lane(leverage, lane);
            }
        }

        Best = LeastCrossValidation(curve.Length);
    }

    /// <summary>Half-gain cutoffs in hertz, rising.</summary>
    public double[] Cutoffs { get; }

    /// <summary>Logarithm of one over the penalty, rising.</summary>
    public double[] LogLooseness { get; }

    /// <summary>Squared length of sample minus smoothed sample, of each strength.</summary>
    public double[][] Squared { get; }

    /// <summary>Leverage of each sample, of each strength.</summary>
    public double[][] Leverage { get; }

    /// <summary>The strength with the least generalised cross-validation score (Craven and Wahba 1979).</summary>
    public int Best { get; }

    /// <summary>Logarithm of looseness with the least score, by the parabola through the best rung and its neighbours.</summary>
    public double BestLogLooseness => LogLooseness[Best] + (LogStep * Parabola.Lowest(Scores, Best));

    private double[] Scores { get; set; } = [];

    private static double[] Ladder(double rate)
    {
        var count = Math.Max(4, 1 + (int)Math.Floor(6 / LogStep * Math.Log(HighestShare * rate / LowestCutoff)));
        return [.. Enumerable.Range(0, count).Select(k => HighestShare * rate * Math.Exp((k - count + 1) * LogStep / 6))];
    }

    private static double[] Lane(Vector256<double>[] values, int lane)
    {
        var found = new double[values.Length];
        for (var i = 0; i < found.Length; i++)
        {
            found[i] = values[i][lane];
        }

        return found;
    }

    private double Looseness(int k) => Math.Exp(LogLooseness[Math.Min(k, LogLooseness.Length - 1)]);

    private int LeastCrossValidation(int n)
    {
        Scores = new double[Cutoffs.Length];
        for (var k = 0; k < Scores.Length; k++)
        {
            Scores[k] = Math.Log(Math.Max(Squared[k].Sum(), double.Epsilon)) - (2 * Math.Log(n - Leverage[k].Sum()));
        }

        return Array.IndexOf(Scores, Scores.Min());
    }
}
