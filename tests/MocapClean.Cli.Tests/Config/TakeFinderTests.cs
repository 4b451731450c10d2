using MocapClean.Cli.Tests.Support;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Sources;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class TakeFinderTests : IDisposable
{
    private readonly TempFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Names_start_at_the_deepest_folder_that_the_globs_share_and_come_in_ordinal_order()
    {
        Write("s/day1/b.csv", "s/day1/a.csv", "s/day2/deep/c.bvh", "s/day1/B2.csv", "s/x.csv");
        var list = Find("ingest: {takes: [s/day2/**/*.bvh, s/day1/*.csv]}");
        Assert.Equal(Path.Combine(folder.Path, "s"), list.Root);
        Assert.Equal(["day1/B2.csv", "day1/a.csv", "day1/b.csv", "day2/deep/c.bvh"], list.Takes.Select(t => t.Name));
        Assert.Empty(list.Notes);
    }

    [Fact]
    public void A_given_root_is_where_names_start()
    {
        Write("s/day1/a.csv");
        Assert.Equal(["s/day1/a.csv"], Names("ingest: {takes: s/day1/*.csv, root: .}"));
        Assert.Contains("lies outside ingest.root", Problem("ingest: {takes: s/day1/a.csv, root: other}"), StringComparison.Ordinal);
    }

    [Fact]
    public void A_file_matched_twice_is_one_take()
    {
        Write("a.csv", "b.csv");
        Assert.Equal(["a.csv", "b.csv"], Names("ingest: {takes: ['*.csv', a.csv, '**/a*']}"));
    }

    [Fact]
    public void A_folder_stands_for_every_take_in_it()
    {
        Write("s/a.csv", "s/notes.txt", "s/.hidden/b.csv", "s/deep/c.bvh");
        var list = Find("ingest: {takes: s}");
        Assert.Equal(["a.csv", "deep/c.bvh"], list.Takes.Select(t => t.Name));
        Assert.Empty(list.Notes);
    }

    [Fact]
    public void What_is_excepted_or_a_list_of_slates_is_no_take()
    {
        Write("s/a.csv", "s/a_cal.csv", "s/deep/b_cal.csv", "s/slates.csv");
        Assert.Equal(["a.csv"], Names("ingest: {takes: 's/**/*.csv', except: '**/*_cal.csv'}\ntime-code: {rate: 25, slates: s/slates.csv}"));
        Assert.Equal(["a.csv", "deep/b_cal.csv", "slates.csv"], Names("ingest: {takes: 's/**/*.csv', except: a_cal.csv}"));
    }

    [Fact]
    public void A_file_of_another_format_and_a_glob_that_meets_nothing_are_named()
    {
        Write("a.csv", "a.txt");
        Assert.Equal(["a.txt: no format reads '.txt' files", "b/*.csv: matches no file"], Find("ingest: {takes: ['a.*', b/*.csv]}").Notes);
    }

    [Fact]
    public void No_take_at_all_is_a_problem_with_a_place()
    {
        Write("a.txt");
        Assert.Equal("day.yaml:1:17: no take found for a.*; a.txt: no format reads '.txt' files", Problem("ingest: {takes: 'a.*'}"));
    }

    [Fact]
    public void What_an_earlier_run_wrote_is_never_a_take()
    {
        Write("a.csv", "out/takes/a.csv", "out/keys/a.csv.keys.csv", "out/reshoot.csv", "out/session.json", "out/log/journal");
        Assert.Equal(["a.csv"], Names("ingest: {takes: '**/*.csv'}"));
        Assert.Equal(["a.csv"], Names("ingest: {takes: .}"));
        var list = Find("ingest: {takes: '**'}");
        Assert.Equal(["a.csv"], list.Takes.Select(t => t.Name));
        Assert.Empty(list.Notes);
    }

    [Theory]
    [InlineData("ingest: {takes: 's/*.csv'}\noutput: {folder: s}", "holds the takes")]
    [InlineData("ingest: {takes: 's/*.csv'}\noutput: {folder: .}", "holds the takes")]
    [InlineData("ingest: {takes: ['s/*.csv', 't/*.csv']}\noutput: {folder: t}", "already holds takes (t/b.csv)")]
    public void Results_never_go_among_the_takes(string text, string expected)
    {
        Write("s/a.csv", "t/b.csv");
        Assert.Contains(expected, Problem(text), StringComparison.Ordinal);
    }

    [Fact]
    public void Delivered_takes_in_a_folder_called_takes_are_not_mistaken_for_results()
    {
        Write("a.csv", "out/takes/b.csv");
        Assert.Contains("already holds takes (out/takes/b.csv)", Problem("ingest: {takes: '**/*.csv'}"), StringComparison.Ordinal);
    }

    [Fact]
    public void Takes_that_would_write_one_file_are_a_problem()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "the file system knows no such pair");
        Write("a.csv", "A.csv");
        Assert.Contains("A.csv and a.csv", Problem("ingest: {takes: '*.csv'}"), StringComparison.Ordinal);
    }

    [Fact]
    public void Links_are_followed_within_the_root_only_and_to_no_folder()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "links need rights there");
        Write("s/a.csv", "elsewhere/b.csv");
        Link("s/b.csv", "elsewhere/b.csv");
        Link("s/again.csv", "s/a.csv");
        Link("s/up", ".");
        var list = Find("ingest: {takes: 's/**/*.csv'}");
        Assert.Equal(["a.csv"], list.Takes.Select(t => t.Name));
        Assert.Equal([$"b.csv: a link that leads out of '{list.Root}' is not followed", "up: a link to a folder is not followed"], list.Notes);
    }

    [Fact]
    public void A_results_folder_behind_a_link_is_still_the_takes_folder()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "links need rights there");
        Write("s/a.csv");
        Link("results", "s");
        Assert.Contains("holds the takes", Problem("ingest: {takes: 's/*.csv'}\noutput: {folder: results}"), StringComparison.Ordinal);
    }

    [Fact]
    public void Files_and_folders_without_a_config_have_the_defaults()
    {
        Write("s/a.csv", "s/b/c.bvh", "s/odd[1]*.csv");
        var config = SessionConfig.ForPaths([Path.Combine(folder.Path, "s")], Path.Combine(folder.Path, "out"));
        Assert.Equal("s", config.Title);
        Assert.Equal(["a.csv", "b/c.bvh", "odd[1]*.csv"], TakeFinder.Find(config).Takes.Select(t => t.Name));
        var one = SessionConfig.ForPaths([Path.Combine(folder.Path, "s/odd[1]*.csv")], "out");
        Assert.Equal(["odd[1]*.csv"], TakeFinder.Find(one).Takes.Select(t => t.Name));
        Assert.Equal("no: no such file or folder", Assert.Throws<ConfigException>(() => SessionConfig.ForPaths(["no"], "out")).Message);
    }

    private void Write(params string[] names) => Array.ForEach(names, n => folder.Put(n));

    private void Link(string name, string target) => File.CreateSymbolicLink(Path.Combine(folder.Path, name), Path.Combine(folder.Path, target));

    private TakeList Find(string text)
    {
        var config = ConfigReader.Parse(text.Contains("output:") ? text : text + "\noutput: {folder: out}", Path.Combine(folder.Path, "day.yaml"));
        return TakeFinder.Find(config);
    }

    private IEnumerable<string> Names(string text) => Find(text).Takes.Select(t => t.Name);

    private string Problem(string text) => Assert.Throws<ConfigException>(() => Find(text)).Message.Replace(folder.Path + Path.DirectorySeparatorChar, "");
}
