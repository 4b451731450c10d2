using MocapClean.Cli.Formats;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

public sealed class CsvReadingTests
{
    private static readonly Quat First = new(0.5, -0.25, 0.125, 1);

    [Theory]
    [InlineData("time,a.qw,a.qx,a.qy,a.qz\n0,0.5,-0.25,0.125,1\n0.5,1,0,0,0\n")]
    [InlineData("time;a.qw;a.qx;a.qy;a.qz\n0;0.5;-0.25;0.125;1\n0.5;1;0;0;0\n")]
    [InlineData("time\ta.qw\ta.qx\ta.qy\ta.qz\n0\t0.5\t-0.25\t0.125\t1\n0.5\t1\t0\t0\t0\n")]
    [InlineData("time|a.qw|a.qx|a.qy|a.qz\n0|0.5|-0.25|0.125|1\n0.5|1|0|0|0\n")]
    [InlineData("time a.qw a.qx a.qy a.qz\n0 0.5 -0.25 0.125 1\n0.5 1 0 0 0\n")]
    [InlineData("sep=;\ntime;a.qw;a.qx;a.qy;a.qz\n0;0.5;-0.25;0.125;1\n0.5;1;0;0;0\n")]
    [InlineData("time;a.qw;a.qx;a.qy;a.qz\n0;0,5;-0,25;0,125;1\n0,5;1;0;0;0\n")]
    [InlineData("\uFEFFtime,a.qw,a.qx,a.qy,a.qz\r\n0,0.5,-0.25,0.125,1\r\n0.5,1,0,0,0")]
    [InlineData("a.qz,a.qx,time,a.qw,note,a.qy\n1,-0.25,0,0.5,hm,0.125\n0,0,0.5,1,,0\n")]
    [InlineData("Recorded 5\" left of the door\n\ntime,a.qw,a.qx,a.qy,a.qz\n0,0.5,-0.25,0.125,1\n0.5,1,0,0,0\n")]
    [InlineData("Recorded, by night\nCount;2\ntime;a.qw;a.qx;a.qy;a.qz\n0;0.5;-0.25;0.125;1\n0.5;1;0;0;0\n")]
    [InlineData("# day 3\ntime,a.qw,a.qx,a.qy,a.qz\n#pause\n0,0.5,-0.25,0.125,1\n\n0.5,1,0,0,0\n\n")]
    [InlineData("# time,a.qw,a.qx,a.qy,a.qz\n0,0.5,-0.25,0.125,1\n0.5,1,0,0,0\n")]
    [InlineData("time, a.qw , a.qx, a.qy, a.qz\n0, 0.5 ,-0.25,\t0.125,1\n0.5,1,0,0,0\n")]
    [InlineData("\"time\",\"a.qw\",\"a.qx\",\"a.qy\",\"a.qz\"\n\"0\",\"0.5\",\"-0.25\",\" 0.125\",\"1\"\n\"0.5\",\"1\",0,0,0\n")]
    [InlineData("\"time\",\"a.qw\",\"a.qx\",\"a.qy\",\"a.qz\"\n\"0\",\"0,5\",\"-0,25\",\"0,125\",\"1\"\n\"0,5\",\"1\",0,0,0\n")]
    [InlineData("time,a.qw,a.qx,a.qy,a.qz\n0,5e-1,-2.5E-1,+.125,1.\n.5,1,0,-0,0\n")]
    [InlineData("time,a.qw,a.qx,a.qy,a.qz\r0,0.5,-0.25,0.125,1\r0.5,1,0,0,0\r")]
    [InlineData("time,a.qw,a.qx,a.qy,a.qz\r\n0,0.5,-0.25,0.125,1\n0.5,1,0,0,0\r\n,,,,\r\n  \r\n")]
    [InlineData("Time,a.QW,a.QX,a.QY,a.QZ\n0,0.5,-0.25,0.125,1\n0.5,1,0,0,0\n")]
    [InlineData("joint,time,qw,qx,qy,qz\na,0,0.5,-0.25,0.125,1\na,0.5,1,0,0,0\n")]
    public void One_take_in_many_spellings(string text)
    {
        var file = Table.Read(text);

        var track = Assert.Single(file.Take.Tracks);
        Assert.Equal("a", track.Name);
        Assert.Equal([First, Quat.Identity], track.Samples);
        Assert.Equal([0, 0.5], file.Take.Clock.Delivered);
        Assert.Equal(Table.Bytes(text), Table.Write(file, file.Take));
    }

