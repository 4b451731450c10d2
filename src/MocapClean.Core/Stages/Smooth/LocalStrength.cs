using System.Buffers;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// How strongly to smooth at each sample. Every strength of the bank is judged around the sample by Stein's unbiased estimate of its error,
/// residual plus twice the noise times the leverage (Stein 1981); the strengths are averaged with exponential weights (Leung and Barron 2006).
/// </summary>
internal static class LocalStrength
{
    /// <summary>
    /// Weight on the leverage beyond the unbiased 1: an estimate that is least by chance is mostly one that smooths too little
    /// (Kim and Gu 2004, who take up to 1.4).
    /// </summary>
    public const double Caution = 1.2;

    /// <summary>Temperature of the exponential weights in noise variances, the value for which Leung and Barron prove their bound.</summary>
    private const double Temperature = 4;

    /// <summary>Two strengths are compared over two periods of the weaker one's cutoff: less is no more than its own memory ...</summary>
    private const double Periods = 2;

    /// <summary>... but over no less than a short movement takes ...</summary>
    private const double ShortestSeconds = 0.4;

    /// <summary>... and no more than a rest lasts.</summary>
    private const double LongestSeconds = 4;

    /// <summary>Time over which the strength may change, a movement.</summary>
    private const double EaseSeconds = 0.6;

    /// <summary>Looseness (one over the strength) of the difference that ends at each sample.</summary>
    /// <param name="bank">The curve smoothed with each strength.</param>
    /// <param name="curve">The curve.</param>
    /// <param name="variance">Noise variance of an axis, in quaternion units.</param>
    public static double[] Choose(StrengthBank bank, JointCurve curve, double variance)
    {
        var n = curve.Length;
        var spare = ArrayPool<double>.Shared.Rent(2 * n);
        var logs = new double[n];
        var errors = Errors(bank, curve, variance, spare);
        for (var i = 0; i < n; i++)
        {
            logs[i] = Average(bank.LogLooseness, errors, i, Temperature * variance);
        }

        MovingMean.Triangular(logs, curve.Starts, Reach(EaseSeconds, curve.Rate), spare);
        ArrayPool<double>.Shared.Return(spare);
        var local = new double[n];
        for (var i = 2; i < n; i++)
        {
            // A third difference is centred between the two samples before its last.
            local[i] = Math.Exp((logs[i - 1] + logs[i - 2]) / 2);
        }

        return local;
    }

    // Estimated error of each strength around each sample, less that of the strongest: made up of the steps from rung to rung, each averaged
    // over its own window and counted as often as a triangle of that width counts.
    private static double[][] Errors(StrengthBank bank, JointCurve curve, double variance, double[] spare)
    {
        var n = curve.Length;
        var errors = new double[bank.Cutoffs.Length][];
        errors[0] = new double[n];
        var penalty = 2 * Caution * 3 * variance;
        for (var k = 1; k < errors.Length; k++)
        {
            var step = new double[n];
            for (var i = 0; i < n; i++)
            {
                step[i] = bank.Squared[k][i] - bank.Squared[k - 1][i] + (penalty * (bank.Leverage[k][i] - bank.Leverage[k - 1][i]));
            }

            var reach = Reach(Math.Clamp(Periods / bank.Cutoffs[k], ShortestSeconds, LongestSeconds), curve.Rate);
            MovingMean.Triangular(step, curve.Starts, reach, spare);
            for (var i = 0; i < n; i++)
            {
                step[i] = errors[k - 1][i] + (3 * reach * step[i]);
            }

            errors[k] = step;
        }

        return errors;
    }

    private static double Average(double[] logLooseness, double[][] errors, int i, double temperature)
    {
        var least = double.PositiveInfinity;
        foreach (var e in errors)
        {
            least = Math.Min(least, e[i]);
        }

        var (sum, weights) = (0.0, 0.0);
        for (var k = 0; k < errors.Length; k++)
        {
            var cold = (errors[k][i] - least) / temperature;
            var weight = cold < 40 ? Math.Exp(-cold) : 0;
            sum += weight * logLooseness[k];
            weights += weight;
        }

        return sum / weights;
    }

    // A triangle of this whole width is two even windows of half of it.
    private static int Reach(double seconds, double rate) => Math.Max(1, (int)Math.Round(seconds * rate / 4));
}
