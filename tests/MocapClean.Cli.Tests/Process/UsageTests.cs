using MocapClean.Cli.Tests.Support;
using Xunit;

namespace MocapClean.Cli.Tests.Process;

/// <summary>What ends with code 2 before anything is written, each with a line that says why.</summary>
public sealed class UsageTests : IDisposable
{
    private readonly TempFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void No_verb_and_a_wrong_option_and_a_bad_number_of_workers()
    {
        Refused("command");
        Refused("--wrokers", "run", folder.Put("in/a.csv", Takes.Wide()), "--wrokers", "2");
        Refused("--workers", "run", folder["in"], "--out", folder["out"], "--workers", "0");
        Refused("--workers", "run", folder["in"], "--out", folder["out"], "--workers", "x");
    }

    [Fact]
    public void Configs_that_cannot_be_read()
    {
        Refused("empty", "run", folder.Put("empty.yaml", ""));
        Directory.CreateDirectory(folder["folder.yaml"]);
        Refused("folder", "run", folder["folder.yaml"]);
        Refused("nothing.yaml", "run", folder["nothing.yaml"]);
        Refused("file.yaml", "run", Path.Combine(folder.Put("file", "x"), "file.yaml"));
    }

    [Fact]
    public void Paths_and_outputs_that_do_not_go_together()
    {
        folder.Put("in/a.csv", Takes.Wide());
        Refused("--out", "run", folder["in"]);
        Refused("no such", "run", folder["elsewhere"], "--out", folder["out"]);
        Refused("output folder", "run", folder["in"], "--out", folder["in"]);
        Refused("output folder", "run", folder["in"], "--out", folder.Path);
        Refused("cannot be written", "run", folder["in"], "--out", folder.Put("file", "x"));
        Refused("no take", "run", folder.Put("none.yaml", "ingest: { takes: \"nowhere/*.csv\" }\noutput: { folder: out }\n"));
        Refused("--only", "run", folder["in"], "--out", folder["out"], "--only", "b*");
    }

    [Fact]
    public void Takes_already_in_the_output_folder_are_never_written_over()
    {
        var take = folder.Put("in/out/takes/a.csv", Takes.Wide());
        Refused("output folder", "run", folder["in"], "--out", folder["in/out"]);
        Assert.Equal(Takes.Wide(), File.ReadAllText(take));
    }

    [Fact]
    public void A_link_inside_the_output_folder_does_not_lead_to_the_source()
    {
        var take = folder.Put("in/a.csv", Takes.Wide());
        Directory.CreateDirectory(folder["linked"]);
        Directory.CreateSymbolicLink(folder["linked/takes"], folder["in"]);
        Refused("outside the output folder", "run", folder["in"], "--out", folder["linked"]);
        Assert.Equal(Takes.Wide(), File.ReadAllText(take));
    }

    [Fact]
    public void Takes_that_are_not_there_and_a_demo_over_files()
    {
        Refused("no such file", "diff", folder["a.csv"], folder["b.csv"]);
        Refused("is a folder", "inspect", folder.Path);
        folder.Put("full/session.yaml", "mine");
        Refused("not empty", "demo", folder["full"]);
    }

    [Fact]
    public void Two_takes_that_would_write_one_file()
    {
        folder.Put("in/a.csv", Takes.Wide());
        folder.Put("in/A.csv", Takes.Wide());
        Refused("A.csv", "run", folder["in"], "--out", folder["out"]);
    }

    [Fact]
    public void An_output_folder_in_use()
    {
        folder.Put("in/a.csv", Takes.Wide());
        Directory.CreateDirectory(folder["out/log"]);
        using var held = Batch.FolderLock.TryTake(folder["out/log/lock"]);
        Refused("in use", "run", folder["in"], "--out", folder["out"]);
    }

    [Fact]
    public void Five_mistakes_of_a_config_are_told_at_once()
    {
        var config = folder.Put("bad.yaml", """
            ingest: { takes: "in/*.csv" }
            output: { folder: out }
            smoth: none
            outliers:
              threshold: 6 Hz
              top-sped: 1000 deg/s
            fill: { longest: -5 ms }
            reduce: 5
            """);
        var result = Tool.Run("settings", config);
        Assert.Equal(2, result.Code);
        Assert.Equal(["3:1", "5:14", "6:3", "7:18", "8:9"], result.ErrorLines.Select(l => string.Join(':', l[(config.Length + 1)..].Split(':')[..2])));
    }

    private void Refused(string mention, params string[] args)
    {
        var result = Tool.Run(args);
        Assert.True(result.Code == 2, $"exit {result.Code} for {string.Join(' ', args)}\n{result.Error}\n{result.Output}");
        Assert.Contains(mention, result.Error, StringComparison.OrdinalIgnoreCase);
        Assert.False(Directory.Exists(folder["out/takes"]), "something was written");
    }
}
