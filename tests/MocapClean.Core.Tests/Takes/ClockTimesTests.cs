using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Takes;

public sealed class ClockTimesTests
{
    [Theory]
    [InlineData(24000, 1001, 3)]
    [InlineData(25, 1, 2)]
    [InlineData(30, 1, 2)]
    [InlineData(60000, 1001, 3)]
    [InlineData(60, 1, 2)]
    [InlineData(120, 1, 2)]
    [InlineData(120, 1, 3)]
    [InlineData(120, 1, 6)]
    [InlineData(120000, 1001, 4)]
    [InlineData(120000, 1001, 9)]
    [InlineData(240, 1, 3)]
    [InlineData(1000, 1, 3)]
    public void Times_rounded_for_printing_lie_on_the_exact_grid(int numerator, int denominator, int digits)
    {
        var times = Enumerable.Range(0, 20000).Select(n => Math.Round((double)n * denominator / numerator, digits)).ToArray();

        var clock = Clock.FromTimes(times, 0.5 * Math.Pow(10, -digits));

        Assert.Equal(new FrameRate(numerator, denominator), clock.ExactRate);
        Assert.True(clock.IsRegular);
        Assert.Equal(times, clock.Delivered);
        for (var n = 0; n < times.Length; n++)
        {
            Assert.Equal((double)n * denominator / numerator, clock.Steady[n], 1e-12);
            Assert.True(clock.Rises(n));
            Assert.Equal(0, clock.Lost(n));
        }
    }

    [Fact]
    public void A_rate_that_is_nobodys_is_measured()
    {
        var times = Enumerable.Range(0, 5000).Select(n => Math.Round(3.2 + (n / 119.98), 6)).ToArray();

        var clock = Clock.FromTimes(times, 5e-7);

        Assert.Null(clock.ExactRate);
        Assert.Equal(119.98, clock.Rate, 1e-5);
        Assert.True(clock.IsRegular);
        Assert.All(Enumerable.Range(0, 5000), n => Assert.Equal(3.2 + (n / 119.98), clock.Steady[n], 1.5e-6));
    }

    [Fact]
    public void An_exact_decimal_step_gives_an_exact_rate()
    {
        var clock = Clock.FromTimes([.. Enumerable.Range(0, 2857).Select(n => (double)(n * 0.007m))], 0.0005);

        Assert.Equal(new FrameRate(1000, 7), clock.ExactRate);
        Assert.Equal(2856 * 0.007, clock.Steady[2856], 1e-12);
    }

    [Fact]
    public void Lost_frames_are_counted_and_the_grid_goes_on_behind_them()
    {
        var frames = Enumerable.Range(0, 600).Where(n => n is < 200 or > 236).ToArray();
        var times = frames.Select(n => Math.Round(n / 120.0, 4)).ToArray();

        var clock = Clock.FromTimes(times, 5e-5);

        Assert.Equal(new FrameRate(120, 1), clock.ExactRate);
        Assert.False(clock.IsRegular);
        Assert.Equal(37, clock.Lost(200));
        Assert.Equal(37, Enumerable.Range(0, times.Length).Sum(clock.Lost));
        Assert.All(Enumerable.Range(0, times.Length), n => Assert.Equal(frames[n] / 120.0, clock.Steady[n], 1e-12));
    }

    [Fact]
    public void Real_jitter_beyond_the_rounding_is_irregular_and_stays()
    {
        var times = Enumerable.Range(0, 500).Select(n => Math.Round((n + (0.2 * Math.Sin(n * 1.7))) / 100.0, 6)).ToArray();

        var clock = Clock.FromTimes(times, 5e-7);

        Assert.False(clock.IsRegular);
        Assert.Equal(100, clock.Rate, 0.1);
        Assert.All(Enumerable.Range(0, 500), n => Assert.Equal(times[n], clock.Steady[n], 2e-6));
    }

    [Fact]
    public void A_time_that_stands_still_is_squeezed_in_and_the_others_stay()
    {
        var clock = Clock.FromTimes([0, 0.01, 0.01, 0.02, 0.03, 0.04, 0.05], 0.005 / 100);

        Assert.False(clock.Rises(2));
        Assert.True(clock.Rises(3));
        Assert.False(clock.IsRegular);
        Assert.Equal([0, 0.01, 0.015, 0.02, 0.03, 0.04, 0.05], clock.Steady, (a, b) => Math.Abs(a - b) < 1e-12);
    }

