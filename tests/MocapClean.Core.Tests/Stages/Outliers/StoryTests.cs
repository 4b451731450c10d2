using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Outliers;

/// <summary>Each fault is told by its own story, at its own frames.</summary>
public sealed class StoryTests
{
    private const double Rate = 120;

    private static readonly Quat Away = Motion.Turn(0.2, 0.9, 0.4, 25);

    private static Quat[] Healthy(double seconds = 10) => Motion.Sample(Motion.Swing, Rate, seconds);

    private static Quat[] Turned(Quat[] samples, int first, int last, Quat? left = null, Quat? right = null)
    {
        for (var n = first; n <= last; n++)
        {
            samples[n] = (left ?? Quat.Identity) * samples[n] * (right ?? Quat.Identity);
        }

        return samples;
    }

    [Theory]
    [InlineData(300, 300)]
    [InlineData(300, 301)]
    [InlineData(300, 307)]
    [InlineData(2, 3)]
    [InlineData(1190, 1192)]
    public void A_run_that_leaves_and_returns_is_a_spike(int first, int last)
    {
        var take = Search.Run(Rate, Turned(Healthy(), first, last, left: Away));
        Assert.Equal($"spike {first}-{last}", Search.Rows(take));
        Assert.All(Enumerable.Range(0, take.Length), n => Assert.Equal(
            n >= first && n <= last ? SampleState.Rejected : SampleState.Good, take.Tracks[0].States[n]));
    }

