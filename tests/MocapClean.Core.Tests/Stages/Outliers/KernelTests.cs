using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Outliers;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Outliers;

public sealed class KernelTests
{
    [Fact]
    public void The_cubic_through_two_neighbours_on_each_side_has_its_textbook_weights()
    {
        // (-1, 4, 4, -1) / 6: Lagrange's interpolation at 0 from -2, -1, 1, 2; also what least third differences give. By hand.
        var fit = NeighbourFit.Across([-1, -2, 1, 2], 3, [0]);
        for (var i = 0; i < 4; i++)
        {
            var values = new Vec3[4];
            values[i] = new Vec3(1, -2, 3);
            var weight = i % 2 == 0 ? 4 / 6.0 : -1 / 6.0;
            Assert.Equal(0, (fit.Predict(0, values) - (weight * values[i])).Norm, 1e-12);
            Assert.Equal(0, fit.Misfit(values), 1e-7);
        }
    }

    [Fact]
    public void A_quadratic_over_seven_points_smooths_as_savitzky_and_golay_published()
    {
        // (-2, 3, 6, 7, 6, 3, -2) / 21: Savitzky and Golay 1964, table I, from memory.
        double[] published = [-2, 3, 6, 7, 6, 3, -2];
        var fit = NeighbourFit.Across([-3, -2, -1, 0, 1, 2, 3], 2, [0]);
        for (var i = 0; i < 7; i++)
        {
            var values = new Vec3[7];
            values[i] = new Vec3(1, 0, 0);
            Assert.Equal(published[i] / 21, fit.Predict(0, values).X, 1e-12);
        }
    }

    [Fact]
    public void A_jump_in_a_polynomial_leaves_no_misfit_and_the_motion_across_it_is_told()
    {
        static Vec3 Curve(double t) => new(1 + t, (t * t) - t, t * t * t);
        double[] times = [-0.5, -1.5, -2.5, -3.5, 0.5, 1.5, 2.5, 3.5];
        // Each side is told from its nearest sample, as a chart around it would.
        var values = times.Select(t => Curve(t) - Curve(t < 0 ? -0.5 : 0.5)).ToArray();
        var fit = NeighbourFit.WithJump(times, 4, 3);
        Assert.Equal(0, fit.Misfit(values), 1e-7);
        Assert.Equal(0, (fit.Predict(0, values) - (Curve(0.5) - Curve(-0.5))).Norm, 1e-12);
    }

    [Fact]
    public void What_the_polynomial_cannot_follow_is_misfit()
    {
        var fit = NeighbourFit.Across([-3, -2, -1, 0, 1, 2, 3], 0, [0]);
        var values = new Vec3[7];
        values[0] = new Vec3(7, 0, 0);
        // A mean of 1 leaves 6 and six times -1: root of 36 + 6.
        Assert.Equal(Math.Sqrt(42), fit.Misfit(values), 1e-12);
    }

    [Theory]
    [InlineData(1e-9)]
    [InlineData(0.3)]
    [InlineData(0.49)]
    [InlineData(3.1)]
    public void The_fast_logarithm_is_the_logarithm(double radians)
    {
        var q = RotationVector.Exp(radians * new Vec3(0.48, -0.6, 0.64));
        foreach (var signed in new[] { q, -q })
        {
            Assert.Equal(0, (Chart.Log(signed) - RotationVector.Log(q)).Norm, 1e-9 * radians);
        }
    }

    [Fact]
    public void The_spread_is_the_scaled_median_of_the_deviations()
    {
        // 1, 1, 2, 2, 4, 6, 9 has the median 2 and the deviations 1, 1, 0, 0, 2, 4, 7: 1.4826 by SciPy 1.10.1, median_abs_deviation.
        Assert.Equal(1.4826, RobustSpread.Of([1, 1, 0, 0, 2, 4, 7]), 1e-12);
        Assert.Equal(1.4826 * 1.5, RobustSpread.Of([3, 1, 2, 0]), 1e-12);
        Assert.True(double.IsNaN(RobustSpread.Of([])));
    }

    [Fact]
    public void A_steady_turn_has_no_innovation_at_any_stride_and_a_single_bad_sample_all_of_its_angle()
    {
        Quat[] samples = [.. Enumerable.Range(0, 17).Select(n => Motion.Turn(1, 2, 3, 13 * n))];
        foreach (var stride in new[] { 1, 2, 4 })
        {
            Assert.Equal(0, Innovations.At(samples, 8, stride), 1e-7);
        }

        samples[8] *= Motion.Turn(1, 0, 0, 2);
        Assert.Equal(Angle.FromDegrees(2), Innovations.At(samples, 8, 1), 1e-3);
    }

    [Fact]
    public void A_blow_is_motion_and_a_bad_sample_is_not()
    {
        static Quat Blow(int n) => Motion.Turn(0, 0, 1, n < 20 ? 10 * n : 200 - (4 * (n - 20)));
        Quat[] samples = [.. Enumerable.Range(0, 40).Select(Blow)];
        var (near, roughly) = (1e-9, Angle.FromDegrees(1));
        Assert.True(new MotionTest(Path(samples), 10, 30).Explains(18, 22, near, roughly));
        Assert.Equal(0, MotionTest.AcrossEdge(Path(samples), 21), 1e-9);
        samples[20] *= Motion.Turn(1, 0, 0, 5);
        Assert.False(new MotionTest(Path(samples), 10, 30).Explains(18, 22, near, roughly));
    }

    private static MotionPath Path(Quat[] samples) =>
        MotionPath.Of(Motion.Take(100, samples).Tracks[0], 100, 1e-9, new UpdateRhythm(0, 1));
}
