using System.Text;
using MocapClean.Cli.Formats;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

public sealed class CsvRefusalTests
{
    private const string Good = Table.Header + "\n0,1,0,0,0\n0.1,1,0,0,0\n";

    [Theory]
    [InlineData("", "t.csv: found an empty file, expected CSV text in UTF-8")]
    [InlineData("\uFEFF", "t.csv: found an empty file, expected CSV text in UTF-8")]
    [InlineData(
        Table.Header + "\n0,1,\0,0,0\n", "t.csv: found binary data (a NUL byte at offset 29), expected CSV text in UTF-8")]
    [InlineData("PK\u0003\u0004....", "t.csv: found a zip archive (a spreadsheet workbook is one, too), expected CSV text in UTF-8")]
    [InlineData(Table.Header + "\n", "t.csv: found a header without rows, expected at least one frame")]
    [InlineData(
        Good + "0.2,1,0,0\n0.3,1,0,0,0\n", "t.csv, row 3 (line 4): found 4 fields, expected 5 fields as in the header")]
    [InlineData(
        Good + "0.2,1,0,0,0,\n", "t.csv, row 3 (line 4): found 6 fields, expected 5 fields as in the header")]
    [InlineData(
        Good + "0.2,1", "t.csv, row 3 (line 4): found 2 fields, where the file breaks off, expected 5 fields as in the header")]
    [InlineData(
        Table.Header + "\n0,0,1,0,0,0,0,0,0\n",
        "t.csv, row 1 (line 2): found 9 fields, "
        + "expected 5 fields as in the header (a decimal comma splits a number where commas part the fields)")]
    [InlineData(
        Table.Header + "\n0,\"two\nlines of text that go on and on and on and on and on and on and on\",0,0,0\n",
        "t.csv, row 1 (line 2), column 'a.qw': "
        + "found 'two lines of text that go on and on and on and on and on and...', expected a number or an empty cell")]
    [InlineData(
        "#c\r\n\r\n" + Good + "0.2,1,0,abc,0\n",
        "t.csv, row 3 (line 6), column 'a.qy': found 'abc', expected a number or an empty cell")]
    [InlineData(
        Table.Header + "\n0,0.1,0,0,0\n0.1,\"0,25\",0,0,0\n",
        "t.csv, row 2 (line 3), column 'a.qw': found '0,25', expected a number or an empty cell")]
    [InlineData(
        "time;a.qw;a.qx;a.qy;a.qz\n0;0,1;0;0;0\n0,1;0.25;0;0;0\n",
        "t.csv, row 2 (line 3), column 'a.qw': found '0.25', expected a number with a decimal comma, as before, or an empty cell")]
    [InlineData(
        Table.Header + "\n0,1,0,0,0\n,1,0,0,0\n", "t.csv, row 2 (line 3), column 'time': found an empty cell, expected a time in seconds")]
    [InlineData(
        Table.Header + "\n0,1,0,0,0\ninf,1,0,0,0\n", "t.csv, row 2 (line 3), column 'time': found 'inf', expected a time in seconds")]
    [InlineData(
        Table.Header + "\n00:01,1,0,0,0\n", "t.csv, row 1 (line 2), column 'time': found '00:01', expected a time in seconds")]
    [InlineData(
        Table.Header + "\n1,1,0,0,0\n1,1,0,0,0\n1,1,0,0,0\n",
        "t.csv, column 'time': found times that mostly stand still, expected times in seconds that rise from frame to frame")]
    [InlineData(
        Table.Header + "\n3,1,0,0,0\n2,1,0,0,0\n1,1,0,0,0\n",
        "t.csv, column 'time': found times that mostly run back, expected times in seconds that rise from frame to frame")]
    [InlineData(
        "a.qw,a.qx,a.qy,a.qz\n1,0,0,0\n",
        "t.csv, header (line 1): found no column 'time' for the time, expected one, or frames per second as ingest.rate")]
    [InlineData(
        "x\nTime [s],a.qw,a.qx,a.qy,a.qz\n0,1,0,0,0\n",
        "t.csv, header (line 2): found no column 'time' for the time, "
        + "expected one, or frames per second as ingest.rate; column 'Time [s]' may be meant (ingest.csv.time)")]
    [InlineData(
        "time,a.qw,a.qx,a.qy,a.qz,a.qx\n0,1,0,0,0,0\n",
        "t.csv, header (line 1): found columns 3 and 6 both named 'a.qx', expected that name once")]
    [InlineData(
        "time,a.qw,a.qx,a.qy,a.qz,time\n0,1,0,0,0,0\n",
        "t.csv, header (line 1): found columns 1 and 6 both named 'time', expected that name once")]
    [InlineData(
        "time,a.qw,a.qx,a.qy,a.qz,b.qw,b.qx,b.qy\n0,1,0,0,0,1,0,0\n",
        "t.csv, header (line 1): found no column 'b.qz', expected all four components of joint 'b' (qw, qx, qy, qz)")]
    [InlineData(
        "time,x,y\n0,1,2\n",
        "t.csv: found no column named like '{joint}.{component}' with qw, qx, qy, qz, expected a header with such columns "
        + "(the first line is 'time,x,y')")]
    [InlineData(
        "time,Hips_QX,Hips_QY,Hips_QZ,Hips_QW\n0,0,0,0,1\n0.1,0,0,0,1\n",
        "t.csv: found no column named like '{joint}.{component}' with qw, qx, qy, qz, expected those; "
        + "this file would fit layout: wide, joint-columns: \"{joint}_{component}\", components: [QW, QX, QY, QZ]")]
    [InlineData(
        Table.Header + "\n0,1,0,0,0\n0.1,\"1,0,0,0\n0.2,1,0,0,0\n",
        "t.csv, row 2 (line 3): found a quoted field that is never closed, expected quotes around whole fields, doubled inside (RFC 4180)")]
    [InlineData(
        Table.Header + "\n0,1,0,0,0\n0.1,1\"x,0,0,0\n0.2,1,0,0,0\n",
        "t.csv, row 2 (line 3): found a quote in the middle of a field, expected quotes around whole fields, doubled inside (RFC 4180)")]
    public void Says_in_one_line_what_is_wrong(string text, string message) => Assert.Equal(message, Table.Refusal(text));

