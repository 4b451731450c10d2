using System.Text.Json;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Demo;
using MocapClean.Cli.Tests.Support;
using Xunit;

namespace MocapClean.Cli.Tests.Process;

/// <summary>The main job through the real process, on the invented session.</summary>
public sealed class RunTests : IDisposable
{
    private readonly TempFolder folder = new();

    public RunTests() => DemoSession.Write(new FolderOutput(folder["demo"]), seed: 7);

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Every_take_gets_its_outputs_and_the_source_is_left_alone()
    {
        var before = folder.Content("demo");
        var result = Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]);
        Assert.True(result.Code == 0, result.Error);
        Assert.Equal(before, folder.Content("demo"));
        foreach (var take in before.Keys.Where(k => k.StartsWith("takes/", StringComparison.Ordinal)).Select(k => k["takes/".Length..]))
        {
            Assert.True(File.Exists(folder[$"out/takes/{take}"]), take);
            Assert.True(File.Exists(folder[$"out/keys/{take}.keys.csv"]), take);
            Assert.True(File.Exists(folder[$"out/reports/{take}.diff.csv"]), take);
            Assert.True(File.Exists(folder[$"out/reports/{take}.diff.json"]), take);
            Assert.Contains(take, result.Output, StringComparison.Ordinal);
        }

        using var session = JsonDocument.Parse(File.ReadAllText(folder["out/session.json"]));
        Assert.Equal(6, session.RootElement.GetProperty("takes").GetArrayLength());
        Assert.Contains("14:21:", File.ReadAllText(folder["out/reshoot.csv"]), StringComparison.Ordinal);
        Assert.Empty(Directory.GetFiles(folder["out"], "*" + FolderOutput.Unfinished, SearchOption.AllDirectories));
    }

    [Fact]
    public void Outputs_are_the_same_bytes_for_any_workers_locale_time_zone_and_for_resumed_runs()
    {
        var config = folder["demo/session.yaml"];
        Assert.Equal(0, Tool.Run("run", config, "--out", folder["one"], "--workers", "1").Code);
        var elsewhere = new Dictionary<string, string> { ["LANG"] = "de_DE.UTF-8", ["LC_ALL"] = "de_DE.UTF-8", ["TZ"] = "Pacific/Chatham" };
        Assert.Equal(0, Tool.Run(elsewhere, "run", config, "--out", folder["two"], "--workers", "3").Code);
        Assert.Equal(0, Tool.Run("run", config, "--out", folder["three"], "--only", "yard/**").Code);
        Assert.Equal(0, Tool.Run("run", config, "--out", folder["three"], "--only", "shed/**").Code);
        var one = folder.Content("one");
        Same(one, folder.Content("two"));
        Same(one, folder.Content("three"));
    }

    [Fact]
    public void A_second_run_does_only_what_is_new_or_changed()
    {
        var config = folder["demo/session.yaml"];
        Tool.Run("run", config, "--out", folder["out"]);
        var first = folder.Content("out");
        Assert.Equal(6, Count(Tool.Run("run", config, "--out", folder["out"]).Output, "(done earlier)"));
        File.Delete(folder["out/takes/yard/lantern-walk_01.csv"]);
        File.AppendAllText(folder["out/reports/shed/quiet-hold_02.csv.diff.csv"], "x");
        Assert.Equal(4, Count(Tool.Run("run", config, "--out", folder["out"]).Output, "(done earlier)"));
        Same(first, folder.Content("out"));
        Assert.Equal(0, Count(Tool.Run("run", config, "--out", folder["out"], "--fresh").Output, "(done earlier)"));
        Same(first, folder.Content("out"));
    }

    [Fact]
    public void A_torn_journal_line_and_half_written_files_are_survived()
    {
        var config = folder["demo/session.yaml"];
        Tool.Run("run", config, "--out", folder["out"]);
        var first = folder.Content("out");
        var journal = folder["out/log/journal.jsonl"];
        File.WriteAllBytes(journal, File.ReadAllBytes(journal)[..^40]);
        folder.Put("out/takes/yard/lantern-walk_01.csv" + FolderOutput.Unfinished, "half");
        Assert.Equal(5, Count(Tool.Run("run", config, "--out", folder["out"]).Output, "(done earlier)"));
        Same(first, folder.Content("out"));
    }

    [Fact]
    public void Only_does_not_shrink_the_session_report_and_leftovers_are_named()
    {
        var config = folder["demo/session.yaml"];
        Tool.Run("run", config, "--out", folder["out"]);
        folder.Put("out/takes/old.csv", "x");
        var result = Tool.Run("run", config, "--out", folder["out"], "--only", "shed/*.bvh");
        Assert.Equal(1, Count(result.Output, "(done earlier)"));
        Assert.Contains("left over in the output folder: takes/old.csv", result.Output, StringComparison.Ordinal);
        using var session = JsonDocument.Parse(File.ReadAllText(folder["out/session.json"]));
        Assert.Equal(6, session.RootElement.GetProperty("takes").GetArrayLength());
    }

    [Fact]
    public void A_changed_source_is_out_of_date_until_it_is_done_again()
    {
        var config = folder["demo/session.yaml"];
        Tool.Run("run", config, "--out", folder["out"]);
        File.AppendAllText(folder["demo/takes/yard/lantern-walk_01.csv"], "\n");
        var result = Tool.Run("run", config, "--out", folder["out"], "--only", "shed/*.bvh");
        Assert.Contains("out of date: yard/lantern-walk_01.csv", result.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_dry_run_writes_nothing_and_says_the_same()
    {
        var result = Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"], "--dry-run");
        Assert.Equal(0, result.Code);
        Assert.False(Directory.Exists(folder["out"]));
        var wet = Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]);
        Assert.Equal(Lines(wet), Lines(result));
    }

    [Fact]
    public void Strict_ends_with_three_when_a_reshoot_is_suggested()
    {
        Assert.Equal(3, Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"], "--strict").Code);
        folder.Put("demo/takes/bad.csv", "");
        Assert.Equal(1, Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"], "--strict").Code);
    }

    [Fact]
    public void A_folder_without_a_config_is_cleaned_with_the_defaults()
    {
        var result = Tool.Run("run", folder["demo/takes"], "--out", folder["out"]);
        Assert.True(result.Code == 0, result.Error);
        Assert.True(File.Exists(folder["out/takes/shed/lid-swing_03.bvh"]));
        Assert.DoesNotContain(":", File.ReadAllLines(folder["out/reshoot.csv"])[1].Split(',')[4], StringComparison.Ordinal);
    }

    [Fact]
    public void Quiet_prints_no_line_for_each_take()
    {
        var result = Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"], "--quiet");
        Assert.DoesNotContain(result.Output.Split('\n'), l => l.StartsWith("yard/", StringComparison.Ordinal) || l.StartsWith("shed/", StringComparison.Ordinal));
        Assert.Empty(result.Error);
        Assert.Contains("verdicts:", result.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void The_first_terminate_signal_lets_the_run_end_in_order()
    {
        // The first line of a take is printed while the others wait or are being done.
        using var process = Tool.Start([], "run", folder["demo/session.yaml"], "--out", folder["out"], "--workers", "1");
        Assert.Contains(".bvh", process.StandardOutput.ReadLine(), StringComparison.Ordinal);
        System.Diagnostics.Process.Start("kill", ["-TERM", process.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]).WaitForExit();
        Assert.True(process.WaitForExit(60_000));
        Assert.Equal(143, process.ExitCode);
        Assert.True(File.Exists(folder["out/session.json"]));
        Assert.Empty(Directory.GetFiles(folder["out"], "*" + FolderOutput.Unfinished, SearchOption.AllDirectories));
        Assert.Equal(0, Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]).Code);
        Assert.Equal(0, Tool.Run("run", folder["demo/session.yaml"], "--out", folder["undisturbed"]).Code);
        Same(folder.Content("undisturbed"), folder.Content("out"));
    }

    [Fact]
    public void A_watch_begins_before_the_first_take_and_waits_for_one_to_settle()
    {
        Directory.CreateDirectory(folder["in"]);
        using var process = Tool.Start([], "run", folder["in"], "--out", folder["out"], "--follow");
        while (process.StandardError.ReadLine() is { } line && !line.StartsWith("following", StringComparison.Ordinal))
        {
        }

        folder.Put("in/late.csv", Takes.Wide());
        Assert.Contains("late.csv", process.StandardOutput.ReadLine(), StringComparison.Ordinal);
        // Not INT: a process that was started in the background of a script has it ignored.
        System.Diagnostics.Process.Start("kill", ["-TERM", process.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]).WaitForExit();
        Assert.True(process.WaitForExit(60_000));
        Assert.Equal(143, process.ExitCode);
        Assert.True(File.Exists(folder["out/takes/late.csv"]));
    }

    [Fact]
    public void A_slate_row_changes_its_own_take_only_and_one_outside_the_take_is_said()
    {
        var slates = folder["demo/slates.csv"];
        Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]);
        File.WriteAllText(slates, File.ReadAllText(slates).Replace("yard/roof-drop_03.csv,0,14:21:05:00,20,579", "yard/roof-drop_03.csv,5000,14:21:05:00,9000,9500", StringComparison.Ordinal));
        var result = Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]);
        Assert.Equal(0, result.Code);
        Assert.Equal(5, Count(result.Output, "(done earlier)"));
        Assert.Contains("no time code", result.Error, StringComparison.Ordinal);
        Assert.Contains("the whole take counts", result.Error, StringComparison.Ordinal);
        Assert.Contains("yard/roof-drop_03.csv  re-shoot", result.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_take_that_fails_stays_in_the_report_of_later_runs_and_its_old_outputs_are_named()
    {
        Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]);
        folder.Put("demo/takes/yard/lantern-walk_01.csv", "");
        Assert.Equal(1, Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"]).Code);
        var result = Tool.Run("run", folder["demo/session.yaml"], "--out", folder["out"], "--only", "shed/**");
        Assert.Equal(1, result.Code);
        Assert.Contains("not processed: yard/lantern-walk_01.csv", result.Output, StringComparison.Ordinal);
        Assert.Contains("takes/yard/lantern-walk_01.csv", result.Output[result.Output.IndexOf("left over", StringComparison.Ordinal)..], StringComparison.Ordinal);
    }

    [Fact]
    public void Joints_that_no_take_has_and_the_reason_of_each_verdict_are_told()
    {
        folder.Put("demo/typo.yaml", "ingest: { takes: takes }\noutput: { folder: ../out }\nreshoot: { critical: pelvsi }\njoints: [ { names: hand_x, smooth: none } ]\n");
        var result = Tool.Run("run", folder["demo/typo.yaml"]);
        Assert.Equal(0, result.Code);
        Assert.Contains("mistyped? reshoot.critical: 'pelvsi' matches no joint", result.Output, StringComparison.Ordinal);
        Assert.Contains("mistyped? joints: 'hand_x' matches no joint", result.Output, StringComparison.Ordinal);
        Assert.Contains("re-shoot  yard/roof-drop_03.csv: ", result.Output, StringComparison.Ordinal);
        Assert.Contains("not filled: too long", File.ReadAllText(folder["out/reports/yard/roof-drop_03.csv.diff.csv"]), StringComparison.Ordinal);
    }

    [Fact]
    public void Outputs_of_another_run_are_no_takes()
    {
        Assert.Equal(0, Tool.Run("run", folder["demo/takes"], "--out", folder["demo/takes/earlier"]).Code);
        var result = Tool.Run("run", folder["demo/takes"], "--out", folder["out"]);
        Assert.Equal(0, result.Code);
        Assert.Contains("earlier: an output folder of another run is not searched", result.Error, StringComparison.Ordinal);
        Assert.False(Directory.Exists(folder["out/takes/earlier"]));
    }

    [Fact]
    public void What_inspect_prints_about_one_take_is_a_config_that_runs()
    {
        var odd = folder.Put("odd.csv", Takes.Wide().Replace(".q", "_rot_", StringComparison.Ordinal));
        var look = Tool.Run("inspect", odd);
        Assert.Equal(0, look.Code);
        Assert.Contains("2 joints, 60 frames, 100 Hz", look.Output, StringComparison.Ordinal);
        var result = Tool.Run("run", folder.Put("odd.yaml", look.Output));
        Assert.True(result.Code == 0, result.Error);
        Assert.True(File.Exists(folder["cleaned/takes/odd.csv"]));
    }

    [Fact]
    public void A_flag_only_config_changes_no_orientation()
    {
        folder.Put("demo/flags.yaml", "ingest: { takes: takes }\noutput: { folder: ../out }\nfill: none\nsmooth: none\n");
        Assert.Equal(0, Tool.Run("run", folder["demo/flags.yaml"]).Code);
        using var session = JsonDocument.Parse(File.ReadAllText(folder["out/session.json"]));
        Assert.All(session.RootElement.GetProperty("takes").EnumerateArray(), t =>
        {
            var samples = t.GetProperty("samples");
            Assert.Equal(0, samples.GetProperty("mended").GetInt64() + samples.GetProperty("smoothed").GetInt64());
        });
    }

    private static IEnumerable<string> Lines(ToolResult result) => result.Output.Split('\n').SkipLast(2).Order();

    private static int Count(string text, string part) => text.Split(part).Length - 1;

    private static void Same(SortedDictionary<string, byte[]> a, SortedDictionary<string, byte[]> b)
    {
        Assert.Equal(a.Keys, b.Keys);
        Assert.All(a, file => Assert.True(file.Value.AsSpan().SequenceEqual(b[file.Key]), file.Key));
    }
}
