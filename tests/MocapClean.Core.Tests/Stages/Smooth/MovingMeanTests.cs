using System.Runtime.Intrinsics;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

public sealed class MovingMeanTests
{
    [Theory]
    [InlineData(1, 1)]
    [InlineData(5, 1)]
    [InlineData(5, 3)]
    [InlineData(50, 3)]
    [InlineData(50, 24)]
    [InlineData(50, 25)]
    [InlineData(51, 25)]
    [InlineData(50, 200)]
    public void Is_the_plain_mean_of_the_window_taken_twice(int length, int reach)
    {
        var random = new Random(length + reach);
        var series = Enumerable.Range(0, length + 7).Select(_ => random.NextDouble()).ToArray();
        var values = series.Select(v => Vector256.Create(v, -v, 0, 1)).ToArray();
        MovingMean.Triangular(values, [0, length, length + 7], reach, new Vector256<double>[MovingMean.Room(length + 7, reach)]);
        double[] expected = [.. Plain(Plain(series[..length], reach), reach), .. Plain(Plain(series[length..], reach), reach)];
        Assert.All(expected.Zip(values), p => Assert.Equal(p.First, p.Second[0], 1e-14));
        Assert.All(values, v => Assert.Equal(1, v[3], 1e-14));
    }

    [Fact]
    public void A_quiet_passage_keeps_its_digits_beside_a_loud_one()
    {
        var values = Enumerable.Range(0, 1000).Select(n => Vector256.Create(n < 500 ? 1e6 : 1e-12)).ToArray();
        MovingMean.Triangular(values, [0, 1000], 10, new Vector256<double>[MovingMean.Room(1000, 10)]);
        Assert.All(values[540..], v => Assert.Equal(1, v[0] / 1e-12, 1e-12));
    }

    private static double[] Plain(double[] series, int reach) =>
        [.. series.Select((_, n) => series[Math.Max(0, n - reach)..Math.Min(series.Length, n + reach + 1)].Average())];
}
