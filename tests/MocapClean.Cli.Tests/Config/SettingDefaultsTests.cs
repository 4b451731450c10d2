using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Yaml;
using MocapClean.Core.Diff;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Settings;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class SettingDefaultsTests
{
    public static TheoryData<string> Paths => [.. ConfigCatalog.Root.Leaves().Where(k => k.Setting!.Default.Length > 0).Select(k => k.Path)];

    [Theory]
    [MemberData(nameof(Paths))]
    public void A_default_in_a_table_is_the_default_in_its_record(string path)
    {
        var key = ConfigCatalog.Root.Leaves().Single(k => k.Path == path);
        var value = Value(key);
        if (key.Setting is Setting<StageSettings> stage)
        {
            Assert.Equal(new(), stage.With(new(), value));
            return;
        }

        var before = new SessionConfig { Folder = "/" };
        var after = ((Setting<SessionConfig>)key.Setting!).With(before, value);
        Assert.Equal(Parts(before), Parts(after));
    }

    [Fact]
    public void The_table_of_verdicts_reads_back_as_its_record() =>
        Assert.Equal(new VerdictSettings().ToString(), VerdictSettings.Table.Settings.Where(s => s.Default.Length > 0)
            .Aggregate(new VerdictSettings(), (v, s) => s.With(v, Value(ConfigCatalog.Root.Leaves().Single(k => k.Path == $"reshoot.{s.Key}")))).ToString());

    [Fact]
    public void A_key_without_a_default_has_an_example_and_says_what_holds()
    {
        foreach (var key in ConfigCatalog.Root.Leaves().Where(k => k.Setting!.Default.Length == 0))
        {
            Assert.True(key.Setting!.Example.Length > 0 && key.Setting.Unset.Length > 0, key.Path);
        }
    }

    [Fact]
    public void No_path_stands_twice()
    {
        var paths = ConfigCatalog.Root.Leaves().Select(k => k.Path).ToList();
        Assert.Equal(paths.Distinct(), paths);
    }

    // Lists have no equality of their own, so records are compared by what they print and lists by what they hold.
    private static string Parts(SessionConfig config) => string.Join(
        '\n',
        config.Source.Read with { CsvComponents = [] },
        string.Join(',', config.Source.Read.CsvComponents),
        string.Join(',', config.Output.Keys),
        config.Output with { Keys = [] },
        config.TimeCode,
        config.Limits,
        config.Reshoot);

    private static SettingValue Value(KeyNode key)
    {
        var problems = new ProblemList("table");
        var node = YamlTree.Read($"v: {key.Setting!.Default}", problems)!.Entries[0].Value;
        var value = new ValueReader(problems).Read(node, key);
        problems.ThrowIfAny();
        return value!;
    }
}
