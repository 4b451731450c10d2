using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// The series in which jumps are looked for: one sample for every update of the joint, with what is believed of each. The search marks in
/// it what it has explained, so that no fault is a witness against the next sample.
/// </summary>
internal sealed class MotionPath
{
    /// <summary>How many frames of missing or masked samples a neighbourhood may reach across.</summary>
    private const int Reach = 8;

    /// <summary>Unit quaternions of either sign; anything where nothing is believed.</summary>
    public required Quat[] Samples { get; init; }

    /// <summary>Whether a sample is there and believed.</summary>
    public required bool[] Trusted { get; init; }

    /// <summary>Whether nothing may be compared between this sample and the one before it.</summary>
    public required bool[] Cut { get; init; }

    /// <summary>Samples per second.</summary>
    public required double Rate { get; init; }

    /// <summary>What rounding of the delivered text can move a sample by, radians.</summary>
    public required double Rounding { get; init; }

    /// <summary>Number of samples.</summary>
    public int Length => Samples.Length;

    /// <summary>The series of a track at the joint's own rate.</summary>
    /// <param name="track">The track.</param>
    /// <param name="rate">Frames of the take per second.</param>
    /// <param name="rounding">What rounding of the delivered text can move a sample by, radians.</param>
    /// <param name="rhythm">When the joint has new values.</param>
    public static MotionPath Of(JointTrack track, double rate, double rounding, UpdateRhythm rhythm)
    {
        var count = rhythm.IndexOf(track.Length - 1) + 1;
        var path = new MotionPath
        {
            Samples = new Quat[count],
            Trusted = new bool[count],
            Cut = new bool[count + 1],
            Rate = rate / rhythm.Every,
            Rounding = rounding,
        };
        for (var i = 0; i < count; i++)
        {
            path.Samples[i] = track.Samples[rhythm.FrameOf(i)];
            path.Trusted[i] = track.States[rhythm.FrameOf(i)] == SampleState.Good;
        }

        foreach (var n in track.Breaks)
        {
            path.Cut[n == 0 ? 0 : rhythm.IndexOf(n - 1) + 1] = true;
        }

        return path;
    }

    /// <summary>The last of the unbroken run of trusted samples that begins at a trusted sample, looked for up to a limit.</summary>
    public int RunEnd(int first, int limit)
    {
        var n = first;
        while (n < limit && n + 1 < Length && Trusted[n + 1] && !Cut[n + 1])
        {
            n++;
        }

        return n;
    }

    /// <summary>Whether all samples of a range are trusted and nothing cuts it.</summary>
    public bool IsWhole(int first, int last)
    {
        if (first < 0 || last >= Length || !Trusted[first])
        {
            return false;
        }

        for (var n = first + 1; n <= last; n++)
        {
            if (!Trusted[n] || Cut[n])
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Nothing cuts the range, its first sample apart.</summary>
    public bool IsUncut(int first, int last) => Cut.AsSpan(first + 1, last - first).IndexOf(true) < 0;

    /// <summary>The nearest trusted samples at and before a sample, nearest first; how many were found.</summary>
    public int Before(int from, Span<int> found)
    {
        var count = 0;
        for (var n = from; n >= 0 && n > from - Reach - found.Length && count < found.Length; n--)
        {
            if (Trusted[n])
            {
                found[count++] = n;
            }

            if (Cut[n])
            {
                break;
            }
        }

        return count;
    }

    /// <summary>The nearest trusted samples at and after a sample, nearest first; how many were found.</summary>
    public int After(int from, Span<int> found)
    {
        var count = 0;
        for (var n = from; n < Length && n < from + Reach + found.Length && count < found.Length; n++)
        {
            if (n > from && Cut[n])
            {
                break;
            }

            if (Trusted[n])
            {
                found[count++] = n;
            }
        }

        return count;
    }
}
