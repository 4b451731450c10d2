using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Second-order Butterworth low-pass run forwards and backwards, its cutoff meant for both passes together. On an irregular clock, for which
/// a recursive filter has no meaning, the penalty on second differences with the same gain 1 / (1 + (f/g)^4) takes its place.
/// </summary>
/// <param name="cutoff">Hertz; NaN chooses by generalised cross-validation, one for the joint.</param>
internal sealed class ButterworthSmoother(double cutoff) : ISmoother
{
    /// <summary>Cutoffs tried: from half a hertz up in steps of a third of an octave.</summary>
    private const double LowestTried = 0.5;
    private const double StepsAnOctave = 3;

    /// <inheritdoc/>
    /// <remarks>More than three times the number of coefficients, the common rule for filters run both ways.</remarks>
    public int Shortest => 10;

    /// <summary>A filter with this cutoff exists at this rate.</summary>
    public static bool Exists(double cutoff, double rate) => double.IsNaN(cutoff) || cutoff < rate / 2;

    /// <inheritdoc/>
    public SmoothedCurve Smooth(JointCurve curve)
    {
        Func<double, SmoothedCurve> with = curve.IsRegular ? f => Filter(curve, f) : f => Penalise(curve, f);
        return with(double.IsNaN(cutoff) ? Choose(curve, with) : cutoff);
    }

    private static double Choose(JointCurve curve, Func<double, SmoothedCurve> with)
    {
        var count = Math.Max(3, (int)(StepsAnOctave * Math.Log2(0.45 * curve.Rate / LowestTried)));
        var tried = Enumerable.Range(0, count).Select(k => 0.45 * curve.Rate * double.Exp2((k - count + 1) / StepsAnOctave)).ToArray();
        var scores = tried.Select(f => Score(curve, with(f))).ToArray();
        var best = Array.IndexOf(scores, scores.Min());
        return tried[best] * double.Exp2(Parabola.Lowest(scores, best) / StepsAnOctave);
    }

    private static double Score(JointCurve curve, SmoothedCurve smoothed)
    {
        var squared = 0.0;
        for (var i = 0; i < curve.Length; i++)
        {
            squared += (curve.Samples[i] + (-smoothed.Samples[i])).NormSquared;
        }

        return Math.Log(Math.Max(squared, double.Epsilon)) - (2 * Math.Log(curve.Length - smoothed.Leverage.Sum()));
    }

    private static SmoothedCurve Filter(JointCurve curve, double cutoff)
    {
        var design = ButterworthDesign.OneOfTwoPasses(cutoff, curve.Rate);
        var smoothed = new Quat[curve.Length];
        var input = MemoryMarshal.Cast<Quat, Vector256<double>>(curve.Samples);
        var output = MemoryMarshal.Cast<Quat, Vector256<double>>(smoothed.AsSpan());
        for (var s = 0; s + 1 < curve.Starts.Length; s++)
        {
            var part = curve.Starts[s]..curve.Starts[s + 1];
            new TwoPassFilter(design, curve.Starts[s + 1] - curve.Starts[s]).Run(input[part], output[part]);
        }

        var leverage = new double[curve.Length];
        Array.Fill(leverage, ButterworthDesign.Passed(cutoff, curve.Rate));
        return new SmoothedCurve(smoothed, leverage);
    }

    private static SmoothedCurve Penalise(JointCurve curve, double cutoff)
    {
        using var fit = new PenalisedFit(new PenaltyRows(2, curve.Times, curve.Starts));
        var g = 2 * Math.Sin(Math.PI * cutoff / curve.Rate) / ButterworthDesign.TwoPassFactor;
        return WhittakerSmoother.With(curve, fit, g * g * g * g);
    }
}