    [Fact]
    public void Samples_keep_their_length_and_are_the_delivered_ones()
    {
        var file = Table.Read(Table.Header + "\n0,2,0,0,0\n0.1,0,0,0,0\n");

        var track = Assert.Single(file.Take.Tracks);
        Assert.Equal([new Quat(2, 0, 0, 0), default], track.Samples);
        Assert.True(track.Samples.Equals(track.Delivered));
        Assert.All(track.States, s => Assert.Equal(SampleState.Good, s));
        Assert.Equal(OrientationSpace.World, file.Take.Space);
        Assert.Equal("t.csv", file.Take.Name);
    }

    [Theory]
    [InlineData("")]
    [InlineData("  ")]
    [InlineData("\"\"")]
    [InlineData("NaN")]
    [InlineData("nan")]
    [InlineData("-nan(ind)")]
    [InlineData("inf")]
    [InlineData("-Infinity")]
    [InlineData("1e400")]
    [InlineData("null")]
    [InlineData("None")]
    [InlineData("N/A")]
    [InlineData("1.#QNAN")]
    [InlineData("-")]
    public void A_cell_without_a_finite_number_is_a_missing_sample(string cell)
    {
        var text = $"{Table.Header}\n0,1,0,0,0\n0.1,1,0,{cell},0\n0.2,{cell},{cell},{cell},{cell}\n0.3,1,0,0,0\n";
        var file = Table.Read(text);

        Assert.Equal([Quat.Identity, Quat.Missing, Quat.Missing, Quat.Identity], file.Samples());
        Assert.Equal(Table.Bytes(text), Table.Write(file, file.Take));
    }

    [Fact]
    public void A_spreadsheets_error_in_the_first_cell_is_a_missing_sample_and_no_comment()
    {
        var file = Table.Read("a.qw,a.qx,a.qy,a.qz\n1,0,0,0\n#N/A,#N/A,#N/A,#N/A\n1,0,0,0\n", new ReadSettings { Rate = 10 });

        Assert.Equal([Quat.Identity, Quat.Missing, Quat.Identity], file.Samples());
    }

    [Fact]
    public void Comments_may_stand_between_rows_that_start_with_a_component()
    {
        var file = Table.Read("a.qw,a.qx,a.qy,a.qz\n1,0,0,0\n# a \"pause\"\n1,0,0,0\n", new ReadSettings { Rate = 10 });

        Assert.Equal(2, file.Take.Length);
    }

    [Fact]
    public void Joints_stand_in_the_order_of_their_first_columns_under_any_name()
    {
        var text = "time,b ü/(1).qx,a.b.qw,b ü/(1).qw,a.b.qx,a.b.qy,b ü/(1).qy,b ü/(1).qz,a.b.qz\n0,2,10,1,20,30,3,4,40\n1,2,10,1,20,30,3,4,40\n";
        var file = Table.Read(text);

        Assert.Equal(["b ü/(1)", "a.b"], file.Take.Tracks.Select(t => t.Name));
        Assert.Equal(new Quat(1, 2, 3, 4), file.Take.Tracks[0].Samples[0]);
        Assert.Equal(new Quat(10, 20, 30, 40), file.Take.Tracks[1].Samples[0]);
    }

