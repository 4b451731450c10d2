using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// The first, cheap look at every sample: how far it lies from the cubic through two neighbours on each side. On the components of the
/// quaternions, with no logarithm: turning the whole track on either side is an orthogonal map of the four components, so it changes no
/// length, and what a constant turn adds along the sample itself is taken out.
/// </summary>
internal static class Innovations
{
    /// <summary>
    /// Spread of the innovation of white noise over the noise's own: root of 1 + (1 + 16 + 16 + 1) / 36.
    /// </summary>
    public const double NoiseGain = 1.3944;

    /// <summary>Radians between a sample and the cubic through the samples one and two strides away on both sides.</summary>
    public static double At(ReadOnlySpan<Quat> samples, int n, int stride)
    {
        var c = samples[n];
        var near = Near(samples[n - stride], c);
        var next = Near(samples[n + stride], c);
        var mean = (4 * (near + next)) + (-(Near(samples[n - (2 * stride)], near) + Near(samples[n + (2 * stride)], next)));
        var along = Quat.Dot(mean, c);
        var across = mean.NormSquared - (along * along);
        // Beyond some 100 degrees the signs of far neighbours mean nothing; it is a jump all the same.
        return along < 3 ? Math.PI : 2 * Math.Sqrt(Math.Max(0, across)) / along;
    }

    private static Quat Near(Quat q, Quat to) => Quat.Dot(q, to) < 0 ? -q : q;
}
