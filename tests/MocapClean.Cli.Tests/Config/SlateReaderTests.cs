using MocapClean.Cli.Tests.Support;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Sources;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class SlateReaderTests : IDisposable
{
    private static readonly string[] Takes = ["day1/fight.csv", "day1/run.bvh", "day2/fight.csv"];
    private readonly TempFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void A_slate_names_its_take_by_path_or_by_file_name()
    {
        var slates = Read("take,frame,timecode\nrun,12,01:00:00:00\nday1/fight.csv,0,02:00:00:00\n\n# note\nday2/fight,1,03:00:00:24\n");
        Assert.Equal((12, "01:00:00:00"), (slates.For("day1/run.bvh")!.Slate.Frame, slates.For("day1/run.bvh")!.Slate.Address.ToString()));
        Assert.Equal("02:00:00:00", slates.For("day1/fight.csv")!.Slate.Address.ToString());
        Assert.Equal("03:00:00:24", slates.For("day2/fight.csv")!.Slate.Address.ToString());
        Assert.Null(slates.For("other.csv"));
    }

    [Fact]
    public void Frames_count_from_the_first_frame_that_people_read()
    {
        var slate = Read("timecode;take;frame;action_first;action_last\n01:00:00:00;run;1001;1010;1200\n", "{folder: out, first-frame: 1001}").For("day1/run.bvh")!;
        Assert.Equal((0, 9, 199), (slate.Slate.Frame, slate.ActionFirst, slate.ActionLast));
    }

    [Fact]
    public void A_slate_of_a_take_that_is_not_there_is_noted() =>
        Assert.Equal("slates.csv:2: no take 'walk'", Assert.Single(Read("take,frame,timecode\nwalk,0,01:00:00:00\n").Notes).Replace(folder.Path + Path.DirectorySeparatorChar, ""));

    [Fact]
    public void All_rows_that_make_no_sense_are_told_at_once() =>
        Assert.Equal(
            """
            slates.csv:2:1: 'fight' may be day1/fight.csv or day2/fight.csv; give more of the path
            slates.csv:3:1: frame takes a frame number from 0, not 'x'
            slates.csv:4:1: '01:00:00:25' is out of range: the last address of a day is 23:59:59:24
            slates.csv:5:1: the action of 'run' ends before it starts
            slates.csv:7:1: a second slate for 'day1/run.bvh'; the first is in line 6
            slates.csv:8:1: the take is missing
            """.ReplaceLineEndings("\n"),
            Problem(
                """
                take,frame,timecode,action_first,action_last
                fight,0,01:00:00:00,,
                run,x,01:00:00:00,,
                run,0,01:00:00:25,,
                run,0,01:00:00:00,20,10
                run,0,01:00:00:00,,
                run,5,01:00:00:00,,
                ,5,01:00:00:00,,
                """));

    [Theory]
    [InlineData("", "slates.csv:1:1: no column take, frame or timecode; slates need take, frame and timecode")]
    [InlineData("take,frame\n", "slates.csv:1:1: no column timecode; slates need take, frame and timecode")]
    [InlineData("take,frame,timecode,action_frist\n", "slates.csv:1:1: unknown column 'action_frist'; did you mean 'action_first'?")]
    public void The_columns_must_be_there(string text, string expected) => Assert.Equal(expected, Problem(text));

    [Theory]
    [InlineData("take,frame,timecode\nrun,1\n")]
    [InlineData("take,frame,timecode\n\"run,1,01:00:00:00\n")]
    public void A_ragged_or_open_row_is_one_problem_with_its_line(string text) => Assert.StartsWith("slates.csv:2:1: ", Problem(text), StringComparison.Ordinal);

    [Fact]
    public void A_file_that_is_not_there_is_told()
    {
        var thrown = Assert.Throws<ConfigException>(() => SlateReader.Read(Config(), Takes));
        Assert.Equal($"{Path.Combine(folder.Path, "slates.csv")}: no such file", thrown.Message);
    }

    [Fact]
    public void A_config_may_do_without_slates() => Assert.Same(SlateTable.Empty, SlateReader.Read(Reading.Config(), Takes));

    private SessionConfig Config(string output = "{folder: out}") => ConfigReader.Parse(
        $"ingest: {{takes: x}}\noutput: {output}\ntime-code: {{rate: 25, slates: slates.csv}}", Path.Combine(folder.Path, "day.yaml"));

    private SlateTable Read(string text, string output = "{folder: out}")
    {
        folder.Put("slates.csv", text);
        return SlateReader.Read(Config(output), Takes);
    }

    private string Problem(string text) =>
        Assert.Throws<ConfigException>(() => Read(text)).Message.Replace(folder.Path + Path.DirectorySeparatorChar, "");
}