    [Theory]
    [InlineData("qW_{joint}", "q{component}_{joint}", "W X Y Z")]
    [InlineData("{joint} rotation W", "{joint} rotation {component}", "W X Y Z")]
    [InlineData("rot({joint})[3]", "rot({joint})[{component}]", "3 0 1 2")]
    [InlineData("{joint}real", "{joint}{component}", "real i j k")]
    public void Columns_are_named_by_a_pattern(string expectedName, string pattern, string components)
    {
        var names = components.Split(' ');
        var columns = names.Select(c => pattern.Replace("{component}", c, StringComparison.Ordinal));
        var header = string.Join(',', columns.Concat(["t"])).Replace("{joint}", "Hand", StringComparison.Ordinal);
        var settings = new ReadSettings { CsvJointColumns = pattern, CsvComponents = [.. names], CsvTime = "t" };
        var file = Table.Read($"{header}\n1,2,3,4,0\n1,2,3,4,1\n", settings);

        Assert.Contains(expectedName.Replace("{joint}", "Hand", StringComparison.Ordinal), header, StringComparison.Ordinal);
        Assert.Equal("Hand", Assert.Single(file.Take.Tracks).Name);
        Assert.Equal(new Quat(1, 2, 3, 4), file.Samples("Hand")[0]);
    }

    [Fact]
    public void A_pattern_without_joint_takes_the_files_name()
    {
        var file = Table.Read("time,qw,qx,qy,qz\n0,1,0,0,0\n1,1,0,0,0\n", new ReadSettings { CsvJointColumns = "{component}" });

        Assert.Equal("t", Assert.Single(file.Take.Tracks).Name);
    }

    [Fact]
    public void Without_a_time_column_the_rate_ticks()
    {
        var file = Table.Read("a.qw,a.qx,a.qy,a.qz\n1,0,0,0\n,,,\n1,0,0,0\n", new ReadSettings { Rate = 50 });

        Assert.Equal([0, 0.02, 0.04], file.Take.Clock.Delivered);
        Assert.Equal([Quat.Identity, Quat.Missing, Quat.Identity], file.Samples());
    }

    [Fact]
    public void A_column_of_times_stands_before_the_rate()
    {
        var file = Table.Read(Table.Header + "\n0,1,0,0,0\n0.25,1,0,0,0\n", new ReadSettings { Rate = 50 });

        Assert.Equal(4, file.Take.Clock.Rate);
    }

    [Fact]
    public void Carried_columns_give_their_texts()
    {
        var file = Table.Read("time,a.qw,a.qx,a.qy,a.qz, note \n0,1,0,0,0,\"say \"\"go\"\"\"\n0.1,1,0,0,0, x \n");

        Assert.Equal(["say \"go\"", " x "], file.Column("note"));
        Assert.Equal(["0", "0.1"], file.Column("time"));
        Assert.Null(file.Column("nothing"));
    }

    [Theory]
    [InlineData("0.99379618", "0.1", 1e-8)]
    [InlineData("0.9938", "0.12345678", 1e-4)]
    [InlineData("9.9379618e-01", "0.1", 1e-8)]
    [InlineData("1", "0", 1e-9)]
    public void Rounding_is_that_of_the_digits_of_large_components(string large, string small, double radians)
    {
        var file = Table.Read($"{Table.Header}\n0,{large},{small},0,0\n1,{large},{small},0,0\n");

        Assert.Equal(radians, file.Take.TextRounding, radians * 1e-9);
    }

    [Fact]
    public void Times_of_six_significant_digits_are_a_steady_clock()
    {
        var rows = Enumerable.Range(0, 3000).Select(n => string.Create(null, $"{n / 120.0:G6},1,0,0,0\n"));
        var file = Table.Read(Table.Header + "\n" + string.Concat(rows));

        Assert.Equal(120, file.Take.Clock.Rate, 1e-9);
        Assert.True(file.Take.Clock.IsRegular);
    }
}
