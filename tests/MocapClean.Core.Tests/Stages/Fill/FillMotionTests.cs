using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Fill;

/// <summary>Bridges across motions whose truth is known in closed form.</summary>
public sealed class FillMotionTests
{
    [Theory]
    [InlineData(FillMethod.GaussianProcess, 1e-3)]
    [InlineData(FillMethod.Spline, 1e-9)]
    [InlineData(FillMethod.Slerp, 1e-9)]
    public void A_constant_spin_goes_on_through_a_gap(FillMethod method, double degrees)
    {
        var path = Motion.Spin(400, 90);
        var (track, _) = Motion.Run(Motion.Track(path, (200, 229)), Motion.Open with { Method = method });
        Assert.True(Angle.ToDegrees(Motion.Largest(track, path, 200, 229)) < degrees);
    }

    [Theory]
    [InlineData(FillMethod.GaussianProcess)]
    [InlineData(FillMethod.Spline)]
    public void A_spin_of_more_than_half_a_turn_keeps_its_direction(FillMethod method)
    {
        // 600 deg/s over 61 intervals of 1/120 s is a turn of 305 degrees; the short way would be -55.
        var path = Motion.Spin(600, 600);
        var (track, _) = Motion.Run(Motion.Track(path, (300, 359)), Motion.Open with { Method = method });
        Assert.True(Angle.ToDegrees(Motion.Largest(track, path, 300, 359)) < 1);
    }

    [Fact]
    public void Slerp_takes_the_short_way()
    {
        var path = Motion.Spin(600, 600);
        var (track, _) = Motion.Run(Motion.Track(path, (300, 359)), Motion.Open with { Method = FillMethod.Slerp });
        var half = Slerp.At(path[299], path[360], 0.5);
        Assert.True(Angle.Between(Slerp.At(track.Samples[329], track.Samples[330], 0.5), half) < 1e-9);
    }

    [Fact]
    public void A_swing_is_met_better_by_the_spline_than_by_slerp_and_best_by_regression()
    {
        var path = Motion.Swing(1200);
        var gaps = Enumerable.Range(1, 9).Select(k => (k * 110, (k * 110) + 29)).ToArray();
        double Error(FillMethod method)
        {
            var (track, _) = Motion.Run(Motion.Track(path, gaps), Motion.Open with { Method = method });
            return gaps.Max(g => Motion.Largest(track, path, g.Item1, g.Item2));
        }

        var (regression, spline, slerp) = (Error(FillMethod.GaussianProcess), Error(FillMethod.Spline), Error(FillMethod.Slerp));
        Assert.True(spline < slerp / 2, $"{spline} against {slerp}");
        Assert.True(regression < spline / 3, $"{regression} against {spline}");
    }

    [Fact]
    public void A_joint_at_rest_stays_at_rest()
    {
        var path = Enumerable.Repeat(new Quat(0.6, 0, 0.8, 0), 300).ToArray();
        var (track, findings) = Motion.Run(Motion.Track(path, (100, 140)), new FillSettings());
        Assert.True(Motion.Largest(track, path, 100, 140) < 1e-12);
        Assert.True(Assert.Single(findings).ExpectedErrorRadians < 1e-9);
    }

    [Fact]
    public void One_missing_frame_of_a_swing_is_put_back_within_a_thousandth_of_a_degree()
    {
        var path = Motion.Swing(600);
        var (track, _) = Motion.Run(Motion.Track(path, (300, 300)), new FillSettings());
        Assert.True(Angle.ToDegrees(Motion.Largest(track, path, 300, 300)) < 1e-3);
    }

    [Fact]
    public void An_irregular_clock_is_followed()
    {
        // Every fifth interval lasts 1.4 nominal ones: a spin sampled at those times turns further there.
        double[] times = [.. Enumerable.Range(0, 400).Select(n => (n + (0.4 * (n / 5))) / Motion.Rate)];
        var path = times.Select(t => RotationVector.Exp(new Vec3(0, t, 0))).ToArray();
        var clock = new Clock { Delivered = [.. times], Steady = [.. times], Rate = Motion.Rate, IsRegular = false };
        foreach (var method in new[] { FillMethod.GaussianProcess, FillMethod.Spline, FillMethod.Slerp })
        {
            var (track, _) = Motion.Run(Motion.Track(path, (203, 220)), clock, Motion.Open with { Method = method });
            Assert.True(Angle.ToDegrees(Motion.Largest(track, path, 203, 220)) < 1e-3, method.ToString());
        }
    }

    [Fact]
    public void The_last_filled_sample_leads_to_the_right_edge_as_smoothly_as_the_first_leaves_the_left()
    {
        var path = Motion.Wander(900, 7);
        var (track, _) = Motion.Run(Motion.Track(path, (400, 459)), Motion.Open);
        double Step(int n) => Angle.Between(track.Samples[n], track.Samples[n + 1]);
        Assert.InRange(Step(399) / Step(398), 0.7, 1.4);
        Assert.InRange(Step(459) / Step(460), 0.7, 1.4);
    }
}
