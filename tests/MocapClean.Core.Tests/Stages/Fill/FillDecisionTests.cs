using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Fill;

/// <summary>Which runs are filled, and what the findings say of the others.</summary>
public sealed class FillDecisionTests
{
    private static readonly Quat[] Path = Motion.Swing(600);

    [Fact]
    public void A_filled_gap_carries_its_expected_error_and_width()
    {
        var (track, findings) = Motion.Run(Motion.Track(Path, (200, 219)), new FillSettings(), Motion.Found(FaultKind.Gap, 200, 219));
        var gap = Assert.Single(findings);
        Assert.Equal((FaultAction.Filled, ""), (gap.Action, gap.Note));
        Assert.InRange(gap.ExpectedErrorRadians!.Value, 1e-9, Angle.FromDegrees(3));
        Assert.Equal(Angle.Between(Path[199], Path[220]), gap.SizeRadians, 1e-12);
        Assert.All(Enumerable.Range(200, 20), n => Assert.Equal(SampleState.Filled, track.States[n]));
        Assert.Equal(SampleState.Good, track.States[199]);
        Assert.Equal(Path[220], track.Samples[220]);
    }

    [Fact]
    public void A_gap_that_no_finding_tells_of_gets_one()
    {
        var found = Motion.Found(FaultKind.Gap, 200, 204);
        var (_, findings) = Motion.Run(Motion.Track(Path, (200, 209), (300, 301)), new FillSettings(), found);
        Assert.Equal([(200, 204), (205, 209), (300, 301)], findings.Select(f => (f.First, f.Last)));
        Assert.All(findings, f => Assert.Equal((FaultKind.Gap, FaultAction.Filled), (f.Kind, f.Action)));
    }

    [Fact]
    public void A_run_longer_than_allowed_stays_missing_and_says_by_how_much()
    {
        // 500 ms at 120 Hz are 60 frames.
        var (track, findings) = Motion.Run(Motion.Track(Path, (100, 159), (300, 360)), Motion.Open with { Longest = Extent.Seconds(0.5) });
        Assert.Equal([FaultAction.Filled, FaultAction.Left], findings.Select(f => f.Action));
        Assert.Equal("not filled: too long, 61 frames where 60 are allowed", findings[1].Note);
        Assert.All(Enumerable.Range(300, 61), n => Assert.False(track.Samples[n].IsOrientation));
        Assert.All(Enumerable.Range(300, 61), n => Assert.Equal(SampleState.Missing, track.States[n]));
    }

    [Fact]
    public void A_run_wider_than_allowed_stays_missing_and_says_by_how_much()
    {
        var path = Motion.Spin(400, 120);
        var (_, findings) = Motion.Run(Motion.Track(path, (200, 228)), Motion.Open with { Widest = Angle.FromDegrees(29) });
        Assert.Equal(FaultAction.Left, Assert.Single(findings).Action);
        Assert.Equal("not filled: too wide, 30 deg from edge to edge where 29 deg is allowed", findings[0].Note);
        Assert.Null(findings[0].ExpectedErrorRadians);
    }

    [Fact]
    public void A_run_too_uncertain_stays_missing_and_says_so()
    {
        var settings = Motion.Open with { Worst = Angle.FromDegrees(0.5) };
        var (_, findings) = Motion.Run(Motion.Track(Motion.Wander(900, 3), (400, 499)), settings);
        Assert.Equal(FaultAction.Left, Assert.Single(findings).Action);
        Assert.Matches(@"^not filled: too uncertain, [\d.]+ deg expected error where 0\.5 deg is allowed$", findings[0].Note);
    }

    [Fact]
    public void Nothing_is_put_in_before_the_first_or_after_the_last_sample()
    {
        var (track, findings) = Motion.Run(Motion.Track(Path, (0, 3), (595, 599)), Motion.Open);
        Assert.Equal(["not filled: at the start of the track", "not filled: at the end of the track"], findings.Select(f => f.Note));
        Assert.All(findings, f => Assert.Equal(FaultAction.Left, f.Action));
        Assert.True(double.IsNaN(findings[0].SizeRadians));
        Assert.False(track.Samples[0].IsOrientation);
        Assert.False(track.Samples[599].IsOrientation);
    }

    [Fact]
    public void A_track_without_any_sample_stays_as_it_is()
    {
        var (track, findings) = Motion.Run(Motion.Track(Path, (0, 599)), Motion.Open);
        Assert.Equal("not filled: nothing in the track is trusted", Assert.Single(findings).Note);
        Assert.All(track.States, s => Assert.Equal(SampleState.Missing, s));
    }

    [Fact]
    public void Single_samples_between_gaps_give_no_motion_to_learn_from()
    {
        var (track, findings) = Motion.Run(Motion.Track(Path[..5], (1, 1), (3, 3)), Motion.Open);
        Assert.All(findings, f => Assert.Equal("not filled: no motion beside it to learn from", f.Note));
        Assert.Equal(2, findings.Length);
        Assert.Equal(SampleState.Missing, track.States[1]);
    }

    [Fact]
    public void A_few_neighbours_are_enough_for_a_guess_with_its_error()
    {
        var (track, findings) = Motion.Run(Motion.Track(Motion.Spin(7, 60), (3, 3)), Motion.Open);
        Assert.Equal(SampleState.Filled, track.States[3]);
        Assert.True(double.IsFinite(Assert.Single(findings).ExpectedErrorRadians!.Value));
    }

