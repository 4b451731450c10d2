using MocapClean.Cli.Config;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

/// <summary>Reads texts as configs, for tests.</summary>
internal static class Reading
{
    public const string Least = "ingest: {takes: takes}\noutput: {folder: out}\n";

    /// <summary>The config of the two needed keys and whatever follows.</summary>
    public static SessionConfig Config(string more = "") => ConfigReader.Parse(Least + more, "day.yaml");

    /// <summary>All problems of a text, one a line, as a user sees them.</summary>
    public static string Problems(string text)
    {
        var thrown = Assert.Throws<ConfigException>(() => ConfigReader.Parse(text, "day.yaml"));
        return thrown.Message;
    }

    /// <summary>The problems of what follows the two needed keys; its first line is line 3.</summary>
    public static string ProblemsOf(string more) => Problems(Least + more);
}
