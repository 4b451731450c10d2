using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

public sealed class MeanOrientationTests
{
    // Source: Data/Orientation/averages.json, NumPy's eigenvectors, agreeing with SciPy's mean.
    [Fact]
    public void Means_are_the_known_ones()
    {
        var rows = CheckJson.Read("averages.json").GetProperty("rows").EnumerateArray().ToArray();
        Assert.Equal(7, rows.Length);
        Assert.All(rows, row =>
        {
            Quat[] all = [.. row.GetProperty("quaternions").EnumerateArray().Select(CheckJson.Quat)];
            var weights = row.GetProperty("weights").Numbers();

            Near.SameOrientation(row.Quat("mean"), MeanOrientation.Of(all, weights), 1e-10);
            Near.SameOrientation(row.Quat("mean"), MeanOrientation.Of([.. all.Select(q => -5 * q)], weights), 1e-10);
            if (weights.Distinct().Count() == 1)
            {
                Near.SameOrientation(row.Quat("mean"), MeanOrientation.Of(all), 1e-10);
            }
        });
    }

    [Fact]
    public void What_has_no_direction_has_no_place_in_a_mean()
    {
        Assert.Throws<ArgumentException>(() => MeanOrientation.Of([]));
        Assert.Throws<ArgumentException>(() => MeanOrientation.Of([Quat.Identity, default]));
        Assert.Throws<ArgumentException>(() => MeanOrientation.Of([Quat.Identity, Quat.Missing]));
    }

    [Theory]
    [InlineData(1.0)]
    [InlineData(0.0, 0.0)]
    [InlineData(1.0, -1.0)]
    [InlineData(1.0, double.NaN)]
    [InlineData(1.0, double.PositiveInfinity)]
    public void Weights_that_are_none_are_refused(params double[] weights) =>
        Assert.Throws<ArgumentException>(() => MeanOrientation.Of([Quat.Identity, Quat.Identity], weights));

    [Property(MaxTest = 300, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property The_mean_of_two_lies_half_way_on_the_side_of_the_first(Quat a, Quat b)
    {
        var mean = MeanOrientation.Of([a, b]);
        var off = Angle.ToDegrees(Angle.Between(mean, Slerp.At(a, b, 0.5)));
        return ((off < 1e-6 || Angle.ToDegrees(Angle.Between(a, b)) > 179) && Quat.Dot(mean, a) >= 0).Label($"{off} deg");
    }

    [Property(MaxTest = 300, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Turning_all_turns_the_mean(Quat centre, Quat turn, int x, int y, int z)
    {
        Vec3[] away = [new(x % 10, y % 10, z % 10), new(z % 10, x % 10, 3), new(1, 2, y % 10)];
        Quat[] all = [.. away.Select(v => centre * RotationVector.Exp(0.05 * v))];
        var mean = MeanOrientation.Of(all);
        var left = Angle.Between(turn * mean, MeanOrientation.Of([.. all.Select(q => turn * q)]));
        var right = Angle.Between(mean * turn, MeanOrientation.Of([.. all.Select(q => q * turn)]));
        return (Angle.ToDegrees(Math.Max(left, right)) < 1e-9).Label($"{left} {right}");
    }
}