    [Fact]
    public void A_time_that_stands_still_while_frames_go_on_is_counted_on()
    {
        var clock = Clock.FromTimes([0, 0.01, 0.01, 0.01, 0.04, 0.05, 0.06, 0.07, 0.08], 1e-5);

        Assert.False(clock.Rises(2));
        Assert.False(clock.Rises(3));
        Assert.Equal(0, Enumerable.Range(0, 9).Sum(clock.Lost));
        Assert.All(Enumerable.Range(0, 9), n => Assert.Equal(0.01 * n, clock.Steady[n], 1e-12));
    }

    [Fact]
    public void One_wild_time_moves_no_other()
    {
        var clock = Clock.FromTimes([0, 0.01, 0.02, 900, 0.04, 0.05, 0.06], 1e-5);

        Assert.False(clock.Rises(4));
        Assert.Equal(900, clock.Delivered[3]);
        Assert.All(Enumerable.Range(0, 7), n => Assert.Equal(0.01 * n, clock.Steady[n], 1e-12));
    }

    [Theory]
    [InlineData(1e300)]
    [InlineData(double.MaxValue)]
    [InlineData(-1e300)]
    public void Wild_times_at_the_ends_or_inside_change_no_rate(double wild)
    {
        foreach (var at in new[] { 0, 3, 49, 99 })
        {
            double[] times = [.. Enumerable.Range(0, 100).Select(n => n == at || (at > 0 && n == at - 1) ? wild : n / 50.0)];

            var clock = Clock.FromTimes(times, 1e-6);

            Assert.Equal(new FrameRate(50, 1), clock.ExactRate);
            Assert.Equal(times, clock.Delivered);
            Assert.All(Enumerable.Range(0, 100), n => Assert.Equal(n / 50.0, clock.Steady[n], 1e-12));
            var address = new Slate(at, new TimeCode(TimeCodeRate.Find(25, dropFrame: false)!, 0)).At(clock, 50);
            Assert.InRange(address.Frame, 0, address.Rate.FramesADay - 1);
        }
    }

    [Fact]
    public void Seconds_since_1970_keep_their_exact_grid()
    {
        double[] times = [.. Enumerable.Range(0, 1000).Select(n => 1.7e9 + (n / 120.0))];

        var clock = Clock.FromTimes(times, 0);

        Assert.Equal(new FrameRate(120, 1), clock.ExactRate);
        Assert.True(clock.IsRegular);
    }

    [Fact]
    public void A_clock_that_starts_again_is_counted_on()
    {
        var times = Enumerable.Range(0, 200).Select(n => (n < 120 ? n : n - 120) / 50.0).ToArray();

        var clock = Clock.FromTimes(times, 1e-6);

        Assert.Equal([120], Enumerable.Range(0, 200).Where(n => !clock.Rises(n)));
        Assert.All(Enumerable.Range(0, 200), n => Assert.Equal(n / 50.0, clock.Steady[n], 1e-12));
    }

    [Fact]
    public void One_frame_is_a_clock()
    {
        var clock = Clock.FromTimes([12.5], 0.05);

        Assert.Equal([12.5], clock.Delivered);
        Assert.Equal([12.5], clock.Steady);
        Assert.True(clock.IsRegular);
        Assert.True(clock.Rate > 0);
    }

    public static TheoryData<double[]> Unusable => new([], [0, 0], [1, 0.9, 0.8], [0, 0, 0, 0, 1], [0, double.NaN, 1], [double.PositiveInfinity]);

    [Theory]
    [MemberData(nameof(Unusable))]
    public void Times_without_a_rising_middle_are_refused(double[] times) =>
        Assert.Contains("no usable time", Assert.Throws<ArgumentException>(() => Clock.FromTimes(times, 1e-4)).Message);

    [Property(MaxTest = 500, Replay = "(123,457)")]
    public Property Steady_times_always_rise_and_delivered_ones_are_kept(PositiveInt digits, NonEmptyArray<int> steps)
    {
        // Mostly hundredths of a second forwards, at times standing, back or far ahead.
        var unit = Math.Pow(10, -(digits.Get % 4));
        var sum = 0;
        var times = steps.Get.Select(step => (sum += step % 5 == 0 ? step : 1) * unit).ToArray();
        try
        {
            var clock = Clock.FromTimes(times, unit / 2);
            var rises = Enumerable.Range(1, times.Length - 1).All(n => clock.Steady[n] > clock.Steady[n - 1]);
            return (rises && clock.Delivered.SequenceEqual(times)).Label(string.Join(' ', clock.Steady));
        }
        catch (ArgumentException refused)
        {
            return refused.Message.Contains("median", StringComparison.Ordinal).Label(refused.Message);
        }
    }
}
