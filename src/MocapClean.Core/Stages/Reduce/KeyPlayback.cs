using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>How far a track is from its keys as played back.</summary>
/// <param name="LargestRadians">Largest angle at any present frame, radians.</param>
/// <param name="RmsRadians">Root mean square angle over all present frames, radians.</param>
/// <param name="LargestFrame">The first frame with the largest angle; -1 where no frame is present.</param>
public readonly record struct PlaybackError(double LargestRadians, double RmsRadians, int LargestFrame);

/// <summary>
/// Plays keys back as the receiving software will, from the key values alone: what the search promises is measured with this.
/// Sources: Shoemake 1985 (slerp); glTF 2.0 specification, appendix C.
/// </summary>
public static class KeyPlayback
{
    /// <summary>The orientation between two neighbouring keys, at a share in [0, 1] of the time from the first to the second.</summary>
    public static Quat At(Playback rule, Quat a, Quat b, double share) => rule switch
    {
        Playback.Slerp => Slerp.At(a, b, share),
        // The signs are played as written: no search for the shorter arc.
        Playback.ComponentLinear => Direction(((1 - share) * a) + (share * b)),
        _ => throw new ArgumentOutOfRangeException(nameof(rule)),
    };

    /// <summary>Plays the keys at every frame from the first key to the last; frames outside are set missing.</summary>
    /// <param name="rule">Playback rule.</param>
    /// <param name="frames">Frame numbers of the keys, rising.</param>
    /// <param name="keys">Orientations of the keys, as many.</param>
    /// <param name="times">Time of every frame in seconds, rising.</param>
    /// <param name="into">One orientation for every frame.</param>
    public static void Fill(Playback rule, ReadOnlySpan<int> frames, ReadOnlySpan<Quat> keys, ReadOnlySpan<double> times, Span<Quat> into)
    {
        into.Fill(Quat.Missing);
        for (var k = 0; k + 1 < frames.Length; k++)
        {
            var (first, last) = (frames[k], frames[k + 1]);
            for (var n = first; n < last; n++)
            {
                into[n] = n == first ? keys[k] : At(rule, keys[k], keys[k + 1], (times[n] - times[first]) / (times[last] - times[first]));
            }
        }

        if (!frames.IsEmpty)
        {
            into[frames[^1]] = keys[^1];
        }
    }

    /// <summary>Plays the keys and compares every present sample with what is played. Missing samples (NaN) are passed over.</summary>
    /// <param name="rule">Playback rule.</param>
    /// <param name="frames">Frame numbers of the keys, rising; the first and last present frames are among them.</param>
    /// <param name="keys">Orientations of the keys, as many.</param>
    /// <param name="times">Time of every frame in seconds, rising.</param>
    /// <param name="samples">The track at every frame.</param>
    /// <remarks>Frames before the first key and behind the last one are passed over too.</remarks>
    public static PlaybackError Measure(
        Playback rule, ReadOnlySpan<int> frames, ReadOnlySpan<Quat> keys, ReadOnlySpan<double> times, ReadOnlySpan<Quat> samples)
    {
        return rule switch
        {
            Playback.Slerp => PlaybackMeasure.Of<SlerpCurve>(frames, keys, times, samples),
            Playback.ComponentLinear => PlaybackMeasure.Of<ChordCurve>(frames, keys, times, samples),
            _ => throw new ArgumentOutOfRangeException(nameof(rule)),
        };
    }

    private static Quat Direction(Quat q) => q.IsOrientation ? q.Normalised() : Quat.Missing;
}
