using MocapClean.Cli.Config;
using MocapClean.Cli.Tests.Support;
using Xunit;

namespace MocapClean.Cli.Tests.Golden;

/// <summary>The README says what the program does: its settings, verbs, options and exit codes. MOCAPCLEAN_RECORD=1 writes the table anew.</summary>
public sealed class ReadmeTests
{
    private const string Open = "<!-- settings -->\n";
    private const string Close = "<!-- /settings -->";

    [Fact]
    public void The_table_of_settings_is_the_one_that_the_stages_declare()
    {
        var path = Repository.Path("README.md");
        var text = File.ReadAllText(path);
        var (open, close) = (text.IndexOf(Open, StringComparison.Ordinal) + Open.Length, text.IndexOf(Close, StringComparison.Ordinal));
        if (Environment.GetEnvironmentVariable("MOCAPCLEAN_RECORD") == "1")
        {
            text = text[..open] + SettingsTable.Markdown() + text[close..];
            File.WriteAllText(path, text);
            close = text.IndexOf(Close, StringComparison.Ordinal);
        }

        Assert.Equal(SettingsTable.Markdown(), text[open..close]);
    }

    [Theory]
    [InlineData("run")]
    [InlineData("inspect")]
    [InlineData("diff")]
    [InlineData("settings")]
    [InlineData("demo")]
    public void Every_option_of_a_verb_is_in_the_README(string verb)
    {
        var readme = File.ReadAllText(Repository.Path("README.md"));
        var help = Tool.Run(verb, "--help");
        Assert.Equal(0, help.Code);
        Assert.Contains($"mocapclean {verb} ", readme, StringComparison.Ordinal);
        var options = help.Output.Split(' ', '\n', ',').Where(w => w.StartsWith("--", StringComparison.Ordinal) && w is not ("--help" or "--version"));
        Assert.All(options.Distinct(), option => Assert.Contains(option, readme, StringComparison.Ordinal));
    }
}
