using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Third-difference penalty of one strength for the joint, chosen by generalised cross-validation with the exact trace
/// (Whittaker 1923, Eilers 2003, Craven and Wahba 1979).
/// </summary>
internal sealed class WhittakerSmoother : ISmoother
{
    /// <inheritdoc/>
    /// <remarks>Three times the order, and one: shorter stretches say next to nothing about their own noise.</remarks>
    public int Shortest => 10;

    /// <inheritdoc/>
    public SmoothedCurve Smooth(JointCurve curve)
    {
        using var fit = new PenalisedFit(new PenaltyRows(3, curve.Times, curve.Starts));
        using var bank = new StrengthBank(fit, MemoryMarshal.Cast<Quat, Vector256<double>>(curve.Samples), StrengthLadder.Whole(curve.Rate), []);
        return With(curve, fit, bank.LeastCrossValidation().Looseness);
    }

    /// <summary>The four components fitted with one strength.</summary>
    internal static SmoothedCurve With(JointCurve curve, PenalisedFit fit, double looseness)
    {
        var smoothed = new Quat[curve.Length];
        var leverage = new Vector256<double>[curve.Length];
        fit.Factor(Vector256.Create(looseness), []);
        fit.Leverage(leverage);
        fit.Fit(MemoryMarshal.Cast<Quat, Vector256<double>>(curve.Samples), MemoryMarshal.Cast<Quat, Vector256<double>>(smoothed.AsSpan()));
        return new SmoothedCurve(smoothed, [.. leverage.Select(h => h[0])]);
    }
}