    [Theory]
    [InlineData(
        "joint,frame,qw,qx,qy,qz\na,0,1,0,0,0\nb,0,1,0,0,0\na,0,1,0,0,0\n",
        "t.csv: found joint 'a' in rows 1 and 3 of one frame, expected one row for a joint and frame")]
    [InlineData(
        "joint,frame,qw,qx,qy,qz\na,0,1,0,0,0\n,0,1,0,0,0\n",
        "t.csv, row 2 (line 3), column 'joint': found an empty cell, expected the name of a joint")]
    [InlineData(
        "joint,frame,qw,qx,qy,qz\na,0,1,0,0,0\na,one,1,0,0,0\n",
        "t.csv, row 2 (line 3), column 'frame': found 'one', expected the number of a frame")]
    public void Says_in_one_line_what_is_wrong_with_a_long_table(string text, string message) =>
        Assert.Equal(message, Table.Refusal(text, new ReadSettings { Rate = 100 }));

    [Fact]
    public void A_long_table_needs_a_time_or_a_rate() => Assert.Equal(
        "t.csv, header (line 1): found no column 'time' for the time, expected one, or frames per second as ingest.rate",
        Table.Refusal("joint,frame,qw,qx,qy,qz\na,0,1,0,0,0\na,1,1,0,0,0\n"));

    [Fact]
    public void The_layout_asked_for_must_be_there() => Assert.Equal(
        "t.csv: found no header with columns joint, frame or time, qw, qx, qy, qz, expected those; "
        + "this file would fit layout: wide, joint-columns: \"{joint}.{component}\", components: [qw, qx, qy, qz]",
        Table.Refusal(Good, new ReadSettings { CsvLayout = "long" }));

    [Fact]
    public void A_sparse_long_table_is_refused_before_it_takes_memory()
    {
        var rows = Enumerable.Range(0, 2000).Select(n => $"j{n},{n},1,0,0,0\n");

        Assert.Equal(
            "t.csv: found 2000 rows for 2000 joints and 2000 frames, expected a row for most joints in most frames",
            Table.Refusal("joint,frame,qw,qx,qy,qz\n" + string.Concat(rows), new ReadSettings { Rate = 100 }));
    }

    [Theory]
    [InlineData("utf-16", "UTF-16 text")]
    [InlineData("utf-16BE", "UTF-16 text")]
    public void Wide_characters_are_refused_with_and_without_their_mark(string encoding, string found)
    {
        var text = Encoding.GetEncoding(encoding);
        foreach (var bytes in new[] { text.GetBytes(Good), [.. text.Preamble, .. text.GetBytes(Good)] })
        {
            var error = Assert.Throws<InputFormatException>(() => Table.Read(bytes));
            Assert.Equal($"t.csv: found {found}, expected CSV text in UTF-8", error.Message);
        }
    }

    [Fact]
    public void Compressed_data_is_refused()
    {
        var error = Assert.Throws<InputFormatException>(() => Table.Read([0x1f, 0x8b, 8, 0, 1, 2]));

        Assert.Equal("t.csv: found gzip-compressed data, expected CSV text in UTF-8", error.Message);
    }
}
