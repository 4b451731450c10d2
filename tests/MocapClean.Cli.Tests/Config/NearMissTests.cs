using MocapClean.Cli.Config;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class NearMissTests
{
    [Theory]
    [InlineData("smoth", "smooth")]
    [InlineData("SMOOTH", "smooth")]
    [InlineData("treshhold", "threshold")]
    [InlineData("ratee", "rate")]
    [InlineData("rtae", "rate")]
    [InlineData("ratios", null)]
    [InlineData("fxll", "fill")]
    [InlineData("fxlx", null)]
    [InlineData("", null)]
    public void The_likely_word_is_two_edits_away_at_most_or_one_for_short_words(string word, string? likely) =>
        Assert.Equal(likely, NearMiss.Of(word, ["threshold", "rate", "fill", "smooth"]));
}
