using MocapClean.Core.Takes;

namespace MocapClean.Core.Kernels;

/// <summary>A first look at the noise of a track, without smoothing it.</summary>
public static class JitterEstimate
{
    /// <summary>Sum of the squares of 1, 3, 3, 1: what a third difference makes of the variance of white noise.</summary>
    private const double DifferenceGain = 20;

    /// <summary>Median of the chi-squared distribution with three degrees of freedom: the noise of an orientation has three axes.</summary>
    private const double MedianOfThree = 2.365973884375338;

    /// <summary>
    /// RMS noise of one axis, radians: from the median of the third differences of neighbouring samples, in which motion slower than a few
    /// hertz has all but vanished. An upper bound for a joint that moves fast most of the time. NaN for fewer than four good neighbours.
    /// </summary>
    /// <param name="track">A track with continuous signs.</param>
    public static double OneAxis(JointTrack track)
    {
        var squares = new List<double>(track.Length);
        for (var n = 3; n < track.Length; n++)
        {
            var d = track.Samples[n] + (-3 * track.Samples[n - 1]) + (3 * track.Samples[n - 2]) + (-track.Samples[n - 3]);
            if (double.IsFinite(d.NormSquared))
            {
                squares.Add(d.NormSquared);
            }
        }

        if (squares.Count == 0)
        {
            return double.NaN;
        }

        squares.Sort();
        // A turn moves a quaternion by half its angle.
        return 2 * Math.Sqrt(squares[squares.Count / 2] / (DifferenceGain * MedianOfThree));
    }
}
