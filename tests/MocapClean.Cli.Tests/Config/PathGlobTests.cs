using MocapClean.Cli.Config.Sources;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class PathGlobTests
{
    [Theory]
    [InlineData("*.csv", "a.csv", true)]
    [InlineData("*.csv", "b/a.csv", false)]
    [InlineData("*.csv", "a.CSV", false)]
    [InlineData("*.csv", ".a.csv", false)]
    [InlineData(".*.csv", ".a.csv", true)]
    [InlineData("**/*.csv", "a.csv", true)]
    [InlineData("**/*.csv", "b/c/a.csv", true)]
    [InlineData("**/*.csv", ".trash/a.csv", false)]
    [InlineData("**/*.csv", "b/._a.csv", false)]
    [InlineData("**", "b/c/a.csv", true)]
    [InlineData("**", "b/.c/a.csv", false)]
    [InlineData("b/**", "b/c/a.csv", true)]
    [InlineData("b/**", "b", false)]
    [InlineData("b/**/a.csv", "b/a.csv", true)]
    [InlineData("b/*/a.csv", "b/a.csv", false)]
    [InlineData("b/*/a.csv", "b/c/a.csv", true)]
    [InlineData("./take?.csv", "take1.csv", true)]
    [InlineData("take?.csv", "take12.csv", false)]
    [InlineData("day*/**/fight_*.bvh", "day2/set/b/fight_03.bvh", true)]
    [InlineData("a.csv", "a.csv", true)]
    [InlineData("b[1].csv", "b[1].csv", true)]
    public void A_path_meets_a_pattern(string pattern, string path, bool expected) => Assert.Equal(expected, new PathGlob(pattern).Matches(path));

    [Fact]
    public void Many_double_stars_are_as_quick_as_one()
    {
        var path = string.Join('/', Enumerable.Repeat("a", 200));
        Assert.False(new PathGlob(string.Concat(Enumerable.Repeat("**/", 200)) + "b").Matches(path));
    }
}
