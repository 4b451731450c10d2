using System.Globalization;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Takes;

public sealed class ClockFrameTimeTests
{
    // Source: Data/Takes/rounded-frame-times.csv, exact fractions.
    public static TheoryData<string, double, string> Printed()
    {
        var data = new TheoryData<string, double, string>();
        foreach (var row in CheckCsv.Rows("rounded-frame-times.csv"))
        {
            data.Add(row[0], double.Parse(row[1], CultureInfo.InvariantCulture), row[2]);
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(Printed))]
    public void A_printed_frame_time_means_the_nearest_rate_that_rounds_to_it(string text, double asWritten, string candidates)
    {
        var nearest = candidates.Split(' ').MinBy(c => Math.Abs(Value(c) - asWritten))!;

        var clock = Clock.FromFrameTime(3, double.Parse(text, CultureInfo.InvariantCulture), Rounding(text));

        Assert.Equal(nearest, clock.ExactRate.ToString());
        Assert.Equal(Value(nearest), clock.Rate, 1e-12);
        Assert.True(clock.IsRegular);
        Assert.Equal([0, 1 / Value(nearest), 2 / Value(nearest)], clock.Delivered, (a, b) => Math.Abs(a - b) < 1e-15);
    }

    [Theory]
    [MemberData(nameof(Printed))]
    public void A_column_that_counts_up_a_printed_frame_time_means_the_same_rate(string text, double asWritten, string candidates)
    {
        var nearest = candidates.Split(' ').MinBy(c => Math.Abs(Value(c) - asWritten))!;
        var step = decimal.Parse(text, CultureInfo.InvariantCulture);
        var times = Enumerable.Range(0, 2001).Select(n => (double)(n * step)).ToArray();

        var clock = Clock.FromTimes(times, Rounding(text));

        Assert.Equal(nearest, clock.ExactRate.ToString());
        Assert.True(clock.IsRegular);
        Assert.Equal(times, clock.Delivered);
        Assert.Equal(2000 / Value(nearest), clock.Steady[2000], 1e-12);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-0.01)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void A_frame_time_that_is_no_time_is_refused(double seconds) =>
        Assert.Contains("no usable time", Assert.Throws<ArgumentException>(() => Clock.FromFrameTime(10, seconds, 1e-6)).Message);

    [Fact]
    public void A_frame_time_far_from_every_nominal_rate_stays_as_printed()
    {
        Assert.Equal(new FrameRate(1000, 7), Clock.FromFrameTime(10, 0.007, 0.0005).ExactRate);
        Assert.Equal(1 / Math.PI, Clock.FromFrameTime(10, Math.PI, 0).Rate, 1e-15);
        Assert.Null(Clock.FromFrameTime(10, Math.PI, 0).ExactRate);
    }

    private static double Rounding(string text) => 0.5 * Math.Pow(10, -text.Split('.')[1].Length);

    private static double Value(string fraction)
    {
        var parts = fraction.Split('/');
        return double.Parse(parts[0], CultureInfo.InvariantCulture) / (parts.Length > 1 ? double.Parse(parts[1], CultureInfo.InvariantCulture) : 1);
    }
}
