using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Third-difference penalty whose strength follows the motion, strong where the joint rests and weak where it moves fast.
/// First the four components are smoothed with the strength that <see cref="LocalStrength"/> finds around each sample. Along that rough curve
/// the samples are unrolled (<see cref="Unrolled"/>), the local strength is found once more from there, and each principal axis is smoothed
/// with that strength times a factor of its own, chosen by its estimated error. All traces are exact, all in time linear in samples.
/// </summary>
internal sealed class AdaptiveSmoother : ISmoother
{
    /// <summary>Two strengths are compared over two periods of the stronger one's cutoff: less is no more than its own memory ...</summary>
    private const double Periods = 2;

    /// <summary>... but over no less than a short movement takes ...</summary>
    private const double ShortestSeconds = 0.4;

    /// <summary>... and no more than a rest lasts.</summary>
    private const double LongestSeconds = 4;

    /// <summary>The second time, over the middle of these.</summary>
    private const double SecondSeconds = 2;

    /// <inheritdoc/>
    public int Shortest => 10;

    /// <inheritdoc/>
    public SmoothedCurve Smooth(JointCurve curve)
    {
        var rows = new PenaltyRows(3, curve.Times, curve.Starts);
        using var fit = new PenalisedFit(rows);
        var logs = new double[curve.Length];
        var local = new double[curve.Length];
        var variance = FirstStrength(curve, fit, logs);
        LocalStrength.OfRows(logs, local);
        var (rough, lengths) = Rough(curve, fit, local);
        var unrolled = new Unrolled(curve, rough);
        // An angle is twice the length of its quaternion's vector.
        SecondStrength(curve, fit, unrolled, 4 * variance, logs, local);
        LocalStrength.OfRows(logs, local);

        var work = new Vector256<double>[curve.Length];
        fit.Factor(Vector256<double>.One, local);
        fit.Fit(unrolled.Values, work);
        unrolled.AlignAxes(work, rows, local);
        using (var axes = new StrengthBank(fit, unrolled.Values, StrengthLadder.Near, local))
        {
            var (x, y, z) = (axes.LeastError(0, 4 * variance), axes.LeastError(1, 4 * variance), axes.LeastError(2, 4 * variance));
            fit.Factor(Vector256.Create(x, y, z, 1), local);
        }

        return RollUp(unrolled, fit, lengths, work);
    }

    private static double FirstStrength(JointCurve curve, PenalisedFit fit, double[] logs)
    {
        var samples = MemoryMarshal.Cast<Quat, Vector256<double>>(curve.Samples);
        using var bank = new StrengthBank(fit, samples, StrengthLadder.Whole(curve.Rate), []);
        var variance = bank.NoiseVariance(bank.LeastCrossValidation().Rung, curve.Finest);
        var windows = new double[bank.Groups];
        for (var g = 0; g < windows.Length; g++)
        {
            var cutoff = StrengthLadder.Cutoff(bank.LogLooseness[g * StrengthBank.Lanes], curve.Rate);
            windows[g] = Math.Clamp(Periods / cutoff, ShortestSeconds, LongestSeconds);
        }

        LocalStrength.Choose(bank, curve, windows, variance, logs);
        return variance;
    }

    private static void SecondStrength(
        JointCurve curve, PenalisedFit fit, Unrolled unrolled, double variance, double[] logs, ReadOnlySpan<double> local)
    {
        using var bank = new StrengthBank(fit, unrolled.Values, StrengthLadder.Around, local);
        LocalStrength.Choose(bank, curve, [SecondSeconds, SecondSeconds], variance, logs);
    }

    // The components smoothed alike, at length 1, and the lengths before that. Where samples are too far apart to be averaged, they stand.
    private static (Quat[] Rough, double[] Lengths) Rough(JointCurve curve, PenalisedFit fit, ReadOnlySpan<double> local)
    {
        var rough = new Quat[curve.Length];
        var lengths = new double[curve.Length];
        fit.Factor(Vector256<double>.One, local);
        fit.Fit(MemoryMarshal.Cast<Quat, Vector256<double>>(curve.Samples), MemoryMarshal.Cast<Quat, Vector256<double>>(rough.AsSpan()));
        for (var i = 0; i < rough.Length; i++)
        {
            lengths[i] = rough[i].Norm;
            rough[i] = lengths[i] < SmoothStage.LeastLength ? curve.Samples[i] : rough[i].Normalised();
        }

        return (rough, lengths);
    }

    private static SmoothedCurve RollUp(Unrolled unrolled, PenalisedFit fit, double[] lengths, Vector256<double>[] work)
    {
        var leverage = new double[work.Length];
        fit.Leverage(work);
        for (var i = 0; i < work.Length; i++)
        {
            leverage[i] = (work[i][0] + work[i][1] + work[i][2]) / 3;
        }

        var smoothed = new Quat[work.Length];
        fit.Fit(unrolled.Values, work);
        for (var i = 0; i < work.Length; i++)
        {
            smoothed[i] = lengths[i] * unrolled.Orientation(i, work[i]);
        }

        return new SmoothedCurve(smoothed, leverage);
    }
}
