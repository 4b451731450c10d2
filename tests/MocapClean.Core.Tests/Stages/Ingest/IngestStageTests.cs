using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Ingest;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Ingest;

public sealed class IngestStageTests
{
    [Fact]
    public void Zero_and_not_finite_samples_are_missing_and_the_others_get_length_one()
    {
        var take = Some.Take(100, Some.Track("a", new(2, 0, 0, 0), default, new(double.NaN, 0, 0, 1), new(0, 0, 0.999, 0)));
        var track = Run(take).Tracks[0];
        Assert.Equal([SampleState.Good, SampleState.Missing, SampleState.Missing, SampleState.Good], track.States);
        Assert.Equal(Quat.Identity, track.Samples[0]);
        Assert.Equal(1, track.Samples[3].Norm, 15);
        Assert.True(double.IsNaN(track.Samples[1].W));
    }

    [Fact]
    public void A_length_off_by_more_than_the_tolerance_is_one_row_a_run()
    {
        var spin = Some.Spin(10, 1);
        for (var n = 3; n < 7; n++)
        {
            spin[n] = 0.9 * spin[n];
        }

        spin[9] = 1.005 * spin[9];
        var result = Run(Some.Take(100, Some.Track("a", spin)));
        var row = Assert.Single(result.Of(FaultKind.OffUnit));
        Assert.Equal((3, 6, FaultAction.Renormalised), (row.First, row.Last, row.Action));
        Assert.Equal([3, 4, 5, 6], result.Tracks[0].Renormalised);
    }

    [Fact]
    public void Lost_frames_are_counted_and_end_segments_in_every_joint()
    {
        double[] times = [0, 0.01, 0.02, 0.06, 0.07, 0.08, 0.09];
        var take = Some.Take(100, Some.Track("a", Some.Spin(7, 1)), Some.Track("b", Some.Spin(7, 2))) with { Clock = Clock.FromTimes(times, 5e-7) };
        var result = Run(take);
        var row = Assert.Single(result.Of(FaultKind.LostFrames));
        Assert.Equal((-1, 3, 3L), (row.Joint, row.First, row.Lost));
        Assert.All(result.Tracks, t => Assert.Equal([3], t.Breaks));
    }

    [Fact]
    public void Time_that_stands_still_is_one_row_and_time_that_runs_back_another()
    {
        double[] times = [0, 0.01, 0.02, 0.02, 0.02, 0.03, 0.04, 0.03, 0.04, 0.05, 0.06];
        var take = Some.Take(100, Some.Track("a", Some.Spin(11, 1))) with { Clock = Clock.FromTimes(times, 5e-7) };
        var rows = Run(take).Of(FaultKind.Clock);
        Assert.Equal([(3, 4), (7, 7)], rows.Select(r => (r.First, r.Last)));
        Assert.Contains("runs back by 0.01 s", rows[1].Note, StringComparison.Ordinal);
    }

    [Fact]
    public void A_rest_pose_in_front_is_labelled_and_left_alone()
    {
        var result = Run(Posed());
        var row = Assert.Single(result.Of(FaultKind.RestPose));
        Assert.Equal((0, 0, FaultAction.Noted), (row.First, row.Last, row.Action));
        Assert.All(result.Tracks, t => Assert.Equal((SampleState.Flagged, 1), (t.States[0], t.Breaks[0])));
    }

    [Fact]
    public void A_rest_pose_is_motion_where_the_setting_says_so()
    {
        var settings = new StageSettings { Ingest = new IngestSettings { RecogniseRestPose = false } };
        var take = Posed();
        Assert.Empty(new IngestStage().Run(take, StageContext.Uniform(take, settings)).Findings);
    }

    [Fact]
    public void Motion_that_starts_fast_is_no_rest_pose()
    {
        var result = Run(Some.Take(100, Some.Track("a", Some.Spin(30, 6)), Some.Track("b", Some.Spin(30, 9))));
        Assert.Empty(result.Findings);
    }

    private static Take Posed()
    {
        JointTrack Joint(string name, double degrees) =>
            Some.Track(name, [Some.About(1, 0, 0, 60), .. Some.Spin(40, degrees)]);
        return Some.Take(100, Joint("a", 1), Joint("b", 0.5), Joint("c", 2));
    }

    private static Take Run(Take take) => new IngestStage().Run(take, StageContext.Uniform(take, new StageSettings()));
}
