using System.Numerics;
using MathNet.Numerics.IntegralTransforms;
using MocapClean.Core.Orientation;

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
    // Motion holds ten thousand times more power at 1 Hz than at 10, and what of it leaks there through the ends of a window would
    // pass for quick motion. So above this frequency the spectrum is learned from differences of increments, where it is nearly flat.
    private const double WhitenAboveHertz = 3;

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

    /// <summary>Learns from increments, prewhitened (Blackman and Tukey 1958, section B.11).</summary>
    /// <param name="turns">Increments in order.</param>
    /// <param name="known">Which of them count.</param>
    /// <param name="weight">Weight at a place, whole or half, in the order of increments.</param>
    /// <param name="longest">Longest lag.</param>
    /// <param name="rate">Increments per second.</param>
    public static MotionCovariance Learn(
        ReadOnlySpan<Vec3> turns, ReadOnlySpan<bool> known, Func<double, double> weight, int longest, double rate)
    {
        var (weights, changes, changeWeights) = (new double[turns.Length], new Vec3[turns.Length], new double[turns.Length]);
        for (var i = 0; i < turns.Length; i++)
        {
            weights[i] = known[i] ? weight(i) : 0;
            if (i + 1 < turns.Length && known[i] && known[i + 1])
            {
                (changes[i], changeWeights[i]) = (turns[i + 1] - turns[i], weight(i + 0.5));
            }
        }

        var corner = 2 * Math.PI * WhitenAboveHertz / rate;
        var slow = LagProducts.Autocovariance(turns, weights, longest);
        var measured = LagProducts.Autocovariance(changes, changeWeights, longest);
        for (var l = 0; l < measured.Length; l++)
        {
            measured[l] += corner * corner * slow[l];
        }

        return From(measured, corner);
    }

    /// <summary>
    /// A covariance function from measured lags. They are tapered by a raised cosine, so that the long ones, of which a take has few
    /// independent examples, fade to nothing, and made positive semi-definite by setting negative values of the spectrum to zero
    /// (Rasmussen and Williams 2006, section 4.2; Wiener 1949).
    /// </summary>
    /// <param name="measured">
    /// Autocovariance at lags 0, 1, 2 ..., per axis: that of the increments times the corner's square, plus that of their changes.
    /// </param>
    /// <param name="corner">Corner of the whitening, radians an increment.</param>
    public static MotionCovariance From(ReadOnlySpan<double> measured, double corner)
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
            var change = 2 * Math.Sin(Math.PI * k / size);
            spectrum[k] = Math.Max(0, spectrum[k].Real) / ((corner * corner) + (change * change));
        }

        Fourier.Inverse(spectrum, FourierOptions.AsymmetricScaling);
        return new MotionCovariance(Array.ConvertAll(spectrum[..(size / 2)], c => c.Real));
    }
}
