using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// Keeps, for each joint, the fewest frames whose playback stays within the tolerance at every present frame. Each run of present samples
/// is reduced on its own: its first and last frames are keys, so that keys stand on both sides of a missing run and of a break.
/// </summary>
public sealed class ReduceStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) =>
        PerJoint.Run(take, context, (j, track, findings) =>
            new JointResult(track with { Keys = Keys(track, take.Clock, context.PerJoint[j].Reduce, []) }, findings));

    /// <summary>The keys of one track.</summary>
    /// <param name="track">The track.</param>
    /// <param name="clock">The take's clock.</param>
    /// <param name="settings">Settings of this joint.</param>
    /// <param name="pinned">Frames that must be keys wherever they are present.</param>
    public static KeySet Keys(JointTrack track, Clock clock, ReduceSettings settings, ImmutableArray<int> pinned)
    {
        var samples = track.Samples.AsSpan();
        var times = clock.Steady.AsSpan();
        var longest = settings.Longest.InFrames ? settings.Longest.Amount * clock.Interval : settings.Longest.Amount;
        // A hair more, so that rounding of times takes no frame away.
        var limits = new SpanLimits(settings.Tolerance, settings.Widest, longest + (1e-6 * clock.Interval));
        var frames = ImmutableArray.CreateBuilder<int>();
        foreach (var run in Segment.Present(track))
        {
            var inside = pinned.Select(n => n - run.First);
            var keys = KeyChoice.Fewest(
                settings.Playback, samples.Slice(run.First, run.Count), times.Slice(run.First, run.Count), limits, inside);
            frames.AddRange(keys.Select(n => n + run.First));
        }

        var chosen = frames.ToImmutable();
        var error = KeyPlayback.Measure(settings.Playback, chosen.AsSpan(), [.. chosen.Select(n => track.Samples[n])], times, samples);
        return new KeySet(chosen, error.LargestRadians, error.RmsRadians);
    }
}
