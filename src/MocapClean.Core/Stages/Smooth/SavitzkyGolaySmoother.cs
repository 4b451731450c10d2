using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Each sample is replaced by the value there of the least-squares polynomial through the window around it; near the ends, of the polynomial
/// through the first or last window.
/// </summary>
/// <param name="window">Samples in the window, odd.</param>
/// <param name="degree">Degree of the polynomial, below the window.</param>
internal sealed class SavitzkyGolaySmoother(int window, int degree) : ISmoother
{
    /// <inheritdoc/>
    public int Shortest => window;

    /// <inheritdoc/>
    public SmoothedCurve Smooth(JointCurve curve)
    {
        var smoothed = new Quat[curve.Length];
        var leverage = new double[curve.Length];
        var half = window / 2;
        var weights = new double[window];
        for (var s = 0; s + 1 < curve.Starts.Length; s++)
        {
            var (first, last) = (curve.Starts[s], curve.Starts[s + 1] - 1);
            for (var i = first; i <= last; i++)
            {
                var from = Math.Clamp(i - half, first, last + 1 - window);
                // On a regular clock all windows that are centred on their sample have the same weights.
                if (!(curve.IsRegular && i > first + half && i <= last - half))
                {
                    LocalPolynomial.Weights(curve.Times.AsSpan(from, window), degree, curve.Times[i], weights);
                }

                smoothed[i] = Weighted(curve.Samples.AsSpan(from, window), weights);
                leverage[i] = weights[i - from];
            }
        }

        return new SmoothedCurve(smoothed, leverage);
    }

    private static Quat Weighted(ReadOnlySpan<Quat> samples, ReadOnlySpan<double> weights)
    {
        var sum = default(Quat);
        for (var i = 0; i < samples.Length; i++)
        {
            sum += weights[i] * samples[i];
        }

        return sum;
    }
}
