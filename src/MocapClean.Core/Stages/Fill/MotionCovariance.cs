using System.Numerics;
using MathNet.Numerics.IntegralTransforms;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// How a joint's turning at one time goes with its turning some time later: the autocovariance of its increments, one axis' worth
/// (the mean over the three, so that it is the same in every frame), as a valid covariance function of the lag.
/// </summary>
/// <remarks>
/// Between whole lags it is linear, which keeps it positive semi-definite: the spectrum of a triangle is nowhere negative.
/// </remarks>
internal sealed class MotionCovariance
{
    private readonly double[] lags;

    private MotionCovariance(double[] lags) => this.lags = lags;

    /// <summary>Variance of one increment, per axis, square radians.</summary>
    public double Variance => lags[0];

    /// <summary>Covariance of two increments some nominal intervals apart, per axis, square radians.</summary>
    public double this[double lag]
    {
        get
        {
            var distance = Math.Abs(lag);
            var below = (int)distance;
            if (below + 1 >= lags.Length)
            {
                return 0;
            }

            var part = distance - below;
            return part == 0 ? lags[below] : ((1 - part) * lags[below]) + (part * lags[below + 1]);
        }
    }

    /// <summary>
    /// A covariance function from measured lags. They are tapered by a raised cosine, so that the long ones, of which a take has few
    /// independent examples, fade to nothing, and made positive semi-definite by setting negative values of the spectrum to zero
    /// (Rasmussen and Williams 2006, section 4.2; Wiener 1949).
    /// </summary>
    /// <param name="measured">Autocovariance at lags 0, 1, 2 ..., per axis.</param>
    public static MotionCovariance From(ReadOnlySpan<double> measured)
    {
        // Twice the room that the lags on both sides need, so that what clipping adds beyond them does not wrap round.
        var size = (int)BitOperations.RoundUpToPowerOf2((uint)(4 * measured.Length));
        var spectrum = new Complex[size];
        for (var l = 0; l < measured.Length; l++)
        {
            var tapered = measured[l] * (1 + Math.Cos(Math.PI * l / measured.Length)) / 2;
            spectrum[l] = tapered;
            spectrum[(size - l) % size] = tapered;
        }

        Fourier.Forward(spectrum, FourierOptions.AsymmetricScaling);
        for (var k = 0; k < size; k++)
        {
            spectrum[k] = Math.Max(0, spectrum[k].Real);
        }

        Fourier.Inverse(spectrum, FourierOptions.AsymmetricScaling);
        return new MotionCovariance(Array.ConvertAll(spectrum[..(size / 2)], c => c.Real));
    }
}
