using MocapClean.Cli.Formats;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

public sealed class CsvLongTests
{
    private static readonly Quat I = new(0, 1, 0, 0);
    private static readonly Quat J = new(0, 0, 1, 0);

    [Theory]
    [InlineData("joint,frame,time,qw,qx,qy,qz\na,7,0,1,0,0,0\nb,7,0,0,1,0,0\na,8,0.5,0,0,1,0\nb,8,0.5,1,0,0,0\n")]
    [InlineData("joint,frame,time,qw,qx,qy,qz\na,7,0,1,0,0,0\na,8,0.5,0,0,1,0\nb,7,0,0,1,0,0\nb,8,0.5,1,0,0,0\n")]
    [InlineData("joint,frame,time,qw,qx,qy,qz\na,8,0.5,0,0,1,0\nb,7,0,0,1,0,0\nb,8,0.5,1,0,0,0\na,7,0,1,0,0,0\n")]
    [InlineData("qw,time,joint,qz,qy,qx\n1,0,a,0,0,0\n0,0,b,0,0,1\n0,0.5,a,0,1,0\n1,0.5,b,0,0,0\n")]
    public void Rows_may_come_in_any_order(string text)
    {
        var file = Table.Read(text);

        Assert.Equal(["a", "b"], file.Take.Tracks.Select(t => t.Name).Order());
        Assert.Equal([Quat.Identity, J], file.Samples("a"));
        Assert.Equal([I, Quat.Identity], file.Samples("b"));
        Assert.Equal([0, 0.5], file.Take.Clock.Delivered);
        Assert.Equal(Table.Bytes(text), Table.Write(file, file.Take));
    }

    [Fact]
    public void A_row_that_is_not_there_is_a_missing_sample_and_none_is_put_in()
    {
        var text = "joint,frame,qw,qx,qy,qz\na,0,1,0,0,0\nb,0,1,0,0,0\nb,1,1,0,0,0\na,2,1,0,0,0\nb,2,,,,\n";
        var file = Table.Read(text, new ReadSettings { Rate = 10 });

        Assert.Equal([Quat.Identity, Quat.Missing, Quat.Identity], file.Samples("a"));
        Assert.Equal([Quat.Identity, Quat.Identity, Quat.Missing], file.Samples("b"));
        Assert.Equal(
            text.Replace("b,2,,,,", "b,2,0.00000000000000,1.00000000000000,0.00000000000000,0.00000000000000", StringComparison.Ordinal),
            Table.WriteText(file, file.Take.With(0, 1, I).With(1, 2, I)));
    }

    [Fact]
    public void Numbers_left_out_of_the_frame_column_are_lost_time()
    {
        var rows = new[] { 10, 11, 12, 15, 16 }.Select(n => $"a,{n},1,0,0,0\n");
        var file = Table.Read("joint,frame,qw,qx,qy,qz\n" + string.Concat(rows), new ReadSettings { Rate = 10 });

        Assert.Equal([0, 0.1, 0.2, 0.5, 0.6], file.Take.Clock.Delivered);
        Assert.Equal(10, file.Take.Clock.Rate, 1e-12);
        Assert.False(file.Take.Clock.IsRegular);
    }

    [Fact]
    public void A_carried_column_gives_the_text_of_the_first_row_of_each_frame()
    {
        var file = Table.Read("joint,time,qw,qx,qy,qz,note\na,0,1,0,0,0,x\nb,0,1,0,0,0,y\na,1,1,0,0,0,z\n");

        Assert.Equal(["x", "z"], file.Column("note"));
    }

    [Fact]
    public void A_joint_may_be_called_like_a_comment()
    {
        var file = Table.Read("joint,time,qw,qx,qy,qz\n#1,0,1,0,0,0\n#2,0,1,0,0,0\n#1,1,1,0,0,0\n#2,1,0,1,0,0\n");

        Assert.Equal(["#1", "#2"], file.Take.Tracks.Select(t => t.Name));
        Assert.Equal([Quat.Identity, I], file.Samples("#2"));
    }

    [Fact]
    public void A_wide_layout_asked_for_does_not_read_a_long_table() => Assert.Contains(
        "this file would fit layout: long, components: [qw, qx, qy, qz]",
        Table.Refusal("joint,time,qw,qx,qy,qz\na,0,1,0,0,0\na,1,1,0,0,0\n", new ReadSettings { CsvLayout = "wide" }),
        StringComparison.Ordinal);
}
