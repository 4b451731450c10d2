using System.Runtime.Intrinsics;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

public sealed class PenalisedFitTests
{
    private const int Length = 400;

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void Polynomials_below_the_order_pass_at_any_strength_on_any_clock(int order)
    {
        var times = Wobbly();
        var rows = new PenaltyRows(order, times, [0, 150, Length]);
        var y = times.Select(t => Vector256.Create(order > 2 ? (t / 100 * t / 100) + 1 : order > 1 ? t / 100 : 3)).ToArray();
        var z = Smooth(rows, y, 1e9);
        Assert.All(y.Zip(z), p => Assert.Equal(p.First[0], p.Second[0], 1e-10));
    }

    [Fact]
    public void A_sine_is_scaled_by_the_gain_in_closed_form()
    {
        const double Cycle = 25;
        var y = Enumerable.Range(0, Length).Select(n => Vector256.Create(Math.Sin(2 * Math.PI * n / Cycle))).ToArray();
        var z = Smooth(new PenaltyRows(3, Even(), [0, Length]), y, 1e3);
        var gain = 1 / (1 + (1e3 * Math.Pow(2 * Math.Sin(Math.PI / Cycle), 6)));
        Assert.All(Enumerable.Range(150, 100), n => Assert.Equal(gain * y[n][0], z[n][0], 1e-9));
    }

    [Fact]
    public void An_impulse_keeps_its_sum_its_place_and_its_spread_and_its_height_is_its_leverage()
    {
        var y = new Vector256<double>[Length];
        y[7] = Vector256<double>.One;
        var rows = new PenaltyRows(3, Even(), [0, Length]);
        var z = Smooth(rows, y, 1e6);
        for (var power = 0; power < 3; power++)
        {
            // Least squares with a penalty that polynomials of degree 2 escape leaves their moments alone.
            Assert.Equal(Math.Pow(7, power), z.Select((v, n) => v[0] * Math.Pow(n, power)).Sum(), 1e-9);
        }

        using var fit = new PenalisedFit(rows);
        fit.Factor(Vector256.Create(1e-6), []);
        var leverage = new Vector256<double>[Length];
        fit.Leverage(leverage);
        Assert.Equal(z[7][0], leverage[7][0], 1e-14);
    }

    [Fact]
    public void A_penalty_of_a_million_millions_costs_no_digits()
    {
        var random = new Random(1);
        var y = Enumerable.Range(0, Length).Select(n => Vector256.Create(Math.Sin(n / 30.0) + random.NextDouble())).ToArray();
        var rows = new PenaltyRows(3, Even(), [0, Length]);
        var there = Smooth(rows, y, 1e12);
        var back = Smooth(rows, [.. y.Reverse()], 1e12);
        Assert.All(there.Zip(back.Reverse()), p => Assert.Equal(p.First[0], p.Second[0], 1e-12));
    }

    [Fact]
    public void Nothing_reaches_from_one_stretch_to_the_next()
    {
        var random = new Random(2);
        var y = Enumerable.Range(0, Length).Select(_ => Vector256.Create(random.NextDouble())).ToArray();
        var alone = Smooth(new PenaltyRows(3, Even().AsSpan(0, 150), [0, 150]), y[..150], 100);
        var beside = Smooth(new PenaltyRows(3, Even(), [0, 150, Length]), y, 100);
        Assert.Equal(alone, beside[..150]);
    }

    [Fact]
    public void A_local_strength_counts_like_an_overall_one()
    {
        var random = new Random(4);
        var y = Enumerable.Range(0, Length).Select(_ => Vector256.Create(random.NextDouble())).ToArray();
        using var fit = new PenalisedFit(new PenaltyRows(3, Even(), [0, Length]));
        var (once, twice) = (new Vector256<double>[Length], new Vector256<double>[Length]);
        fit.Factor(Vector256.Create(0.01), []);
        fit.Fit(y, once);
        fit.Factor(Vector256.Create(0.1), [.. Enumerable.Repeat(0.1, Length)]);
        fit.Fit(y, twice);
        Assert.All(once.Zip(twice), p => Assert.Equal(p.First[0], p.Second[0], 1e-12));
    }

    [Fact]
    public void Squared_residuals_are_those_of_the_fit()
    {
        var random = new Random(5);
        var y = Enumerable.Range(0, Length).Select(_ => Vector256.Create(random.NextDouble(), random.NextDouble(), 0, random.NextDouble())).ToArray();
        using var fit = new PenalisedFit(new PenaltyRows(3, Even(), [0, 100, Length]));
        var (z, squared, totals) = (new Vector256<double>[Length], new Vector256<double>[Length], new Vector256<double>[4]);
        fit.Factor(Vector256.Create(0.01), []);
        fit.Fit(y, z);
        fit.SquaredResiduals(y, squared, totals);
        for (var n = 0; n < Length; n++)
        {
            var r = y[n] - z[n];
            Assert.Equal(Vector256.Dot(r, r), squared[n][2], 1e-12);
        }

        Assert.Equal(Enumerable.Range(0, Length).Sum(n => (y[n][1] - z[n][1]) * (y[n][1] - z[n][1])), totals[1][3], 1e-10);
    }

    [Fact]
    public void A_stretch_without_a_difference_is_refused() =>
        Assert.Throws<ArgumentException>(() => new PenaltyRows(3, [0, 1, 2, 0, 1, 2, 3], [0, 3, 7]));

    private static Vector256<double>[] Smooth(PenaltyRows rows, Vector256<double>[] y, double lambda)
    {
        using var fit = new PenalisedFit(rows);
        var z = new Vector256<double>[y.Length];
        fit.Factor(Vector256.Create(1 / lambda), []);
        fit.Fit(y, z);
        return z;
    }

    private static double[] Even() => [.. Enumerable.Range(0, Length).Select(n => (double)n)];

    private static double[] Wobbly()
    {
        var random = new Random(6);
        return [.. Enumerable.Range(0, Length).Select(n => n + (0.8 * random.NextDouble()))];
    }
}
