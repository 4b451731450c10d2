using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Recognises a joint whose value changes only every n-th frame, regularly: a slower sensor in a faster take. It is judged at its own
/// rate, and its repeats are no freezes.
/// </summary>
/// <param name="First">The first frame with a new value.</param>
/// <param name="Every">Frames from one new value to the next; 1 for a joint that keeps up.</param>
internal readonly record struct UpdateRhythm(int First, int Every)
{
    /// <summary>Slowest sensor that is still one: beyond this, repeats are freezes.</summary>
    private const int Slowest = 16;

    /// <summary>New values that must be seen before a rhythm is believed.</summary>
    private const int Fewest = 16;

    /// <summary>Share of new values that must keep the rhythm; rests, where nothing changes for some beats, keep it too.</summary>
    private const double Regular = 0.95;

    /// <summary>The update that a frame shows.</summary>
    public int IndexOf(int frame) => (frame + ((Every - First) % Every)) / Every;

    /// <summary>The first frame of an update.</summary>
    public int FrameOf(int index) => Math.Max(0, (index * Every) - ((Every - First) % Every));

    /// <summary>Looks for the rhythm of a track.</summary>
    public static UpdateRhythm Of(JointTrack track)
    {
        var gaps = new int[Slowest + 1];
        var last = -1;
        var changes = 0;
        for (var n = 1; n < track.Length; n++)
        {
            if (!IsNew(track, n))
            {
                continue;
            }

            changes++;
            gaps[last < 0 ? 0 : Math.Min(n - last, Slowest)]++;
            last = n;
        }

        var every = Array.IndexOf(gaps, gaps.Max());
        return every > 1 && changes >= Fewest && Phase(track, every) is var (first, share) && share >= Regular
            ? new UpdateRhythm(first, every)
            : new UpdateRhythm(0, 1);
    }

    private static (int First, double Share) Phase(JointTrack track, int every)
    {
        var counts = new int[every];
        for (var n = 1; n < track.Length; n++)
        {
            counts[n % every] += IsNew(track, n) ? 1 : 0;
        }

        var first = Array.IndexOf(counts, counts.Max());
        return (first, counts[first] / (double)counts.Sum());
    }

    private static bool IsNew(JointTrack track, int n) =>
        track.States[n] != SampleState.Missing && track.States[n - 1] != SampleState.Missing
        && !IsRepeat(track.Samples[n - 1], track.Samples[n]);

    /// <summary>The same orientation to the last digit, in either sign.</summary>
    public static bool IsRepeat(Quat a, Quat b) => a == b || a == -b;
}
