using System.Globalization;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Takes;

/// <summary>Against the tables of Data/Takes, made by walking through every address of a day.</summary>
public sealed class TimeCodeCheckTests
{
    public static IEnumerable<TheoryDataRow<string>> Rates => TimeCodeRate.All.Select(r => new TheoryDataRow<string>(r.Name));

    [Theory]
    [MemberData(nameof(Rates))]
    public void Frames_have_their_addresses_and_times(string name)
    {
        var (rate, rows) = Table("timecode.csv", name, 0);
        Assert.True(rows.Length > 40);
        Assert.All(rows, row =>
        {
            var frame = long.Parse(row[1], CultureInfo.InvariantCulture);
            Assert.Equal(row[2], new TimeCode(rate, frame).ToString());
            Assert.Equal(frame, TimeCode.Parse(row[2], rate).Frame);

            var seconds = double.Parse(row[4], CultureInfo.InvariantCulture);
            Assert.InRange(rate.Rate.TimeOf(frame), Math.BitDecrement(seconds), Math.BitIncrement(seconds));
        });
    }

    [Theory]
    [MemberData(nameof(Rates))]
    public void Ten_minutes_an_hour_and_a_day_have_their_counts(string name)
    {
        var (rate, rows) = Table("timecode-counts.csv", name, 0);
        var row = Assert.Single(rows);
        var mark = rate.DropFrame ? ';' : ':';

        Assert.Equal(row[1], rate.Nominal.ToString(CultureInfo.InvariantCulture));
        Assert.Equal(row[3], rate.DropFrame ? "yes" : "no");
        Assert.Equal(long.Parse(row[4], CultureInfo.InvariantCulture), TimeCode.Parse($"00:10:00{mark}00", rate).Frame);
        Assert.Equal(long.Parse(row[5], CultureInfo.InvariantCulture), TimeCode.Parse($"01:00:00{mark}00", rate).Frame);
        Assert.Equal(long.Parse(row[6], CultureInfo.InvariantCulture), rate.FramesADay);
        Assert.Equal(double.Parse(row[7], CultureInfo.InvariantCulture), rate.Rate.TimeOf(rate.FramesADay), 1e-9);
    }

    [Fact]
    public void What_is_no_address_is_refused()
    {
        var rows = CheckCsv.Rows("timecode-rejected.csv");
        Assert.Equal(87, rows.Length);
        Assert.All(rows, row =>
        {
            Assert.Null(TimeCode.TryParse(row[1], Named(row[0]), out var problem));
            var words = row[2].Contains("dropped", StringComparison.Ordinal) ? "leaves it out"
                : row[2].Contains("range", StringComparison.Ordinal) ? "out of range" : "no time code";
            Assert.Contains(words, problem, StringComparison.Ordinal);
        });
    }

    [Theory]
    [InlineData("23.976")]
    [InlineData("25")]
    [InlineData("29.97 DF")]
    [InlineData("30")]
    public void Captured_frames_have_their_addresses(string name)
    {
        var (rate, rows) = Table("capture-to-timecode.csv", name, 1);
        Assert.Equal(189, rows.Length);
        Assert.All(rows, row =>
        {
            var fraction = row[0].Split('/').Select(n => long.Parse(n, CultureInfo.InvariantCulture)).ToArray();
            var capture = new FrameRate(fraction[0], fraction.Length > 1 ? fraction[1] : 1);
            var captured = long.Parse(row[2], CultureInfo.InvariantCulture);

            var address = new TimeCode(rate, 0).After(captured, capture);

            Assert.Equal(row[4], address.ToString());
            Assert.Equal(long.Parse(row[3], CultureInfo.InvariantCulture), address.Frame);
        });
    }

    private static (TimeCodeRate Rate, string[][] Rows) Table(string file, string name, int column) =>
        (Named(name), [.. CheckCsv.Rows(file).Where(row => row[column] == name)]);

    private static TimeCodeRate Named(string name) => Assert.Single(TimeCodeRate.All, r => r.Name == name);
}
