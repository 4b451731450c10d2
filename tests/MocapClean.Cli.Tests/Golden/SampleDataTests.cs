using System.Globalization;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Demo;
using MocapClean.Cli.Tests.Support;
using Xunit;

namespace MocapClean.Cli.Tests.Golden;

/// <summary>
/// The sample session and what cleaning it gave when it was last looked at. To record anew: set MOCAPCLEAN_RECORD=1, run these tests once,
/// and read the difference before committing it.
/// </summary>
public sealed class SampleDataTests : IDisposable
{
    /// <summary>Reports print a millionth of a degree; another processor may round the last digit the other way.</summary>
    private const double Near = 2e-6;

    private static readonly bool Recording = Environment.GetEnvironmentVariable("MOCAPCLEAN_RECORD") == "1";

    private readonly TempFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Sample_data_is_what_the_demo_writes()
    {
        DemoSession.Write(new FolderOutput(Recording ? Repository.Path("sample-data") : folder["demo"]), seed: 1);
        foreach (var (name, bytes) in folder.Content(Recording ? "." : "demo"))
        {
            Assert.True(bytes.AsSpan().SequenceEqual(File.ReadAllBytes(Repository.Path($"sample-data/{name}"))), name);
        }
    }

    [Fact]
    public void The_sample_session_comes_out_as_recorded()
    {
        var result = Tool.Run("run", Repository.Path("sample-data/session.yaml"), "--out", folder["out"], "--quiet");
        Assert.True(result.Code == 0, result.Error);
        var tables = folder.Content("out").Where(f => f.Key.EndsWith(".diff.csv", StringComparison.Ordinal) || f.Key.EndsWith(".keys.csv", StringComparison.Ordinal) || f.Key == "reshoot.csv").ToList();
        Assert.Equal(13, tables.Count);
        foreach (var (name, bytes) in tables)
        {
            var recorded = Repository.Path($"tests/MocapClean.Cli.Tests/Golden/Recorded/{name}");
            if (Recording)
            {
                Directory.CreateDirectory(Path.GetDirectoryName(recorded)!);
                File.WriteAllBytes(recorded, bytes);
            }

            Same(name, File.ReadAllLines(recorded), System.Text.Encoding.UTF8.GetString(bytes).TrimEnd('\n').Split('\n'));
        }
    }

    private static void Same(string name, string[] expected, string[] actual)
    {
        for (var n = 0; n < Math.Min(expected.Length, actual.Length); n++)
        {
            Assert.True(Same(expected[n], actual[n]), $"{name} line {n + 1}\nrecorded {expected[n]}\nnow      {actual[n]}");
        }

        Assert.Equal(expected.Length, actual.Length);
    }

    private static bool Same(string expected, string actual)
    {
        var (a, b) = (expected.Split(','), actual.Split(','));
        return a.Length == b.Length && a.Zip(b).All(c => c.First == c.Second || (Number(c.First, out var x) && Number(c.Second, out var y) && Math.Abs(x - y) < Near));
    }

    private static bool Number(string text, out double value) => double.TryParse(text, CultureInfo.InvariantCulture, out value);
}
