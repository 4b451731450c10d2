using System.Text;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

public sealed class CsvWritingTests
{
    private static readonly Quat Other = new(0.5, -0.5, 0.5, -0.5);

    [Theory]
    [InlineData(
        "x\r\n# c\r\ntime,p,a.qz,a.qw,b.qw,b.qx,b.qy,b.qz,a.qx,a.qy\r\n0,9,0,1,1,0,0,0,0,0\n\n0.1,\"9\",0,1,1,0,0,0,0,0\r\n",
        "x\r\n# c\r\ntime,p,a.qz,a.qw,b.qw,b.qx,b.qy,b.qz,a.qx,a.qy\r\n0,9,0,1,1,0,0,0,0,0\n\n"
        + "0.1,\"9\",-0.50000000000000,0.50000000000000,1,0,0,0,-0.50000000000000,0.50000000000000\r\n")]
    [InlineData(
        Table.Header + "\n0,1,0,0,0\n0.1, 1 ,\"0\",\t0,\" 0 \"",
        Table.Header + "\n0,1,0,0,0\n0.1, 0.50000000000000 ,\"-0.50000000000000\",\t0.50000000000000,\" -0.50000000000000 \"")]
    [InlineData(
        Table.Header + "\n0,1,0,0,0\n0.1,,\"\", ,nan\n",
        Table.Header + "\n0,1,0,0,0\n0.1,0.50000000000000,\"-0.50000000000000\", 0.50000000000000,-0.50000000000000\n")]
    [InlineData(
        "time;a.qw;a.qx;a.qy;a.qz\n0;1,0;0;0;0\n0,1;1;0;0;\n",
        "time;a.qw;a.qx;a.qy;a.qz\n0;1,0;0;0;0\n0,1;0,50000000000000;-0,50000000000000;0,50000000000000;-0,50000000000000\n")]
    [InlineData(
        Table.Header + "\n0,\"1,0\",0,0,0\n\"0,1\",\"1,0\",0,0,\n",
        Table.Header + "\n0,\"1,0\",0,0,0\n\"0,1\",\"0,50000000000000\",\"-0,50000000000000\",\"0,50000000000000\",\"-0,50000000000000\"\n")]
    [InlineData(
        "frame,joint,time,qw,qx,qy,qz\n1,b,0.1,1,0,0,0\n1,a,0.1,1,0,0,0\n0,b,0,1,0,0,0\n0,a,0,1,0,0,0\n",
        "frame,joint,time,qw,qx,qy,qz\n1,b,0.1,1,0,0,0\n1,a,0.1,0.50000000000000,-0.50000000000000,0.50000000000000,-0.50000000000000\n"
        + "0,b,0,1,0,0,0\n0,a,0,1,0,0,0\n")]
    public void A_changed_sample_changes_its_four_fields_only(string delivered, string written)
    {
        var file = Table.Read(delivered);
        var joint = file.Take.Tracks.Select(t => t.Name).ToList().IndexOf("a");

        Assert.Equal(written, Table.WriteText(file, file.Take.With(joint, 1, Other)));
    }

    [Fact]
    public void A_renormalised_sample_is_written_though_it_is_the_delivered_direction()
    {
        var file = Table.Read(Table.Header + "\n0,2,0,0,0\n0.1,3,0,0,0\n");
        var unit = file.Take.Tracks[0] with
        {
            Delivered = [Quat.Identity, Quat.Identity],
            Samples = [Quat.Identity, Quat.Identity],
            Renormalised = [1],
        };

        Assert.Equal(
            Table.Header + "\n0,2,0,0,0\n0.1,1.00000000000000,0.00000000000000,0.00000000000000,0.00000000000000\n",
            Table.WriteText(file, file.Take with { Tracks = [unit] }));
    }

    [Fact]
    public void A_sample_that_differs_in_the_sign_of_zero_only_is_written()
    {
        var file = Table.Read(Table.Header + "\n0,1,0,0,0\n");

        Assert.NotEqual(
            Table.Header + "\n0,1,0,0,0\n", Table.WriteText(file, file.Take.With(0, 0, new Quat(1, 0, 0, -0.0))));
    }

    [Fact]
    public void A_missing_sample_that_stays_missing_keeps_its_bytes()
    {
        var text = Table.Header + "\n0,1,0,0,0\n0.1,0,0,0,0\n0.2,1,,0,0\n";
        var file = Table.Read(text);
        var track = file.Take.Tracks[0] with
        {
            Delivered = [Quat.Identity, Quat.Missing, Quat.Missing],
            Samples = [Quat.Identity, Quat.Missing, new Quat(double.NaN, 0, 0, 0)],
            States = [SampleState.Good, SampleState.Missing, SampleState.Missing],
        };

        Assert.Equal(text, Table.WriteText(file, file.Take with { Tracks = [track] }));
    }

    [Fact]
    public void A_delivered_sample_is_never_deleted()
    {
        var file = Table.Read(Table.Header + "\n0,1,0,0,0\n");

        Assert.Throws<ArgumentException>(() => Table.Write(file, file.Take.With(0, 0, Quat.Missing)));
    }

    [Fact]
    public void A_take_of_another_shape_is_refused()
    {
        var file = Table.Read(Table.Header + "\n0,1,0,0,0\n");
        var other = Table.Read(Table.Header + "\n0,1,0,0,0\n1,1,0,0,0\n");

        Assert.Throws<ArgumentException>(() => Table.Write(file, other.Take));
    }

    [Fact]
    public void Bytes_that_are_no_text_pass_through()
    {
        byte[] delivered = [.. Encoding.UTF8.Preamble, .. Table.Bytes("note,time,a.qw,a.qx,a.qy,a.qz\n"), 0xff, 0xc3, .. Table.Bytes(",0,1,0,0,0")];
        byte[] written =
        [
            .. delivered[..^7],
            .. Table.Bytes("0.50000000000000,-0.50000000000000,0.50000000000000,-0.50000000000000"),
        ];
        var file = Table.Read(delivered);

        Assert.Equal(delivered, Table.Write(file, file.Take));
        Assert.Equal(written, Table.Write(file, file.Take.With(0, 0, Other)));
    }

    [Fact]
    public void Long_carried_text_between_changes_is_copied_whole()
    {
        var carried = new string('x', 700_000);
        var text = $"time,a.qw,a.qx,a.qy,a.qz,note\n0,1,0,0,0,{carried}\n1,1,0,0,0,{carried}\n2,1,0,0,0,y\n";
        var file = Table.Read(text);
        var written = Table.WriteText(file, file.Take.With(0, 0, Other).With(0, 2, Other));

        const string Fields = "0.50000000000000,-0.50000000000000,0.50000000000000,-0.50000000000000";
        Assert.Equal($"time,a.qw,a.qx,a.qy,a.qz,note\n0,{Fields},{carried}\n1,1,0,0,0,{carried}\n2,{Fields},y\n", written);
    }
}
