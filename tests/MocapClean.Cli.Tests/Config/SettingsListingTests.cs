using MocapClean.Cli.Config;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class SettingsListingTests
{
    private static readonly SessionConfig Config = Reading.Config(
        """
        smooth: {method: butterworth, cutoff: 6 Hz}
        joints:
          - names: "*Hand"
            reduce: {tolerance: 1 deg}
        """);

    [Fact]
    public void Every_setting_tells_its_value_and_where_it_came_from()
    {
        var rows = SettingsListing.ForSession(Config).ToDictionary(r => r.Key);
        Assert.Equal(("6 Hz", "3:39"), (rows["smooth.cutoff"].Value, rows["smooth.cutoff"].Origin));
        Assert.Equal(("0.5 deg", "default"), (rows["reduce.tolerance"].Value, rows["reduce.tolerance"].Origin));
        Assert.Equal(("takes", "1:17"), (rows["ingest.takes"].Value, rows["ingest.takes"].Origin));
        Assert.Equal(("(from the clock)", "default"), (rows["ingest.rate"].Value, rows["ingest.rate"].Origin));
        Assert.Equal(("1 deg", "joints entry 1, 6:25"), (rows["reduce.tolerance for *Hand"].Value, rows["reduce.tolerance for *Hand"].Origin));
    }

    [Fact]
    public void Keys_of_methods_that_do_not_hold_are_left_out()
    {
        var keys = SettingsListing.ForSession(Config).Select(r => r.Key).ToList();
        Assert.Contains("smooth.cutoff", keys);
        Assert.DoesNotContain("smooth.window", keys);
    }

    [Fact]
    public void A_joint_shows_what_holds_for_it()
    {
        var rows = SettingsListing.ForJoint(Config, "LeftHand").ToDictionary(r => r.Key);
        Assert.Equal(("1 deg", "joints entry 1, 6:25"), (rows["reduce.tolerance"].Value, rows["reduce.tolerance"].Origin));
        Assert.Equal("0.5 deg", SettingsListing.ForJoint(Config, "Hips").Single(r => r.Key == "reduce.tolerance").Value);
    }

    [Fact]
    public void The_table_of_the_README_holds_every_key()
    {
        var lines = SettingsTable.Markdown().Split('\n');
        foreach (var key in ConfigCatalog.Root.Leaves())
        {
            Assert.Single(lines, l => l.StartsWith($"| `{key.Path}` |", StringComparison.Ordinal));
        }

        Assert.Contains("| `reduce.tolerance` | `0.5 deg` | largest angle at any frame between the track and its keys as played back |", lines);
        Assert.All(lines.Where(l => l.Length > 0), l => Assert.Equal(4, l.Count(c => c == '|')));
    }
}
