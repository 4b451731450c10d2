using MathNet.Numerics.Statistics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>How noisy the samples of a joint are, from what smoothing took away.</summary>
internal static class NoiseEstimate
{
    /// <summary>Median of the chi-squared distribution with three degrees of freedom: the noise of an orientation has three axes.</summary>
    private const double MedianOfThree = 2.365973884375338;

    /// <summary>
    /// Noise variance of one axis in quaternion units (a quarter of the angle's): the median of squared residuals over 1 - leverage, so that
    /// passages in which the smoothing was too strong, or a fault that nobody found, do not count as noise.
    /// </summary>
    /// <param name="squared">Squared residuals of quaternions.</param>
    /// <param name="leverage">Leverages.</param>
    /// <param name="finest">RMS angle in radians below which noise is rounding.</param>
    public static double Variance(ReadOnlySpan<double> squared, ReadOnlySpan<double> leverage, double finest)
    {
        var scaled = new double[squared.Length];
        for (var i = 0; i < scaled.Length; i++)
        {
            scaled[i] = squared[i] / Math.Max(1 - leverage[i], 1e-12);
        }

        return Math.Max(ArrayStatistics.MedianInplace(scaled) / MedianOfThree, Math.Max(finest * finest / 4, 1e-300));
    }
}