    [Fact]
    public void A_soft_spike_is_found_too()
    {
        var samples = Healthy();
        for (var n = 0; n < 6; n++)
        {
            samples[500 + n] *= Motion.Turn(1, 2, 0, 6 * Math.Sin(Math.PI * (n + 1) / 7));
        }

        Assert.Equal("spike 500-505", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void A_ragged_spike_of_up_to_half_a_turn_is_one_spike()
    {
        var samples = Healthy();
        for (var n = 0; n < 5; n++)
        {
            samples[500 + n] *= Motion.Turn(n - 2, 1, n, 30 + (37 * n));
        }

        Assert.Equal("spike 500-504", Search.Rows(Search.Run(Rate, samples)));
    }

    [Theory]
    [InlineData(1.5)]
    [InlineData(25)]
    [InlineData(165)]
    public void A_jump_that_stays_is_one_step_and_both_ways_to_undo_it_are_told(double degrees)
    {
        foreach (var (left, right) in new[] { (Motion.Turn(1, 1, 0, degrees), Quat.Identity), (Quat.Identity, Motion.Turn(0, 1, 2, degrees)) })
        {
            var take = Search.Run(Rate, Turned(Healthy(), 400, 1199, left, right));
            Assert.Equal("step 400-400", Search.Rows(take));
            var step = take.Findings.Single(f => f.Kind == FaultKind.Step);
            Assert.Equal(FaultAction.Flagged, step.Action);
            var undone = left == Quat.Identity ? step.UndoJoint!.Value * right : step.UndoRoom!.Value * left;
            Assert.InRange(Angle.ToDegrees(Angle.Between(undone, Quat.Identity)), 0, 0.35);
            Assert.InRange(Angle.ToDegrees(step.SizeRadians), degrees - 0.5, degrees + 0.5);
            Assert.Equal([400], take.Tracks[0].Breaks);
            Assert.All(take.Tracks[0].States, s => Assert.Equal(SampleState.Good, s));
        }
    }

    [Fact]
    public void A_step_smaller_than_a_degree_is_a_sensor_settling_and_not_told() =>
        Assert.Equal("", Search.Rows(Search.Run(Rate, Turned(Healthy(), 400, 1199, Motion.Turn(0, 1, 0, 0.7)))));

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void An_offset_is_turned_back_on_the_side_it_was_turned_on(bool inRoom)
    {
        var healthy = Healthy();
        var take = Search.Run(Rate, inRoom ? Turned(Healthy(), 500, 620, left: Away) : Turned(Healthy(), 500, 620, right: Away));
        Assert.Equal("offset 500-620", Search.Rows(take));
        var offset = take.Findings.Single(f => f.Kind == FaultKind.Offset);
        Assert.Equal(FaultAction.TurnedBack, offset.Action);
        Assert.Equal(inRoom, offset.UndoRoom.HasValue);
        Assert.Equal(!inRoom, offset.UndoJoint.HasValue);
        Assert.InRange(Angle.ToDegrees(offset.ExpectedErrorRadians!.Value), 0.001, 0.3);
        for (var n = 0; n < healthy.Length; n++)
        {
            var isInside = n is >= 500 and <= 620;
            Assert.Equal(isInside ? SampleState.TurnedBack : SampleState.Good, take.Tracks[0].States[n]);
            Assert.InRange(Angle.ToDegrees(Angle.Between(take.Tracks[0].Samples[n], healthy[n])), 0, isInside ? 0.3 : 0);
            Assert.Equal(1, take.Tracks[0].Samples[n].Norm, 1e-12);
        }
    }

    [Fact]
    public void An_offset_whose_ends_disagree_a_little_is_blended()
    {
        var healthy = Healthy();
        var samples = Healthy();
        for (var n = 500; n <= 620; n++)
        {
            samples[n] = Motion.Turn(0.2, 0.9, 0.4, 25 + (2 * (n - 500) / 120.0)) * samples[n];
        }

        var take = Search.Run(Rate, samples);
        Assert.Equal("offset 500-620", Search.Rows(take));
        Assert.All(Enumerable.Range(500, 121), n => Assert.InRange(
            Angle.ToDegrees(Angle.Between(take.Tracks[0].Samples[n], healthy[n])), 0, 0.3));
    }

    [Fact]
    public void An_offset_whose_ends_disagree_by_more_than_fills_allow_is_flagged_and_kept()
    {
        var samples = Healthy();
        for (var n = 500; n <= 620; n++)
        {
            samples[n] = Motion.Turn(0.2, 0.9, 0.4, 25 + (4 * (n - 500) / 120.0)) * samples[n];
        }

        var take = Search.Run(Rate, samples);
        Assert.Equal("offset 500-620", Search.Rows(take));
        Assert.Equal(FaultAction.Flagged, take.Findings.Single(f => f.Kind == FaultKind.Offset).Action);
        Assert.All(Enumerable.Range(500, 121), n => Assert.Equal(SampleState.Flagged, take.Tracks[0].States[n]));
        Assert.All(Enumerable.Range(500, 121), n => Assert.Equal(0, Angle.Between(take.Tracks[0].Samples[n], samples[n]), 1e-12));
        var wide = new StageSettings { Fill = new FillSettings { Worst = Angle.FromDegrees(6) } };
        var mended = Search.Run(Motion.Take(Rate, samples), wide);
        Assert.Equal(FaultAction.TurnedBack, mended.Findings.Single(f => f.Kind == FaultKind.Offset).Action);
    }

    [Fact]
    public void A_return_after_the_longest_offset_is_two_steps() =>
        Assert.Equal("step 300-300, step 700-700", Search.Rows(Search.Run(Rate, Turned(Healthy(), 300, 699, left: Away))));

    [Fact]
    public void Other_faults_inside_an_offset_have_rows_of_their_own()
    {
        var samples = Turned(Healthy(), 500, 700, left: Away);
        samples[560] *= Motion.Turn(0, 0, 1, 40);
        samples.AsSpan(620, 5).Fill(Quat.Missing);
        Assert.Equal(
            "offset 500-559, spike 560-560, offset 561-619, gap 620-624, offset 625-700", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void An_offset_inside_an_offset_is_turned_back_twice()
    {
        var healthy = Healthy();
        var samples = Turned(Turned(Healthy(), 500, 700, left: Away), 570, 620, left: Motion.Turn(1, 0, 0, 12));
        var take = Search.Run(Rate, samples);
        Assert.Equal("offset 500-569, offset 570-620, offset 621-700", Search.Rows(take));
        Assert.All(Enumerable.Range(500, 201), n => Assert.InRange(
            Angle.ToDegrees(Angle.Between(take.Tracks[0].Samples[n], healthy[n])), 0, 0.5));
    }

    [Fact]
    public void Repeats_while_the_joint_should_move_are_a_freeze()
    {
        var samples = Healthy();
        for (var n = 400; n <= 415; n++)
        {
            samples[n] = n % 2 == 0 ? samples[399] : -samples[399];
        }

        Assert.Equal("freeze 400-415", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void Fewer_repeats_than_the_setting_are_no_freeze()
    {
        var samples = Healthy();
        samples.AsSpan(400, 3).Fill(samples[399]);
        Assert.DoesNotContain("freeze", Search.Rows(Search.Run(Rate, samples)), StringComparison.Ordinal);
    }

    [Fact]
    public void Each_run_of_missing_samples_is_a_gap_with_its_turn_from_edge_to_edge()
    {
        var samples = Healthy();
        samples.AsSpan(0, 3).Fill(Quat.Missing);
        samples.AsSpan(600, 20).Fill(Quat.Missing);
        var take = Search.Run(Rate, samples);
        Assert.Equal("gap 0-2, gap 600-619", Search.Rows(take));
        Assert.Equal(Angle.Between(samples[599], samples[620]), take.Findings[1].SizeRadians, 1e-12);
        Assert.True(double.IsNaN(take.Findings[0].SizeRadians));
    }

    [Fact]
    public void A_joint_that_is_missing_throughout_is_one_gap() =>
        Assert.Equal("gap 0-599", Search.Rows(Search.Run(Rate, [.. Enumerable.Repeat(Quat.Missing, 600)])));

    [Fact]
    public void A_lone_bad_sample_between_gaps_is_found()
    {
        var samples = Healthy();
        samples.AsSpan(600, 3).Fill(Quat.Missing);
        samples[603] *= Away;
        samples.AsSpan(604, 3).Fill(Quat.Missing);
        Assert.Equal("gap 600-602, spike 603-603, gap 604-606", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void Bad_samples_one_after_another_are_all_found()
    {
        var samples = Healthy();
        for (var n = 100; n < 1100; n += 20)
        {
            samples[n] = Motion.Turn(n % 11, n % 3, 1, 5 + ((n * 37) % 150)) * samples[n];
        }

        var expected = Enumerable.Range(5, 50).Select(n => $"spike {20 * n}-{20 * n}");
        Assert.Equal(string.Join(", ", expected), Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void A_stretch_of_garbage_is_flagged_and_kept()
    {
        var samples = Healthy();
        for (var n = 300; n < 900; n++)
        {
            samples[n] = n % 5 == 0 || n % 7 == 0 ? Motion.Turn(n % 11, n % 3, 1, 30 + ((n * 37) % 150)) * samples[n] : samples[n];
        }

        var take = Search.Run(Rate, samples);
        var rows = take.Findings.Where(f => f.Kind != FaultKind.SignFlip).OrderBy(f => f.First).ToList();
        Assert.All(rows, f => Assert.Equal(FaultKind.Spike, f.Kind));
        Assert.InRange(rows.Where(f => f.Action == FaultAction.Flagged).Sum(f => f.Count), 500, 620);
        Assert.All(rows.Zip(rows.Skip(1)), p => Assert.True(p.First.Last < p.Second.First));
        Assert.All(Enumerable.Range(0, samples.Length), n => Assert.Equal(
            0, Angle.Between(samples[n], take.Tracks[0].Samples[n]), 1e-12));
    }

    [Fact]
    public void Bad_samples_beside_a_gap_are_found()
    {
        var samples = Healthy();
        samples.AsSpan(600, 4).Fill(Quat.Missing);
        samples[604] *= Away;
        samples[605] *= Away;
        Assert.Equal("gap 600-603, spike 604-605", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void A_jump_inside_a_short_gap_is_a_step_at_the_first_sample_after_it()
    {
        var samples = Turned(Healthy(), 604, 1199, left: Away);
        samples.AsSpan(600, 4).Fill(Quat.Missing);
        Assert.Equal("gap 600-603, step 604-604", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void Faults_close_together_are_told_apart()
    {
        var samples = Turned(Healthy(), 500, 1199, left: Away);
        samples[508] *= Motion.Turn(0, 0, 1, 30);
        samples[520] *= Motion.Turn(1, 0, 0, 15);
        samples[521] *= Motion.Turn(1, 0, 0, 15);
        Assert.Equal("step 500-500, spike 508-508, spike 520-521", Search.Rows(Search.Run(Rate, samples)));
    }

    [Fact]
    public void Nothing_is_looked_for_across_a_break()
    {
        var take = Motion.Take(Rate, Turned(Healthy(), 600, 1199, left: Away));
        take = take with { Tracks = [take.Tracks[0] with { Breaks = [600] }] };
        Assert.Equal("", Search.Rows(Search.Run(take)));
    }

    [Fact]
    public void With_no_method_only_what_is_missing_is_told()
    {
        var samples = Turned(Healthy(), 300, 303, left: Away);
        samples.AsSpan(600, 20).Fill(Quat.Missing);
        var none = new StageSettings { Outliers = new OutliersSettings { Method = OutliersMethod.None } };
        var take = Motion.Take(Rate, samples);
        var done = Search.Run(take, none);
        Assert.Equal("gap 600-619", Search.Rows(done));
        Assert.Equal(take.Tracks[0].Samples.AsEnumerable(), done.Tracks[0].Samples.AsEnumerable());
        Assert.Equal(take.Tracks[0].States.AsEnumerable(), done.Tracks[0].States.AsEnumerable());
    }
}
