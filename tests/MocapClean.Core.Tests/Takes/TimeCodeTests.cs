using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Takes;

public sealed class TimeCodeTests
{
    private static readonly TimeCodeRate Film = TimeCodeRate.Find(24, dropFrame: false)!;
    private static readonly TimeCodeRate Drop = TimeCodeRate.Find(29.97, dropFrame: true)!;

    [Property(MaxTest = 1000, Replay = "(123,457)")]
    public Property An_address_is_read_as_the_frame_that_wrote_it(int frame) => TimeCodeRate.All
        .All(rate => TimeCode.Parse(new TimeCode(rate, frame * 997L).ToString(), rate) == new TimeCode(rate, frame * 997L)).ToProperty();

    [Property(MaxTest = 500, Replay = "(123,457)")]
    public Property Captured_frames_never_run_back_and_agree_with_exact_fractions(int captured, PositiveInt numerator)
    {
        var capture = new FrameRate(numerator.Get, 1001);
        var (here, next) = (Drop.Rate, new TimeCode(Drop, 1_000_000));
        var exact = (decimal)captured * 1001 * here.Numerator / (numerator.Get * (decimal)here.Denominator);
        var isWhole = Math.Abs(exact - Math.Round(exact)) < 1e-15m;
        var expected = next.Plus((long)(isWhole ? Math.Round(exact) : Math.Floor(exact)));
        return (next.After(captured, capture) == expected).Label($"{next.After(captured, capture)} for {expected}");
    }

    [Fact]
    public void Midnight_is_passed_both_ways()
    {
        Assert.Equal("00:00:00:00", TimeCode.Parse("23:59:59:23", Film).Plus(1).ToString());
        Assert.Equal("23:59:59:23", TimeCode.Parse("00:00:00:00", Film).Plus(-1).ToString());
        Assert.Equal("23:59:59;29", TimeCode.Parse("00:00:00;00", Drop).After(-1, new FrameRate(120, 1)).ToString());
    }

    [Theory]
    [InlineData("01:00:00;00", "23.976")]
    [InlineData("01:00:00;00", "29.97")]
    [InlineData("01:00:00:00", "29.97 DF")]
    public void The_mark_of_the_other_counting_is_refused(string text, string rate)
    {
        var refused = Assert.Throws<FormatException>(() => TimeCode.Parse(text, TimeCodeRate.All.Single(r => r.Name == rate)));
        Assert.Contains("drop-frame", refused.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(23.976, false, "23.976")]
    [InlineData(23.98, false, "23.976")]
    [InlineData(24, false, "24")]
    [InlineData(29.97, true, "29.97 DF")]
    [InlineData(30, true, null)]
    [InlineData(59.94, false, "59.94")]
    [InlineData(120, false, null)]
    public void A_number_of_hertz_finds_its_rate(double hertz, bool dropFrame, string? name) =>
        Assert.Equal(name, TimeCodeRate.Find(hertz, dropFrame)?.Name);

    [Fact]
    public void The_slate_counts_lost_frames_and_frames_before_it()
    {
        var frames = Enumerable.Range(0, 240).Where(n => n is < 60 or >= 120).ToArray();
        var clock = Clock.FromTimes([.. frames.Select(n => Math.Round(n / 120.0, 5))], 5e-6);
        var slate = new Slate(24, TimeCode.Parse("10:00:00:00", Film));

        Assert.Equal("10:00:00:00", slate.At(clock, 24).ToString());
        Assert.Equal("10:00:00:00", slate.At(clock, 28).ToString());
        Assert.Equal("10:00:00:01", slate.At(clock, 29).ToString());
        Assert.Equal("09:59:59:23", slate.At(clock, 23).ToString());
        Assert.Equal("09:59:59:19", slate.At(clock, 0).ToString());
        Assert.Equal("10:00:00:19", slate.At(clock, 60).ToString());
    }

    [Fact]
    public void Without_an_exact_rate_the_times_are_used_within_their_rounding()
    {
        double[] times = [.. Enumerable.Range(0, 1000).Select(n => Math.Round((n + (0.2 * Math.Sin(n * 1.7))) / 71.3, 3))];
        var clock = Clock.FromTimes(times, 0.0005);
        Assert.Null(clock.ExactRate);

        var address = new Slate(0, TimeCode.Parse("00:00:00:00", Film)).At(clock, 999);

        Assert.Equal((long)Math.Floor((times[999] + 0.0005) * 24), address.Frame);
    }

    [Theory]
    [InlineData(119.88, "120000/1001")]
    [InlineData(59.94, "60000/1001")]
    [InlineData(23.976, "24000/1001")]
    [InlineData(29.97003, "30000/1001")]
    [InlineData(120, "120")]
    [InlineData(142.857, "142857/1000")]
    [InlineData(59.5, "119/2")]
    public void Hertz_mean_a_fraction(double hertz, string fraction) => Assert.Equal(fraction, FrameRate.FromHertz(hertz).ToString());

    [Theory]
    [InlineData(0)]
    [InlineData(-24)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void Hertz_that_are_no_rate_are_refused(double hertz) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => FrameRate.FromHertz(hertz));
}
