using MocapClean.Cli.Tests.Support;
using MocapClean.Cli.Config;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class ConfigReaderTests
{
    [Fact]
    public void Two_lines_are_enough()
    {
        var config = Reading.Config();
        Assert.Equal("day", config.Title);
        Assert.Equal(["takes"], config.Source.Takes);
        Assert.Equal(Path.GetFullPath("out"), config.OutputFolder);
        Assert.Equal(new(), config.SettingsFor("hips"));
    }

    [Fact]
    public void Every_key_reaches_its_setting()
    {
        var config = ConfigReader.Parse(
            """
            session: Duel
            ingest:
              takes: ["a/*.csv", "b/*.bvh"]
              except: "*x*"
              root: a
              orientations: local
              rate: 119.88 Hz
              csv: {layout: long, joint-columns: "{joint}_{component}", components: [w, x, y, z], time: t}
              bvh: {rest-frame: as-motion}
              off-unit: 0.5 %
            time-code: {rate: 29.97, drop-frame: true, slates: slates.csv}
            output: {folder: results, keys: csv, first-frame: 1}
            outliers: {threshold: 8 spreads, top-speed: 9000 deg/s, longest-spike: 40 ms, longest-offset: 12 frames, freeze: 6 frames}
            fill: {method: slerp, longest: 1 s, widest: 45 deg, worst: 2 deg}
            smooth: {method: butterworth, cutoff: 6 Hz}
            reduce: {tolerance: 0.25 deg, playback: component-linear, widest: 60 deg, longest: 240 frames}
            reshoot: {bad-frames: 5 %, critical: [hips, "*Foot"], critical-frames: 1 frame, ignore: prop, before: 2 s, after: 250 ms}
            limits: {take-size: 300 MB}
            """,
            "day.yaml");
        Assert.Equal("Duel", config.Title);
        Assert.Equal(["a/*.csv", "b/*.bvh"], config.Source.Takes);
        Assert.Equal(["*x*"], config.Source.Except);
        Assert.Equal("a", config.Source.Root);
        Assert.Equal((OrientationSpace.Local, 119.88, "long"), (config.Source.Read.Space, config.Source.Read.Rate, config.Source.Read.CsvLayout));
        Assert.Equal(("{joint}_{component}", "t"), (config.Source.Read.CsvJointColumns, config.Source.Read.CsvTime));
        Assert.Equal(["w", "x", "y", "z"], config.Source.Read.CsvComponents);
        Assert.Equal(new TimeCodeSettings { Rate = "29.97", IsDropFrame = true, Slates = "slates.csv" }, config.TimeCode);
        Assert.Equal(("results", 1), (config.Output.Folder, config.Output.FirstFrame));
        Assert.Equal((0.05, 1), (config.Reshoot.BadFrames, config.Reshoot.CriticalFrames));
        Assert.Equal(["hips", "*Foot"], config.Reshoot.Critical);
        Assert.Equal(["prop"], config.Reshoot.Ignore);
        Assert.Equal((Extent.Seconds(2), Extent.Seconds(0.25)), (config.Reshoot.Before, config.Reshoot.After));
        Assert.Equal(300_000_000, config.Limits.TakeSize);
        AssertStages(config);
    }

    private static void AssertStages(SessionConfig config)
    {
        var stages = config.SettingsFor("hips");
        Assert.Equal((0.005, false), (stages.Ingest.OffUnit, stages.Ingest.RecogniseRestPose));
        Assert.Equal(
            new OutliersSettings
            {
                Threshold = 8,
                TopSpeed = Math.PI * 50,
                LongestSpike = Extent.Seconds(0.04),
                LongestOffset = Extent.Frames(12),
                Freeze = Extent.Frames(6),
            },
            stages.Outliers);
        Assert.Equal(new FillSettings { Method = FillMethod.Slerp, Longest = Extent.Seconds(1), Widest = Math.PI / 4, Worst = Math.PI / 90 }, stages.Fill);
        Assert.Equal(new SmoothSettings { Method = SmoothMethod.Butterworth, CutoffHertz = 6 }, stages.Smooth);
        Assert.Equal(
            new ReduceSettings { Tolerance = Math.PI / 720, Playback = Playback.ComponentLinear, Widest = Math.PI / 3, Longest = Extent.Frames(240) },
            stages.Reduce);
    }

    [Fact]
    public void Five_mistakes_are_told_at_once_in_order_with_their_places()
    {
        var problems = Reading.Problems(
            """
            ingest: {takes: "*.csv"}
            output: {folder: out}
            smoth:
              method: butterworth
              cutof: 6 Hz
            outliers:
              threshold: 6 deg
            reduce:
              tolerance: [1]
            fill: 5
            """);
        Assert.Equal(
            """
            day.yaml:3:1: unknown key 'smoth'; did you mean 'smooth'?
            day.yaml:5:3: unknown key 'smooth.cutof'; did you mean 'cutoff'?
            day.yaml:7:14: outliers.threshold takes a number of spreads such as '6 spreads', not '6 deg'
            day.yaml:9:14: reduce.tolerance takes an angle such as '0.5 deg', not a list
            day.yaml:10:7: fill.method takes one of gaussian-process, spline, slerp or none, not '5'
            """.ReplaceLineEndings("\n"),
            problems);
    }

    [Theory]
    [InlineData("reduce: {tolerance: 0.5}", "3:21: reduce.tolerance takes an angle such as '0.5 deg', not '0.5': its unit is missing")]
    [InlineData("reduce: {tolerance: 120 deg}", "3:21: reduce.tolerance goes from 0.001 deg to 90 deg, not '120 deg'")]
    [InlineData("reduce: {tolerance: -1 deg}", "3:21: reduce.tolerance goes from 0.001 deg to 90 deg, not '-1 deg'")]
    [InlineData("reduce: {tolerance: '0,5 deg'}", "3:21: reduce.tolerance: '0,5 deg' has a comma; write a decimal point, and nothing between thousands")]
    [InlineData("reduce: {tolerance: .nan}", "3:21: reduce.tolerance takes an angle such as '0.5 deg', not '.nan'")]
    [InlineData("reduce: {tolerance: 1e999 deg}", "3:21: reduce.tolerance goes from 0.001 deg to 90 deg, not '1e999 deg'")]
    [InlineData("reduce: {tolerance: }", "3:21: reduce.tolerance takes an angle such as '0.5 deg', not nothing")]
    [InlineData("reduce: {tolerance: {deg: 1}}", "3:21: reduce.tolerance takes an angle such as '0.5 deg', not a block of keys")]
    [InlineData("outliers: {top-speed: '12,000 deg/s'}", "3:23: outliers.top-speed: '12,000 deg/s' has a comma; write a decimal point, and nothing between thousands")]
    [InlineData("outliers: {longest-spike: 2.5 frames}", "3:27: outliers.longest-spike takes whole frames, not '2.5 frames'")]
    [InlineData("outliers: {longest-spike: 2 min}", "3:27: outliers.longest-spike takes frames or a time such as '8 frames', not '2 min'")]
    [InlineData("outliers: {longest-offset: 200000000 ms}", "3:28: outliers.longest-offset goes from 0 ms to 100000000 ms, not '200000000 ms'")]
    [InlineData("smooth: {method: butterworth, cutoff: 6}", "3:39: smooth.cutoff takes a frequency such as '6 Hz' or the word auto, not '6': its unit is missing")]
    [InlineData("smooth: {method: savitzky-golay, order: 3.5}", "3:41: smooth.order takes a whole number from 0 to 7, not '3.5'")]
    [InlineData("smooth: {method: savitzky-golay, order: 0x3}", "3:41: smooth.order takes a whole number from 0 to 7, not '0x3'")]
    [InlineData("smooth: {method: savitzky-golay, order: 9}", "3:41: smooth.order goes from 0 to 7, not '9'")]
    [InlineData("smooth: butterwort", "3:9: smooth.method takes one of adaptive, whittaker, butterworth, savitzky-golay or none, not 'butterwort'; did you mean 'butterworth'?")]
    [InlineData("smooth: {cutoff: 6 Hz}", "3:18: smooth.cutoff belongs to method butterworth, not adaptive")]
    [InlineData("fill: {method: none, worst: 3 deg}", "3:29: fill.worst belongs to methods gaussian-process, spline and slerp, not none")]
    [InlineData("smooth: [1]", "3:9: smooth takes a block of keys or a method, not a list")]
    [InlineData("limits: 3 GB", "3:9: limits takes a block of keys, not '3 GB'")]
    [InlineData("limits: {take-size: 4 GB}", "3:21: limits.take-size goes from 1 kB to 2 GB, not '4 GB'")]
    [InlineData("time-code: {rate: 29.97, drop-frame: yes}", "3:38: time-code.drop-frame takes true or false, not 'yes'")]
    [InlineData("time-code: {rate: 25, drop-frame: true}", "3:35: time-code.drop-frame goes with time-code.rate 29.97 or 59.94 only")]
    [InlineData("time-code: {slates: s.csv}", "3:21: time-code.slates needs time-code.rate")]
    [InlineData("time-code: {rate: 25, slates: s.csv, column: tc}", "3:46: give time-code.slates or time-code.column, not both")]
    [InlineData("tolerance: 1 deg", "3:1: unknown key 'tolerance'; did you mean 'reduce.tolerance'?")]
    [InlineData("Smooth: none", "3:1: unknown key 'Smooth'; did you mean 'smooth'?")]
    [InlineData("time_code: {rate: 25}", "3:1: unknown key 'time_code'; did you mean 'time-code'?")]
    [InlineData("decisions: d.csv", "3:1: unknown key 'decisions'")]
    [InlineData("reshoot: {critical: [hips, [a]]}", "3:21: reshoot.critical takes a text or a list of texts, not a list with a list in it")]
    [InlineData("joints: {names: x}", "3:9: joints takes a list of entries, each starting with a dash, not a block of keys")]
    [InlineData("joints: [hips]", "3:10: an entry of joints is a block with names and settings, not 'hips'")]
    [InlineData("joints: [{smooth: none}]", "3:10: names is missing; give a text or a list of texts, such as \"hand_*\"")]
    [InlineData("joints: [{names: x, ingest: {takes: y}}]", "3:21: unknown key 'ingest'")]
    public void A_mistake_is_told_with_its_place(string line, string expected) => Assert.Equal("day.yaml:" + expected, Reading.ProblemsOf(line));

    [Theory]
    [InlineData("ingest: {takes: x}", "day.yaml:1:1: output.folder is missing; give a text, such as out")]
    [InlineData("ingest:\noutput: {folder: out}", "day.yaml:1:1: ingest.takes is missing; give a text or a list of texts, such as takes/**/*.csv")]
    [InlineData("ingest: {takes: []}\noutput: {folder: out}", "day.yaml:1:17: ingest.takes takes a text or a list of texts, not an empty list")]
    [InlineData("output: {folder: out, keys: [csv, cvs]}\ningest: {takes: x}", "day.yaml:1:29: output.keys takes a list of csv, not 'cvs'; did you mean 'csv'?")]
    [InlineData("output: {folder: ' '}\ningest: {takes: x}", "day.yaml:1:18: output.folder takes a text, not ' '")]
    [InlineData("output: {folder: out}\ningest: {takes: x, csv: {components: [w, x, y]}}", "day.yaml:2:38: ingest.csv.components takes a list of 4 different texts, not [w, x, y]")]
    [InlineData("output: {folder: out}\ningest: {takes: x, csv: {joint-columns: '{joint}'}}", "day.yaml:2:41: ingest.csv.joint-columns takes a text with {joint} and {component} in it, not '{joint}'")]
    [InlineData("just words", "day.yaml:1:1: a config is a block of keys, not 'just words'")]
    public void What_is_needed_must_be_there(string text, string expected) => Assert.Equal(expected, Reading.Problems(text));

    [Theory]
    [InlineData("smooth: none")]
    [InlineData("smooth: {method: none}")]
    [InlineData("smooth:\n  method: \"none\"")]
    public void A_word_alone_means_its_method(string text) => Assert.Equal(SmoothMethod.None, Reading.Config(text).SettingsFor("x").Smooth.Method);

    [Theory]
    [InlineData("smooth:")]
    [InlineData("joints:")]
    [InlineData("smooth: ~\nfill: {}")]
    public void A_block_with_nothing_in_it_changes_nothing(string text) => Assert.Equal(new(), Reading.Config(text).SettingsFor("x"));

    [Theory]
    [InlineData("0.25 deg")]
    [InlineData("0.25deg")]
    [InlineData("\"0.25 deg\"")]
    [InlineData(".25 deg")]
    [InlineData("+25e-2 deg")]
    public void A_number_may_be_written_in_several_ways(string text) =>
        Assert.Equal(Math.PI / 720, Reading.Config($"reduce: {{tolerance: {text}}}").SettingsFor("x").Reduce.Tolerance);

    [Fact]
    public void A_byte_order_mark_and_other_line_ends_do_no_harm()
    {
        using var folder = new TempFolder();
        var path = folder.Put("day.yaml", "\uFEFF" + Reading.Least.ReplaceLineEndings("\r\n"));
        Assert.Equal(folder.Path, ConfigReader.Load(path).Folder);
    }

    [Fact]
    public void A_file_that_is_no_config_is_refused_in_one_line()
    {
        using var folder = new TempFolder();
        Assert.Equal($"{folder.Path}: is a folder; a config file is needed here", Message(folder.Path));
        var missing = Path.Combine(folder.Path, "no.yaml");
        Assert.Equal($"{missing}: no such file", Message(missing));
        var large = folder.Put("large.yaml", "# " + new string('x', 1_000_000));
        Assert.Equal($"{large}: larger than 1 MB; this is no config", Message(large));
        var binary = Path.Combine(folder.Path, "binary.yaml");
        File.WriteAllBytes(binary, [0x61, 0x3A, 0xFF, 0xFE, 0xC0]);
        Assert.Equal($"{binary}: not UTF-8 text", Message(binary));
    }

    private static string Message(string path) => Assert.Throws<ConfigException>(() => ConfigReader.Load(path)).Message;
}
