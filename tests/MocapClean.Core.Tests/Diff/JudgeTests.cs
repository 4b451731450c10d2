using System.Collections.Immutable;
using MocapClean.Core.Diff;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Diff;

public sealed class JudgeTests
{
    private static readonly VerdictSettings Defaults = new();

    [Fact]
    public void A_take_without_findings_is_accepted_and_has_no_window()
    {
        var judgement = Of(Take());
        Assert.Equal(Verdict.Accept, judgement.Verdict);
        Assert.Empty(judgement.Windows);
    }

    [Fact]
    public void Mends_alone_are_accepted_with_mends() =>
        Assert.Equal(Verdict.AcceptWithMends, Of(Take(Row(0, 100, 104, FaultKind.Gap, FaultAction.Filled))).Verdict);

    [Fact]
    public void A_step_is_looked_at_first_and_gets_a_window_of_a_second_on_either_side()
    {
        var judgement = Of(Take(Row(1, 500, 500, FaultKind.Step, FaultAction.Flagged)));
        Assert.Equal(Verdict.LookFirst, judgement.Verdict);
        var window = Assert.Single(judgement.Windows);
        Assert.Equal((400, 600), (window.First, window.Last));
        Assert.Equal(["hand"], window.Joints);
    }

    [Fact]
    public void More_than_two_percent_bad_frames_suggest_a_reshoot_and_the_reason_names_the_joint()
    {
        var judgement = Of(Take(Row(1, 500, 521, FaultKind.Freeze, FaultAction.Flagged)));
        Assert.Equal(Verdict.Reshoot, judgement.Verdict);
        Assert.Contains("hand", judgement.Reason, StringComparison.Ordinal);
        Assert.Equal(22, judgement.BadFrames);
    }

    [Fact]
    public void Bad_frames_of_several_joints_at_the_same_time_count_once() =>
        Assert.Equal(20, Of(Take(Row(0, 500, 519, FaultKind.Gap, FaultAction.Left), Row(1, 505, 515, FaultKind.Gap, FaultAction.Left))).BadFrames);

    [Fact]
    public void A_gap_longer_than_allowed_suggests_a_reshoot_even_in_a_long_take()
    {
        var settings = Defaults with { BadFrames = 0.5 };
        var take = Take(Row(0, 100, 151, FaultKind.Gap, FaultAction.Left));
        Assert.Equal(Verdict.Reshoot, Judge.Of(take, null, settings, Matches).Verdict);
        Assert.Equal(Verdict.LookFirst, Judge.Of(take, new Segment(140, 900), settings, Matches).Verdict);
    }

    [Fact]
    public void A_critical_joint_bears_few_bad_frames_only()
    {
        var take = Take(Row(1, 500, 503, FaultKind.Gap, FaultAction.Left));
        Assert.Equal(Verdict.LookFirst, Of(take).Verdict);
        Assert.Equal(Verdict.Reshoot, Judge.Of(take, null, Defaults with { Critical = ["hand"] }, Matches).Verdict);
    }

    [Fact]
    public void An_ignored_joint_counts_in_no_verdict()
    {
        var take = Take(Row(1, 500, 600, FaultKind.Gap, FaultAction.Left));
        Assert.Equal(Verdict.Accept, Judge.Of(take, null, Defaults with { Ignore = ["hand"] }, Matches).Verdict);
    }

    [Fact]
    public void Findings_outside_the_action_count_in_no_verdict_and_no_window()
    {
        var take = Take(Row(1, 0, 100, FaultKind.Gap, FaultAction.Left));
        var judgement = Judge.Of(take, new Segment(200, 900), Defaults, Matches);
        Assert.Equal(Verdict.Accept, judgement.Verdict);
        Assert.Empty(judgement.Windows);
    }

    [Fact]
    public void Lost_frames_count_as_bad()
    {
        var judgement = Of(Take(Row(-1, 500, 500, FaultKind.LostFrames, FaultAction.Left) with { Lost = 30 }));
        Assert.Equal((Verdict.Reshoot, 30L), (judgement.Verdict, judgement.LostFrames));
    }

    [Fact]
    public void Windows_that_touch_are_one()
    {
        var judgement = Of(Take(
            Row(0, 300, 300, FaultKind.Step, FaultAction.Flagged), Row(1, 450, 450, FaultKind.Step, FaultAction.Flagged)));
        var window = Assert.Single(judgement.Windows);
        Assert.Equal((200, 550), (window.First, window.Last));
    }

    [Fact]
    public void The_same_frames_in_most_joints_are_one_event()
    {
        var tracks = Enumerable.Range(0, 5).Select(j => Some.Track($"joint{j}", Some.Spin(1000, 0.1))).ToArray();
        var take = Some.Take(100, tracks) with
        {
            Findings = [.. Enumerable.Range(0, 4).Select(j => Row(j, 500, 504, FaultKind.Gap, FaultAction.Left)), Row(4, 520, 520, FaultKind.Step, FaultAction.Flagged)],
        };
        var window = Assert.Single(Of(take).Windows);
        Assert.Equal("4 joints missing for 5 frames (0.05 s); joint4 jumps by an unknown angle and stays", window.Reason);
    }

    private static Judgement Of(Take take) => Judge.Of(take, null, Defaults, Matches);

    private static bool Matches(string name, ImmutableArray<string> globs) => globs.Contains(name);

    private static Take Take(params Finding[] findings) =>
        Some.Take(100, Some.Track("head", Some.Spin(1000, 0.1)), Some.Track("hand", Some.Spin(1000, 0.1))) with { Findings = [.. findings] };

    private static Finding Row(int joint, int first, int last, FaultKind kind, FaultAction action) =>
        new() { Joint = joint, First = first, Last = last, Kind = kind, Action = action };
}
