namespace MocapClean.Core.Stages.Fill;

/// <summary>One way in which the joint may be moving about a run.</summary>
/// <param name="Covariance">Covariance of the increments.</param>
/// <param name="Noise">Variance of what an increment holds beside that motion, per axis, square radians.</param>
internal sealed record MotionModel(MotionCovariance Covariance, double Noise)
{
    // 2.8 s holds the slowest swing that a body repeats often enough in a take to learn from.
    private const double LongestLagSeconds = 2.8;

    // Memory and time grow with the lags; only rates above 1400 Hz are cut short by it.
    private const int MostLags = 4000;

    // Shares of the variance that may be noise. Which one holds about a run is decided there, by evidence: a quiet phase is mostly noise.
    private static readonly double[] NoiseShares = [1e-4, 1e-3, 1e-2];

    /// <summary>The ways of moving that a track shows; none where it has no known increment.</summary>
    /// <param name="increments">The track.</param>
    /// <param name="rate">Frames per second.</param>
    /// <param name="textRounding">What rounding of the delivered text can move a sample by, radians.</param>
    public static MotionModel[] Learn(Increments increments, double rate, double textRounding)
    {
        var weights = Array.ConvertAll(increments.Known, known => known ? 1.0 : 0.0);
        if (!increments.Known.Contains(value: true))
        {
            return [];
        }

        var longest = (int)Math.Clamp(LongestLagSeconds * rate, 1, MostLags);
        var covariance = MotionCovariance.From(LagProducts.Autocovariance(increments.Turns, weights, longest));
        return Array.ConvertAll(
            NoiseShares, share => new MotionModel(covariance, (share * covariance.Variance) + (textRounding * textRounding)));
    }
}
