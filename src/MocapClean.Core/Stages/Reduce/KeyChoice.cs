using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Chooses the keys of one unbroken run of samples.</summary>
internal static class KeyChoice
{
    /// <summary>
    /// The fewest frames, rising, that hold the first, the last and all pinned ones and play back within the limits. A pinned frame is the
    /// end of one search and the start of the next, as no span may pass over it.
    /// </summary>
    /// <param name="rule">Playback rule.</param>
    /// <param name="samples">Unit quaternions, all present, signs as they will be written.</param>
    /// <param name="times">Their times in seconds, rising.</param>
    /// <param name="limits">What every span keeps to.</param>
    /// <param name="pinned">Indices that must be keys, in any order; those outside the run are passed over.</param>
    public static int[] Fewest(
        Playback rule, ReadOnlySpan<Quat> samples, ReadOnlySpan<double> times, SpanLimits limits, IEnumerable<int> pinned)
    {
        var count = samples.Length;
        var keys = new List<int> { 0 };
        foreach (var end in pinned.Where(n => n > 0 && n < count - 1).Append(count - 1).Distinct().Order())
        {
            var first = keys[^1];
            if (end > first)
            {
                using var stretch = new Stretch(samples[first..(end + 1)], times[first..(end + 1)]);
                keys.AddRange(Search(rule, stretch, limits).Skip(1).Select(n => n + first));
            }
        }

        return [.. keys];
    }

    private static List<int> Search(Playback rule, Stretch stretch, SpanLimits limits) => rule switch
    {
        Playback.Slerp => Search<SlerpCurve>(stretch, limits),
        Playback.ComponentLinear => Search<ChordCurve>(stretch, limits),
        _ => throw new ArgumentOutOfRangeException(nameof(rule)),
    };

    private static List<int> Search<TCurve>(Stretch stretch, SpanLimits limits)
        where TCurve : struct, ICurve<TCurve>
    {
        var keys = KeySearch<TCurve>.Run(stretch, limits);
        KeyBalance.Settle<TCurve>(stretch, keys, limits);
        return keys;
    }
}