    [Fact]
    public void Without_neighbours_the_motion_of_the_track_says_how_far_off_a_bridge_may_be()
    {
        var (_, findings) = Motion.Run(Motion.Track(Path, (200, 209)) with { Breaks = [199, 211] }, Motion.Open);
        Assert.Equal(FaultAction.Filled, Assert.Single(findings).Action);
        Assert.InRange(findings[0].ExpectedErrorRadians!.Value, Angle.FromDegrees(0.1), Angle.FromDegrees(20));
    }

    [Fact]
    public void Two_gaps_with_one_sample_between_them_are_two_runs()
    {
        var (track, findings) = Motion.Run(Motion.Track(Path, (200, 205), (207, 212)), Motion.Open);
        Assert.Equal(2, findings.Length);
        Assert.Equal(Path[206], track.Samples[206]);
        Assert.True(Angle.ToDegrees(Motion.Largest(track, Path, 200, 212)) < 0.1);
    }

    [Fact]
    public void A_rejected_run_is_replaced_and_a_refused_one_is_flagged_as_delivered()
    {
        var track = Motion.Track(Path).Rejecting(200, 202).Rejecting(300, 307);
        var settings = Motion.Open with { Longest = Extent.Frames(4) };
        Finding[] found = [Motion.Found(FaultKind.Spike, 200, 202), Motion.Found(FaultKind.Freeze, 300, 307)];
        var (after, findings) = Motion.Run(track, settings, found);
        Assert.Equal([FaultAction.Filled, FaultAction.Flagged], findings.Select(f => f.Action));
        Assert.True(Angle.ToDegrees(Motion.Largest(after, Path, 200, 202)) < 0.01);
        Assert.Equal(track.Delivered[303], after.Samples[303]);
        Assert.Equal(SampleState.Flagged, after.States[303]);
        Assert.Equal("not filled: too long, 8 frames where 4 are allowed", findings[1].Note);
    }

    [Fact]
    public void A_flagged_value_continues_the_sign_of_the_track()
    {
        var track = Motion.Track(Path).Rejecting(300, 301);
        var delivered = track.Delivered.SetItem(300, -track.Delivered[300]);
        var (after, _) = Motion.Run(track with { Delivered = delivered }, new FillSettings { Method = FillMethod.None });
        Assert.Equal(-delivered[300], after.Samples[300]);
        Assert.True(Quat.Dot(after.Samples[299], after.Samples[300]) > 0);
    }

    [Fact]
    public void A_spike_beside_a_gap_is_bridged_with_it_and_has_its_own_error()
    {
        var track = Motion.Track(Path, (203, 230)).Rejecting(200, 202);
        var (after, findings) = Motion.Run(
            track, Motion.Open, Motion.Found(FaultKind.Spike, 200, 202), Motion.Found(FaultKind.Gap, 203, 230));
        Assert.All(Enumerable.Range(200, 31), n => Assert.Equal(SampleState.Filled, after.States[n]));
        Assert.True(findings[0].ExpectedErrorRadians < findings[1].ExpectedErrorRadians);
    }

    [Theory]
    [InlineData(200)]
    [InlineData(205)]
    [InlineData(210)]
    public void A_break_in_a_run_or_at_its_edge_is_not_bridged(int at)
    {
        var (_, findings) = Motion.Run(Motion.Track(Path, (200, 209)) with { Breaks = [at] }, Motion.Open);
        Assert.Equal("not filled: a step or lost time lies in it or at its edge", Assert.Single(findings).Note);
    }

    [Theory]
    [InlineData(199)]
    [InlineData(211)]
    public void A_break_beside_a_run_is_no_obstacle(int at)
    {
        var (_, findings) = Motion.Run(Motion.Track(Path, (200, 209)) with { Breaks = [at] }, Motion.Open);
        Assert.Equal(FaultAction.Filled, Assert.Single(findings).Action);
    }

    [Fact]
    public void What_lies_beyond_a_break_is_not_asked()
    {
        var increments = new Increments(Motion.Track(Path, (200, 209)) with { Breaks = [190] }, Clock.Regular(600, Motion.Rate));
        Assert.Equal([.. Enumerable.Range(190, 9), .. Enumerable.Range(210, 12)], increments.Beside(199, 11, 12));
    }

    [Fact]
    public void A_flagged_edge_is_not_built_on_and_a_turned_back_one_is()
    {
        var track = Motion.Track(Path, (200, 204), (300, 304)).With(199, SampleState.Flagged).With(305, SampleState.TurnedBack);
        var (_, findings) = Motion.Run(track, Motion.Open);
        Assert.Equal("not filled: beside a flagged sample", findings[0].Note);
        Assert.Equal(FaultAction.Filled, findings[1].Action);
    }

    [Fact]
    public void With_filling_off_every_missing_run_is_left_with_a_row()
    {
        var (track, findings) = Motion.Run(Motion.Track(Path, (100, 101), (200, 240)), new FillSettings { Method = FillMethod.None });
        Assert.Equal([(100, 101), (200, 240)], findings.Select(f => (f.First, f.Last)));
        Assert.All(findings, f => Assert.Equal((FaultAction.Left, "not filled: filling is off"), (f.Action, f.Note)));
        Assert.Equal(43, track.States.Count(s => s == SampleState.Missing));
    }

    [Fact]
    public void Other_findings_and_whole_tracks_pass_untouched()
    {
        var step = new Finding { Joint = 0, First = 50, Last = 50, Kind = FaultKind.Step, Action = FaultAction.Flagged, Note = "a" };
        var take = Motion.Track(Path);
        var (track, findings) = Motion.Run(take, Motion.Open, step);
        Assert.Same(take, track);
        Assert.Equal(step, Assert.Single(findings));
    }
}
