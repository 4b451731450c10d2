using System.Buffers;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// How strongly to smooth around each sample. Every strength of a bank is judged there by Stein's unbiased estimate of its error (1981),
/// residual plus twice the noise times the leverage, and the strengths are averaged with exponential weights (Leung and Barron 2006).
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

    /// <summary>Time over which the strength may change: a movement.</summary>
    private const double EaseSeconds = 0.6;

    private static readonly Vector256<long> First = Vector256.Create(0L, 0, 0, 0);
    private static readonly Vector256<long> Last = Vector256.Create(3L, 3, 3, 3);
    private static readonly Vector256<long> OneOn = Vector256.Create(0L, 0, 1, 2);
    private static readonly Vector256<long> TwoOn = Vector256.Create(0L, 0, 0, 1);
    private static readonly Vector256<double> FromOne = Vector256.Create(0L, -1, -1, -1).AsDouble();
    private static readonly Vector256<double> FromTwo = Vector256.Create(0L, 0, -1, -1).AsDouble();

    /// <summary>Adds to each sample's logarithm of looseness the one that the bank holds best there.</summary>
    /// <param name="bank">The curve smoothed with each strength.</param>
    /// <param name="curve">Stretches and rate.</param>
    /// <param name="windows">Seconds over which the strengths of each group are compared, none longer than the first.</param>
    /// <param name="variance">Noise variance of an axis, in the bank's units.</param>
    /// <param name="logs">One logarithm a sample.</param>
    public static void Choose(StrengthBank bank, JointCurve curve, ReadOnlySpan<double> windows, double variance, Span<double> logs)
    {
        var n = curve.Length;
        var pool = ArrayPool<Vector256<double>>.Shared;
        var errors = pool.Rent(bank.Groups * n);
        var chosen = pool.Rent(n);
        var widest = MovingMean.Reach(Math.Max(EaseSeconds, windows[0]), curve.Rate);
        var spare = pool.Rent(MovingMean.Room(n, widest));
        Errors(bank, curve, windows, variance, errors, spare);
        for (var i = 0; i < n; i++)
        {
            chosen[i] = Average(bank, errors.AsSpan(i * bank.Groups, bank.Groups), Temperature * variance);
        }

        MovingMean.Triangular(chosen.AsSpan(0, n), curve.Starts, MovingMean.Reach(EaseSeconds, curve.Rate), spare);
        for (var i = 0; i < n; i++)
        {
            logs[i] += chosen[i][0];
        }

        pool.Return(errors);
        pool.Return(chosen);
        pool.Return(spare);
    }

    /// <summary>Looseness of the third difference that ends at each sample, which is centred between the two samples before.</summary>
    public static void OfRows(ReadOnlySpan<double> logs, Span<double> local)
    {
        for (var i = 2; i < logs.Length; i++)
        {
            local[i] = Math.Exp((logs[i - 1] + logs[i - 2]) / 2);
        }
    }

    // Estimated error of each strength around each sample, less that of the strongest: made up of the steps from rung to rung, each averaged
    // over the window of its group and counted as often as a triangle of that width counts. All groups of a sample lie together.
    private static void Errors(
        StrengthBank bank, JointCurve curve, ReadOnlySpan<double> windows, double variance, Vector256<double>[] errors, Vector256<double>[] spare)
    {
        var (n, groups) = (curve.Length, bank.Groups);
        var rented = ArrayPool<Vector256<double>>.Shared.Rent(n);
        var steps = rented.AsSpan(0, n);
        for (var g = 0; g < groups; g++)
        {
            Steps(bank, g, 2 * Caution * 3 * variance, steps);
            var reach = MovingMean.Reach(windows[g], curve.Rate);
            MovingMean.Triangular(steps, curve.Starts, reach, spare);
            for (var i = 0; i < n; i++)
            {
                // Running sums within the group in two turns, on top of the last rung of the group before.
                var sums = 3 * reach * steps[i];
                sums += Vector256.Shuffle(sums, OneOn) & FromOne;
                sums += Vector256.Shuffle(sums, TwoOn) & FromTwo;
                errors[(i * groups) + g] = g == 0 ? sums : sums + Vector256.Shuffle(errors[(i * groups) + g - 1], Last);
            }
        }

        ArrayPool<Vector256<double>>.Shared.Return(rented);
    }

    // From each rung of a group to the next, the first one from the last rung of the group before.
    private static void Steps(StrengthBank bank, int group, double penalty, Span<Vector256<double>> steps)
    {
        var squared = bank.Squared(group);
        var leverage = bank.Leverage(group);
        var squaredBefore = bank.Squared(Math.Max(0, group - 1));
        var leverageBefore = bank.Leverage(Math.Max(0, group - 1));
        for (var i = 0; i < steps.Length; i++)
        {
            var rungs = squared[i] + (penalty * leverage[i]);
            var earlier = group == 0 ? Vector256.Shuffle(rungs, First) : Vector256.Shuffle(squaredBefore[i] + (penalty * leverageBefore[i]), Last);
            steps[i] = rungs - Vector256.ConditionalSelect(FromOne, Vector256.Shuffle(rungs, OneOn), earlier);
        }
    }

    // exp(-x) as (1 - x / 1024)^1024, whose weights differ by less than a hundredth where they matter; for all lanes at once.
    private static Vector256<double> Average(StrengthBank bank, ReadOnlySpan<Vector256<double>> errors, double temperature)
    {
        var least = errors[0];
        foreach (var e in errors)
        {
            least = Vector256.Min(least, e);
        }

        var lowest = Vector256.Create(Math.Min(Math.Min(least[0], least[1]), Math.Min(least[2], least[3])));
        var (sum, weights) = (Vector256<double>.Zero, Vector256<double>.Zero);
        for (var g = 0; g < errors.Length; g++)
        {
            var weight = Vector256.Max(Vector256<double>.Zero, Vector256<double>.One - ((errors[g] - lowest) / (temperature * 1024)));
            for (var turn = 0; turn < 10; turn++)
            {
                weight *= weight;
            }

            sum += weight * Vector256.Create(bank.LogLooseness, g * StrengthBank.Lanes);
            weights += weight;
        }

        return Vector256.Create(Vector256.Sum(sum) / Vector256.Sum(weights));
    }
}
