using MocapClean.Cli.Tests.Support;
using Xunit;

namespace MocapClean.Cli.Tests.Process;

/// <summary>Each bad take gets one clear line and exit code 1, and the good take beside it is cleaned all the same.</summary>
public sealed class BadTakeTests
{
    public static TheoryData<string, string, string> Bad() => new()
    {
        { "empty", "", "empty" },
        { "binary", "\0\0\u0001\u0002binary\0", "binary" },
        { "cut in the last line", Takes.Wide()[..^30], "field" },
        { "ragged", Takes.Wide(60, (n, row) => n == 7 ? row + ",1" : row), "row" },
        { "duplicate joint", Takes.Wide().Replace("b.q", "a.q", StringComparison.Ordinal), "a.qw" },
        { "component missing", Takes.Wide().Replace("b.qz", "b.zz", StringComparison.Ordinal), "b" },
        { "text in a number", Takes.Wide(60, (n, row) => n == 7 ? row.Replace("0.0700,", "0.0700,abc", StringComparison.Ordinal) : row), "abc" },
        { "decimal comma", Takes.Wide(60, (n, row) => n == 7 ? row.Replace("0.0700,", "\"0,07\",", StringComparison.Ordinal) : row), "0,07" },
        { "unclosed quote", Takes.Wide(60, (n, row) => n == 7 ? "\"" + row : row), "quot" },
        { "no joint", "time,x,y\n0,1,2\n0.1,1,2\n", "joint" },
        { "no frame", Takes.Wide(0), "frame" },
        { "a clock that never moves", Takes.Wide(60, (_, row) => "0.5" + row[6..]), "time" },
        { "time that is no number", Takes.Wide(60, (n, row) => n == 3 ? "soon" + row[6..] : row), "soon" },
    };

    [Theory]
    [MemberData(nameof(Bad))]
    public void A_bad_take_is_named_in_one_line_and_the_others_go_on(string what, string content, string mention)
    {
        using var folder = new TempFolder();
        folder.Put("in/bad.csv", content);
        folder.Put("in/good.csv", Takes.Wide());
        var result = Tool.Run("run", folder["in"], "--out", folder["out"]);
        Assert.True(result.Code == 1, $"{what}: exit {result.Code}\n{result.Output}\n{result.Error}");
        var line = Assert.Single(result.ErrorLines);
        Assert.StartsWith("bad.csv", line, StringComparison.Ordinal);
        Assert.Contains(mention, line, StringComparison.OrdinalIgnoreCase);
        Assert.Contains("expected", line, StringComparison.Ordinal);
        Assert.True(File.Exists(folder["out/takes/good.csv"]));
        Assert.False(File.Exists(folder["out/takes/bad.csv"]));
        Assert.Equal(content, File.ReadAllText(folder["in/bad.csv"]));
    }

    [Fact]
    public void A_bad_bvh_is_named_with_its_line()
    {
        using var folder = new TempFolder();
        folder.Put("in/bad.bvh", "HIERARCHY\nROOT hips\n{\nOFFSET 0 0 0\nCHANNELS 3 Zrotation Xrotation Yrotation\n}\nMOTION\nFrames: 2\nFrame Time: 0.01\n0 0 0\n0 x 0\n");
        folder.Put("in/good.csv", Takes.Wide());
        var result = Tool.Run("run", folder["in"], "--out", folder["out"]);
        Assert.Equal(1, result.Code);
        Assert.Contains("11", Assert.Single(result.ErrorLines), StringComparison.Ordinal);
        Assert.True(File.Exists(folder["out/takes/good.csv"]));
    }

    [Fact]
    public void Odd_data_is_processed_with_findings()
    {
        using var folder = new TempFolder();
        folder.Put("in/zeros.csv", Takes.Wide(60, (n, row) => n is >= 20 and < 24 ? $"{n / 100.0:0.0000},0,0,0,0,nan,0,0,0" : row));
        folder.Put("in/stands.csv", Takes.Wide(60, (n, row) => n is >= 20 and < 24 ? "0.1900" + row[6..] : row));
        folder.Put("in/back.csv", Takes.Wide(60, (n, row) => n is 30 ? "0.1000" + row[6..] : row));
        folder.Put("in/one-frame.csv", Takes.Wide(1));
        folder.Put("in/one-joint.csv", "time,a.qw,a.qx,a.qy,a.qz\n0,1,0,0,0\n0.01,1,0,0,0\n0.02,1,0,0,0\n");
        var result = Tool.Run("run", folder["in"], "--out", folder["out"]);
        Assert.True(result.Code == 0, result.Error);
        Assert.Contains("gap", File.ReadAllText(folder["out/reports/zeros.csv.diff.csv"]), StringComparison.Ordinal);
        Assert.Contains("clock", File.ReadAllText(folder["out/reports/stands.csv.diff.csv"]), StringComparison.Ordinal);
        Assert.Contains("clock", File.ReadAllText(folder["out/reports/back.csv.diff.csv"]), StringComparison.Ordinal);
        Assert.Equal(Takes.Wide(1), File.ReadAllText(folder["out/takes/one-frame.csv"]));
        Assert.True(File.Exists(folder["out/takes/one-joint.csv"]));
    }
}
