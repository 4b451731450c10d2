using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>A smoothing method with its settings.</summary>
internal interface ISmoother
{
    /// <summary>Fewest samples of a stretch that the method can be trusted with.</summary>
    int Shortest { get; }

    /// <summary>Smooths all stretches of a joint.</summary>
    SmoothedCurve Smooth(JointCurve curve);
}

/// <summary>What a method made of a curve.</summary>
/// <param name="Samples">Not yet of length 1: the length tells how far apart the samples were that were averaged.</param>
/// <param name="Leverage">
/// Share of each sample's own value in its smoothed one, averaged over the axes; the mean of it is the share of white noise that passes.
/// </param>
internal sealed record SmoothedCurve(Quat[] Samples, double[] Leverage)
{
    /// <summary>
    /// Cutoff in hertz of the two-pass second-order low-pass that lets as much white noise pass. Its gain 1 / (1 + (f/g)^4) has the
    /// integral g pi / sqrt 8 and falls to sqrt(1/2) at g (sqrt 2 - 1)^(1/4).
    /// </summary>
    public double EquivalentCutoff(double rate)
    {
        var passed = Leverage.Sum() / Leverage.Length;
        return Math.Min(rate / 2, passed * (rate / 2) * Math.Sqrt(8) / Math.PI * ButterworthDesign.TwoPassFactor);
    }
}
