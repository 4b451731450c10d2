using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Reduce;

public sealed class ReduceStageTests
{
    [Fact]
    public void Keys_stand_on_both_sides_of_missing_runs_and_of_breaks()
    {
        var track = Track(Enumerable.Repeat(Quat.Identity, 30).ToArray());
        var states = track.States.ToBuilder();
        var samples = track.Samples.ToBuilder();
        for (var n = 8; n <= 12; n++)
        {
            (states[n], samples[n]) = (SampleState.Missing, Quat.Missing);
        }

        states[3] = SampleState.Flagged;
        track = track with { States = states.ToImmutable(), Samples = samples.ToImmutable(), Breaks = [20] };
        Assert.Equal([0, 7, 13, 19, 20, 29], Reduced(track).Frames);
    }

    [Fact]
    public void A_flagged_sample_counts_in_the_tolerance()
    {
        var samples = Enumerable.Repeat(Quat.Identity, 20).ToArray();
        samples[9] = RotationVector.Exp(new(0.4, 0, 0));
        var track = Track(samples);
        Assert.Equal([0, 8, 9, 10, 19], Reduced(track with { States = track.States.SetItem(9, SampleState.Flagged) }).Frames);
    }

    [Fact]
    public void A_track_without_a_sample_has_no_key()
    {
        var track = Track([Quat.Missing, Quat.Missing]);
        var keys = Reduced(track with { States = [SampleState.Missing, SampleState.Missing] });
        Assert.Empty(keys.Frames);
        Assert.Equal(0, keys.LargestErrorRadians);
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void The_errors_are_those_of_the_keys_played_at_every_frame(Playback rule)
    {
        var track = Track(Motions.Wander(800, 3, 0.004, 0.001));
        var settings = new ReduceSettings { Playback = rule };
        var keys = Reduced(track, settings);
        var clock = Clock.Regular(800, 120);
        var pairs = new EveryPair(rule, [.. track.Samples], [.. clock.Steady]);
        var largest = keys.Frames.Zip(keys.Frames.Skip(1)).Max(k => pairs.Error(k.First, k.Second));
        Assert.Equal(largest, keys.LargestErrorRadians, 1e-12);
        Assert.InRange(keys.LargestErrorRadians, 0.5 * settings.Tolerance, settings.Tolerance);
        Assert.InRange(keys.RmsErrorRadians, 0.1 * largest, 0.9 * largest);
    }

    [Fact]
    public void Pinned_frames_are_keys_where_they_are_present()
    {
        var track = Track(Enumerable.Repeat(Quat.Identity, 30).ToArray()) with { Breaks = [15] };
        var keys = ReduceStage.Keys(track, Clock.Regular(30, 120), new ReduceSettings(), [22, 4, 400]);
        Assert.Equal([0, 4, 14, 15, 22, 29], keys.Frames);
    }

    [Fact]
    public void The_longest_time_between_keys_may_be_given_in_frames()
    {
        var keys = Reduced(Track(Enumerable.Repeat(Quat.Identity, 31).ToArray()), new ReduceSettings { Longest = Extent.Frames(10) });
        Assert.Equal([0, 10, 20, 30], keys.Frames);
    }

    [Fact]
    public void Any_number_of_workers_gives_the_same_keys()
    {
        var take = Take([.. Enumerable.Range(1, 6).Select(n => Track(Motions.Wander(400, n, 0.004, 0.001)))]);
        var one = new ReduceStage().Run(take, StageContext.Uniform(take, new StageSettings(), cancel: TestContext.Current.CancellationToken));
        var four = new ReduceStage().Run(take, StageContext.Uniform(take, new StageSettings(), 4, TestContext.Current.CancellationToken));
        Assert.Equal(one.Tracks.Select(t => t.Keys!.Frames), four.Tracks.Select(t => t.Keys!.Frames));
    }

    private static KeySet Reduced(JointTrack track, ReduceSettings? settings = null)
    {
        var take = Take([track]);
        return new ReduceStage()
            .Run(take, StageContext.Uniform(take, new StageSettings { Reduce = settings ?? new() }, cancel: TestContext.Current.CancellationToken))
            .Tracks[0].Keys!;
    }

    private static Take Take(ImmutableArray<JointTrack> tracks) => new()
    {
        Name = "take",
        Clock = Clock.Regular(tracks[0].Length, 120),
        Tracks = tracks,
        Space = OrientationSpace.World,
    };

    private static JointTrack Track(Quat[] samples) => new()
    {
        Name = "joint",
        Delivered = [.. samples],
        Samples = [.. samples],
        States = [.. samples.Select(_ => SampleState.Good)],
    };
}
