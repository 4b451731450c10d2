using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Third-difference penalty whose strength follows the motion, strong where the joint rests and weak where it moves fast.
/// First the four components are smoothed with the strength that <see cref="LocalStrength"/> finds around each sample. Along that rough curve
/// the samples are unrolled (<see cref="Unrolled"/>) and each principal axis is smoothed with the same local strength times a factor of
/// its own, chosen by Mallows' criterion (1973) with the exact trace. All in time linear in samples.
/// </summary>
internal sealed class AdaptiveSmoother : ISmoother
{
    /// <summary>The factors tried, as logarithms: from e^-6 to e^6 of the local strength, which is a cutoff 2.7 times higher or lower.</summary>
    private const double WidestLog = 6;
    private const double LogStep = 2;

    /// <inheritdoc/>
    public int Shortest => 10;

    /// <inheritdoc/>
    public SmoothedCurve Smooth(JointCurve curve)
    {
        var rows = new PenaltyRows(3, curve.Times, curve.Starts);
        using var fit = new PenalisedFit(rows);
        var bank = new StrengthBank(curve, rows, fit);
        var variance = Noise.Variance(bank.Squared[bank.Best], bank.Leverage[bank.Best], curve.Finest);
        var local = LocalStrength.Choose(bank, curve, variance);
        var (rough, lengths) = Rough(curve, fit, local);

        var unrolled = new Unrolled(curve, rough);
        var work = new Vector256<double>[curve.Length];
        fit.Fit(unrolled.Values, work);
        unrolled.AlignAxes(work, rows, local);
        fit.Factor(Looseness(unrolled.Values, fit, local, 4 * variance, work), local);
        var leverage = new Vector256<double>[curve.Length];
        fit.Leverage(leverage);
        fit.Fit(unrolled.Values, work);
        var smoothed = new Quat[curve.Length];
        for (var i = 0; i < smoothed.Length; i++)
        {
            smoothed[i] = lengths[i] * unrolled.Orientation(i, work[i]);
        }

        return new SmoothedCurve(smoothed, [.. leverage.Select(h => (h[0] + h[1] + h[2]) / 3)]);
    }

    // The components smoothed alike, at length 1, and the lengths before that. Where samples are too far apart to be averaged, they stand.
    private static (Quat[] Rough, double[] Lengths) Rough(JointCurve curve, PenalisedFit fit, double[] local)
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

    // For each axis the factor on the local looseness with the least estimated error.
    private static Vector256<double> Looseness(
        ReadOnlySpan<Vector256<double>> values, PenalisedFit fit, ReadOnlySpan<double> local, double variance, Span<Vector256<double>> work)
    {
        var count = 1 + (int)(2 * WidestLog / LogStep);
        var errors = new double[3][];
        for (var axis = 0; axis < 3; axis++)
        {
            errors[axis] = new double[count];
        }

        for (var k = 0; k < count; k++)
        {
            fit.Factor(Vector256.Create(Math.Exp((k * LogStep) - WidestLog)), local);
            fit.Leverage(work);
            var trace = Sum(work);
            fit.Fit(values, work);
            for (var i = 0; i < work.Length; i++)
            {
                var r = values[i] - work[i];
                work[i] = r * r;
            }

            var error = Sum(work) + (2 * LocalStrength.Caution * variance * trace);
            for (var axis = 0; axis < 3; axis++)
            {
                errors[axis][k] = error[axis];
            }
        }

        return Vector256.Create(Foot(errors[0]), Foot(errors[1]), Foot(errors[2]), 1);
    }

    private static double Foot(double[] errors)
    {
        var best = Array.IndexOf(errors, errors.Min());
        return Math.Exp(((best + Parabola.Lowest(errors, best)) * LogStep) - WidestLog);
    }

    private static Vector256<double> Sum(ReadOnlySpan<Vector256<double>> values)
    {
        var sum = Vector256<double>.Zero;
        foreach (var v in values)
        {
            sum += v;
        }

        return sum;
    }
}
