using System.Text.RegularExpressions;
using MocapClean.Cli.Config;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class ShippedConfigTests
{
    private static string Folder => Path.Combine(AppContext.BaseDirectory, "config");

    public static TheoryData<string> Files => [.. Directory.EnumerateFiles(Folder, "*.yaml").Select(f => Path.GetFileName(f))];

    [Theory]
    [MemberData(nameof(Files))]
    public void A_shipped_config_loads_and_points_editors_to_the_schema(string file)
    {
        var path = Path.Combine(Folder, file);
        Assert.Equal("# yaml-language-server: $schema=mocapclean.schema.json", File.ReadLines(path).First());
        Assert.NotEmpty(ConfigReader.Load(path).Source.Takes);
    }

    [Fact]
    public void There_are_configs_for_a_start_for_the_night_and_for_the_floor() =>
        Assert.Superset(new HashSet<string> { "starter.yaml", "overnight.yaml", "floor-side.yaml" }, Files.Select(f => f.Data).ToHashSet());

    // After a change of settings: `mocapclean settings --schema > config/mocapclean.schema.json`, and --starter for the starter.
    [Fact]
    public void The_shipped_schema_is_the_one_that_is_printed() =>
        Assert.Equal(ConfigSchema.Text(), File.ReadAllText(Path.Combine(Folder, "mocapclean.schema.json")));

    [Fact]
    public void The_shipped_starter_is_the_one_that_is_printed() =>
        Assert.Equal(ConfigStarter.Text(), File.ReadAllText(Path.Combine(Folder, "starter.yaml")));

    [Fact]
    public void The_starter_changes_no_default()
    {
        var config = ConfigReader.Parse(ConfigStarter.Text(), "starter.yaml");
        Assert.Equal(new(), config.SettingsFor("hips"));
        Assert.Equal(["ingest.takes", "output.folder"], config.Given.Keys.Order());
    }

    [Fact]
    public void Every_key_behind_a_comment_sign_can_be_made_live()
    {
        var live = Regex.Replace(ConfigStarter.Text(), "^# (?=[ ]*(- )?[a-z-]+:)(?!yaml-language-server)", "", RegexOptions.Multiline | RegexOptions.ExplicitCapture, TimeSpan.FromSeconds(1));
        var problems = Assert.Throws<ConfigException>(() => ConfigReader.Parse(live, "starter.yaml")).Problems;

        // What is left are keys of methods that are not the default, and the one rule between two keys.
        Assert.All(problems, p => Assert.Matches("belongs to method|not both", p.Message));
        Assert.All(ConfigCatalog.Root.Leaves(), k => Assert.Matches($@"(?m)^ *(- )?{k.Name}: ", live));
    }

    [Fact]
    public void On_the_floor_nothing_is_filled_or_smoothed()
    {
        var settings = ConfigReader.Load(Path.Combine(Folder, "floor-side.yaml")).SettingsFor("hips");
        Assert.Equal((FillMethod.None, SmoothMethod.None), (settings.Fill.Method, settings.Smooth.Method));
    }
}
