using System.Text.Json;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Yaml;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class YamlTreeTests
{
    private static readonly JsonElement File = JsonDocument.Parse(
        System.IO.File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Config", "Data", "yaml.json"))).RootElement;

    // What YAML allows and a strict config does not: anchors, and numbers in base 8 and 16.
    private static readonly string[] RefusedByChoice = ["merge key", "anchor and alias"];
    private static readonly string[] NoNumberByChoice = ["octal", "hexadecimal"];

    public static TheoryData<string> Names => [.. File.GetProperty("cases").EnumerateArray().Select(c => c.GetProperty("name").GetString()!)];

    [Theory]
    [MemberData(nameof(Names))]
    public void A_corner_of_YAML_is_read_or_refused(string name)
    {
        var item = File.GetProperty("cases").EnumerateArray().Single(c => c.GetProperty("name").GetString() == name);
        var problems = new ProblemList("x.yaml");
        var root = YamlTree.Read(item.GetProperty("text").GetString()!, problems);
        var outcome = item.GetProperty("outcome").GetString();
        if (name is "empty file" or "list where a mapping belongs" || outcome == "reject" || RefusedByChoice.Contains(name))
        {
            var problem = Assert.Single(Assert.Throws<ConfigException>(problems.ThrowIfAny).Problems);
            Assert.True(problem.At.Line > 0 && problem.At.Column > 0, problem.ToString());
            return;
        }

        problems.ThrowIfAny();
        if (outcome == "value")
        {
            AssertSame(item.GetProperty("value"), root!.Entries[0].Value, NoNumberByChoice.Contains(name));
        }
    }

    private static void AssertSame(JsonElement expected, ConfigNode found, bool noNumber)
    {
        switch (expected.ValueKind)
        {
            case JsonValueKind.Array:
                var items = Assert.IsType<ListNode>(found).Items;
                Assert.Equal(expected.GetArrayLength(), items.Length);
                Assert.All(expected.EnumerateArray().Zip(items), pair => AssertSame(pair.First, pair.Second, noNumber));
                break;
            case JsonValueKind.Null:
                Assert.True(found.IsNothing);
                break;
            case JsonValueKind.Number:
                var isNumber = UnitText.TrySplit(((WordNode)found).Text, out var number, out var rest) && rest.Length == 0;
                Assert.Equal(!noNumber, isNumber);
                Assert.True(noNumber || number == expected.GetDouble());
                break;
            case JsonValueKind.True or JsonValueKind.False:
                Assert.Equal(expected.GetRawText(), ((WordNode)found).Text.ToLowerInvariant());
                break;
            case JsonValueKind.String when expected.GetString() is "nan" or "inf" or "-inf":
                Assert.False(UnitText.TrySplit(((WordNode)found).Text, out _, out _));
                break;
            default:
                Assert.Equal(expected.GetString(), ((WordNode)found).Text);
                break;
        }
    }

    [Fact]
    public void A_bomb_of_aliases_is_refused_at_its_first_anchor() =>
        Assert.StartsWith("day.yaml:1:4: this is not YAML: an anchor (&) is not supported", Reading.Problems(File.GetProperty("alias-bomb").GetString()!), StringComparison.Ordinal);

    [Theory]
    [InlineData('[', ']')]
    [InlineData('{', '}')]
    public void Ten_thousand_brackets_are_refused_and_do_no_harm(char open, char close)
    {
        var text = "a: " + new string(open, 10_000) + new string(close, 10_000);
        Assert.Contains("nested more than 32 deep", Reading.Problems(text), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("a: [1, 2\nb: 3\n")]
    [InlineData("a: \"open\nb: 3\n")]
    [InlineData("a: {b: 1\n")]
    [InlineData("a\n  b: c: d\n")]
    public void Broken_YAML_is_one_problem_with_a_place(string text)
    {
        var problem = Assert.Single(Assert.Throws<ConfigException>(() => ConfigReader.Parse(text, "day.yaml")).Problems);
        Assert.True(problem.At.Line >= 1 && problem.At.Column >= 1, problem.ToString());
        Assert.Contains("not YAML", problem.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("")]
    [InlineData("# only words\n")]
    [InlineData("---\n")]
    public void A_file_with_nothing_in_it_says_what_is_needed(string text) =>
        Assert.Matches("empty|nothing", Reading.Problems(text));

    [Fact]
    public void A_key_that_stands_twice_names_both_places_and_the_rest_is_read_too()
    {
        var problems = Reading.ProblemsOf("reduce:\n  tolerance: 1 deg\n  tolerance: 2 deg\nsmoth: none\n");
        Assert.Equal(
            "day.yaml:5:3: key 'tolerance' stands here twice; the first is in line 4\nday.yaml:6:1: unknown key 'smoth'; did you mean 'smooth'?",
            problems);
    }
}
