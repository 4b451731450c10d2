using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Fill;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Fill;

/// <summary>The pieces under the bridges.</summary>
public sealed class FillKernelTests
{
    [Fact]
    public void A_closed_path_ends_at_its_right_edge_whatever_was_predicted()
    {
        var (from, to) = (RotationVector.Exp(new Vec3(0.3, -1, 2)), RotationVector.Exp(new Vec3(-1, 0.4, 0.2)));
        var turns = Enumerable.Range(0, 40).Select(i => new Vec3(0.05 * Math.Sin(i), 0.02, -0.03 * Math.Cos(0.3 * i))).ToArray();
        var shares = Enumerable.Repeat(1.0 / 40, 40).ToArray();
        var path = ClosedPath.Close(from, to, turns, shares);
        Assert.Equal(to, path[^1] == to ? path[^1] : -path[^1]);
        var chained = turns.Aggregate(from, (q, v) => q * RotationVector.Exp(v));
        Assert.True(Angle.Between(chained, to) < 1e-12);
        Assert.True(Angle.Between(path[^2] * RotationVector.Exp(turns[^1]), to) < 1e-12);
    }

    [Fact]
    public void Turns_that_contradict_the_edges_wildly_still_close()
    {
        var (from, to) = (Quat.Identity, RotationVector.Exp(new Vec3(0.2, 0.1, 0)));
        var turns = Enumerable.Range(0, 12).Select(i => new Vec3(2.5 * Math.Sin(i * i), 2 * Math.Cos(3 * i), 1.7)).ToArray();
        var shares = Enumerable.Range(0, 12).Select(i => i == 5 ? 1.0 : 0).ToArray();
        var path = ClosedPath.Close(from, to, turns, shares);
        Assert.True(Angle.Between(path[^2] * RotationVector.Exp(turns[^1]), to) < 1e-12);
        Assert.True(Angle.Between(path[^1], to) < 1e-15);
    }

    [Fact]
    public void Cholesky_solves_a_matrix_worked_by_hand()
    {
        // [4 2; 2 5] = [2 0; 1 2] [2 1; 0 2]; determinant 16. By hand.
        var factor = Cholesky.Factor([4, 0, 2, 5], 2);
        double[] b = [2, 5];
        factor.Forward(b);
        Assert.Equal([1, 2], b);
        Assert.Equal(Math.Log(16), factor.LogDeterminant(), 1e-14);
    }

    [Fact]
    public void Inner_products_of_every_length_agree_with_a_plain_sum()
    {
        for (var n = 0; n < 40; n++)
        {
            var a = Enumerable.Range(1, n).Select(i => 1.0 / i).ToArray();
            var b = Enumerable.Range(1, n).Select(i => Math.Sqrt(i)).ToArray();
            Assert.Equal(a.Zip(b, (x, y) => x * y).Sum(), LagProducts.Dot(a, b), 1e-12);
        }
    }

    [Fact]
    public void Autocovariance_counts_only_pairs_with_weight()
    {
        // Lag 1: pairs (1,2) and (5,7); lag 2: pair (2,5) has the unknown one between and counts. By hand, per axis.
        Vec3[] v = [new(1, 0, 0), new(2, 0, 0), default, new(5, 0, 0), new(7, 0, 0)];
        var result = LagProducts.Autocovariance(v, [1, 1, 0, 1, 1], 2);
        Assert.Equal([(1.0 + 4 + 25 + 49) / 12, (2.0 + 35) / 6, 10.0 / 3], result);
    }

    [Fact]
    public void The_covariance_of_a_swing_swings_at_its_pace_and_has_its_mean_square()
    {
        // v = sin(2 pi n / 40) along one axis: mean square 1/2, a third of it an axis; half a period later the opposite.
        var turns = Enumerable.Range(0, 4000).Select(n => new Vec3(Math.Sin(2 * Math.PI * n / 40), 0, 0)).ToArray();
        var known = Enumerable.Repeat(element: true, 4000).ToArray();
        var covariance = MotionCovariance.Learn(turns, known, _ => 1, 400, 120);
        Assert.Equal(1.0 / 6, covariance.Variance, 0.005);
        Assert.Equal(-1.0 / 6, covariance[20], 0.005);
        Assert.Equal(0, covariance[10], 0.005);
        Assert.Equal((covariance[3] + covariance[4]) / 2, covariance[-3.5], 1e-15);
        Assert.Equal(0, covariance[5000]);
    }

    [Fact]
    public void A_covariance_from_any_numbers_is_positive_semi_definite()
    {
        var covariance = MotionCovariance.From([1, -0.9, 0.95, 0.3, -0.8, 0.7], 1);
        const int size = 30;
        var matrix = new double[size * size];
        for (var i = 0; i < size; i++)
        {
            for (var j = 0; j <= i; j++)
            {
                // At irregular times as well: between whole lags it is linear.
                matrix[(i * size) + j] = covariance[(0.83 * i) - (0.83 * j)] + (i == j ? 1e-9 : 0);
            }
        }

        // With a pivot that is not positive the determinant would be that of a tiny pivot: below 1e-14 of the diagonal.
        var factor = Cholesky.Factor(matrix, size);
        for (var i = 0; i < size; i++)
        {
            Assert.True(matrix[(i * size) + i] > 1e-6);
        }

        Assert.True(double.IsFinite(factor.LogDeterminant()));
    }
}
