using System.Text.Json;
using System.Text.Json.Nodes;
using Json.Schema;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Yaml;
using MocapClean.Core.Stages.Settings;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class ConfigSchemaTests
{
    private static readonly JsonSchema Schema = JsonSchema.FromText(ConfigSchema.Text());

    public static TheoryData<string> Paths => [.. Leaves().Select(k => k.Path)];

    [Theory]
    [MemberData(nameof(Paths))]
    public void Schema_and_reader_take_and_refuse_the_same_value(string path)
    {
        var key = Leaves().First(k => k.Path == path);
        AssertBoth(key, Good(key.Setting!), isGood: true);
        AssertBoth(key, Bad(key.Setting!), isGood: false);
        AssertBoth(key, key.Setting!.Shape is Shape.FreeText or Shape.TextList or Shape.WordList ? "{a: 1}" : "[{a: 1}]", isGood: false);
    }

    [Theory]
    [MemberData(nameof(Paths))]
    public void Schema_and_reader_refuse_a_misspelt_key(string path)
    {
        var key = Leaves().First(k => k.Path == path);
        AssertBoth(key with { Name = key.Name + "x", Path = key.Path + "x" }, Good(key.Setting!), isGood: false);
    }

    [Theory]
    [InlineData("smooth: none", true)]
    [InlineData("smooth: nothing", false)]
    [InlineData("smooth: [none]", false)]
    [InlineData("smooth:", true)]
    [InlineData("joints:", true)]
    [InlineData("joints: [{names: x, smooth: none, fill: {longest: 12 frames}}]", true)]
    [InlineData("joints: [{names: [x, y], smooth: {cutof: 6 Hz}}]", false)]
    [InlineData("joints: [{smooth: none}]", false)]
    [InlineData("joints: {names: x}", false)]
    [InlineData("time-code: {rate: '25'}", true)]
    [InlineData("time-code: {rate: 25}", true)]
    [InlineData("time-code: {rate: 26}", false)]
    [InlineData("session: 12", true)]
    [InlineData("session: ' '", false)]
    [InlineData("reduce: {tolerance: 0.5deg}", true)]
    [InlineData("reduce: {tolerance: 0.5  deg}", true)]
    [InlineData("reduce: {tolerance: 0.5 degrees}", false)]
    [InlineData("reduce: {tolerance: '0,5 deg'}", false)]
    public void Schema_and_reader_agree(string more, bool isGood)
    {
        Assert.Equal(isGood, ReaderTakes(Reading.Least + more));
        Assert.Equal(isGood, SchemaTakes(Reading.Least + more));
    }

    [Theory]
    [InlineData("output: {folder: out}")]
    [InlineData("ingest: {takes: x}")]
    [InlineData("ingest:\noutput: {folder: out}")]
    [InlineData("ingest: {takes: []}\noutput: {folder: out}")]
    public void Schema_and_reader_ask_for_what_is_needed(string text)
    {
        Assert.False(ReaderTakes(text));
        Assert.False(SchemaTakes(text));
    }

    private static IEnumerable<KeyNode> Leaves() => ConfigCatalog.Root.Leaves();

    private static void AssertBoth(KeyNode key, string value, bool isGood)
    {
        var text = With(key, value);
        Assert.True(ReaderTakes(text) == isGood, $"reader, {text}");
        Assert.True(SchemaTakes(text) == isGood, $"schema, {text}");
    }

    private static string Good(Setting setting) => setting.Default.Length > 0 ? setting.Default : setting.Example;

    private static string Bad(Setting setting) => setting.Shape switch
    {
        Shape.Choice => "surely-not",
        Shape.Quantity { Unit: Unit.Hertz } => "6 deg",
        Shape.Quantity => "6 Hz",
        Shape.WholeNumber => "1.5",
        Shape.Flag => "1",
        Shape.TextList { Length: not null } => "[a, b]",
        Shape.WordList => "[]",
        _ => "",
    };

    // The least config with one key given, along with the method or the rate that it needs.
    private static string With(KeyNode key, string value)
    {
        var root = new Dictionary<string, string> { ["ingest.takes"] = "x", ["output.folder"] = "out", [key.Path] = value };
        if (key.Setting!.OnlyFor is [var method, ..])
        {
            root[key.MethodPath] = method;
        }

        if (key.Path.StartsWith("time-code.", StringComparison.Ordinal))
        {
            root.TryAdd("time-code.rate", "29.97");
        }

        return Nested(root.ToList());
    }

    private static string Nested(IReadOnlyCollection<KeyValuePair<string, string>> paths) => "{" + string.Join(", ", paths
        .GroupBy(p => p.Key.Split('.')[0])
        .Select(g => $"{g.Key}: " + (g.First().Key == g.Key
            ? g.First().Value
            : Nested([.. g.Select(p => KeyValuePair.Create(p.Key[(g.Key.Length + 1)..], p.Value))])))) + "}";

    private static bool ReaderTakes(string text)
    {
        try
        {
            ConfigReader.Parse(text, "day.yaml");
            return true;
        }
        catch (ConfigException)
        {
            return false;
        }
    }

    private static bool SchemaTakes(string text)
    {
        using var json = JsonDocument.Parse(Json(YamlTree.Read(text, new ProblemList("x"))!)!.ToJsonString());
        return Schema.Evaluate(json.RootElement).IsValid;
    }

    // Types as the YAML 1.2 core schema gives them to an editor.
    private static JsonNode? Json(ConfigNode node) => node switch
    {
        { IsNothing: true } => null,
        BlockNode block => new JsonObject(block.Entries.Select(e => KeyValuePair.Create(e.Key, Json(e.Value)))),
        ListNode list => new JsonArray([.. list.Items.Select(Json)]),
        WordNode { IsPlain: true, Text: "true" or "false" } flag => flag.Text == "true",
        WordNode { IsPlain: true } word when decimal.TryParse(word.Text, out var number) => number,
        WordNode word => word.Text,
        _ => throw new ArgumentOutOfRangeException(nameof(node)),
    };
}
