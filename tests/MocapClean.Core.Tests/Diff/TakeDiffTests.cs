using MocapClean.Core.Diff;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Diff;

public sealed class TakeDiffTests
{
    [Fact]
    public void Samples_are_counted_by_what_was_done_to_them()
    {
        var delivered = Some.Spin(10, 1);
        var samples = delivered.ToArray();
        samples[2] = -samples[2];
        samples[4] = Some.About(0, 0, 1, 4.3);
        samples[6] = Some.About(0, 0, 1, 8);
        var states = new SampleState[10];
        states[6] = SampleState.Filled;
        states[8] = SampleState.Missing;
        var track = Some.Track("a", delivered) with { Samples = [.. samples], States = [.. states], Renormalised = [9] };
        var joint = TakeDiff.Of(Some.Take(100, track)).Joints[0];
        Assert.Equal((5, 2, 1, 1, 1), (joint.Identical, joint.Rewritten, joint.Smoothed, joint.Mended, joint.Missing));
        Assert.Equal(0.3, Angle.ToDegrees(joint.Smoothing.Largest), 1e-9);
        Assert.Equal(2, Angle.ToDegrees(joint.Mends.Largest), 1e-9);
    }

    [Fact]
    public void A_filled_gap_has_the_turn_from_edge_to_edge_and_a_filled_spike_the_angle_it_was_moved_by()
    {
        var delivered = Some.Spin(20, 1);
        (delivered[5], delivered[10]) = (Quat.Missing, Some.About(1, 0, 0, 50));
        var samples = Some.Spin(20, 1);
        var track = Some.Track("a", delivered) with { Samples = [.. samples], States = [.. new SampleState[20]] };
        var take = Some.Take(100, track) with
        {
            Findings =
            [
                new() { Joint = 0, First = 5, Last = 5, Kind = FaultKind.Gap, Action = FaultAction.Filled, SizeRadians = Angle.FromDegrees(2) },
                new() { Joint = 0, First = 10, Last = 10, Kind = FaultKind.Spike, Action = FaultAction.Filled, SizeRadians = 1 },
            ],
        };
        var rows = TakeDiff.Of(take).Rows;
        Assert.Equal(2, Angle.ToDegrees(rows[0].LargestRadians), 1e-9);
        Assert.Equal(Angle.Between(delivered[10], samples[10]), rows[1].LargestRadians, 1e-12);
    }

    [Fact]
    public void Percentile_is_by_nearest_rank()
    {
        var size = ChangeSize.Of([.. Enumerable.Range(1, 20).Select(n => (double)n)]);
        Assert.Equal((20.0, 19.0), (size.Largest, size.Percentile95));
        Assert.Equal(Math.Sqrt(143.5), size.Rms, 12);
    }

    [Fact]
    public void Two_takes_are_aligned_by_time_and_unmatched_joints_are_listed()
    {
        var slow = Some.Take(50, Some.Track("a", Some.Spin(50, 2)), Some.Track("x", Some.Spin(50, 2)));
        var fast = Some.Take(100, Some.Track("a", Some.Spin(100, 1)), Some.Track("y", Some.Spin(100, 1)));
        var comparison = TakeComparison.Of(slow, fast, shift: 0);
        var joint = Assert.Single(comparison.Joints);
        Assert.Equal((50, 0), (joint.Compared, joint.Changed));
        Assert.Equal(["x"], comparison.OnlyBefore);
        Assert.Equal(["y"], comparison.OnlyAfter);
        Assert.Equal(1, Angle.ToDegrees(TakeComparison.Of(slow, fast, shift: 1).Joints[0].Change.Largest), 1e-9);
    }
}
