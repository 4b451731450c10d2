using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Cli.Tests.Config;

public sealed class JointSettingsTests
{
    private const string Hands =
        """
        smooth: {method: butterworth, cutoff: 6 Hz}
        reduce: {tolerance: 0.5 deg, widest: 60 deg}
        joints:
          - names: ["*Hand", prop?]
            smooth: {cutoff: 12 Hz}
            reduce: {tolerance: 1 deg}
          - names: LeftHand
            smooth: savitzky-golay
            reduce: {tolerance: 2 deg}
          - names: "*Hand"
            fill: none
        """;

    [Fact]
    public void A_joint_that_no_entry_names_keeps_the_settings_of_the_session()
    {
        var settings = Reading.Config(Hands).SettingsFor("Hips");
        Assert.Equal(6, settings.Smooth.CutoffHertz);
        Assert.Equal(Math.PI / 360, settings.Reduce.Tolerance);
        Assert.Equal(FillMethod.GaussianProcess, settings.Fill.Method);
    }

    [Fact]
    public void An_entry_changes_its_keys_and_leaves_the_others()
    {
        var settings = Reading.Config(Hands).SettingsFor("RightHand");
        Assert.Equal(new SmoothSettings { Method = SmoothMethod.Butterworth, CutoffHertz = 12 }, settings.Smooth);
        Assert.Equal((Math.PI / 180, Math.PI / 3), (settings.Reduce.Tolerance, settings.Reduce.Widest));
        Assert.Equal(FillMethod.None, settings.Fill.Method);
    }

    [Fact]
    public void Later_entries_win_and_a_changed_method_clears_the_other_keys_of_its_block()
    {
        var settings = Reading.Config(Hands).SettingsFor("LeftHand");
        Assert.Equal(new SmoothSettings { Method = SmoothMethod.SavitzkyGolay }, settings.Smooth);
        Assert.Equal((Math.PI / 90, Math.PI / 3), (settings.Reduce.Tolerance, settings.Reduce.Widest));
    }

    [Fact]
    public void The_same_method_again_clears_nothing()
    {
        var config = Reading.Config("smooth: {method: butterworth, cutoff: 9 Hz}\njoints: [{names: x, smooth: butterworth}]");
        Assert.Equal(9, config.SettingsFor("x").Smooth.CutoffHertz);
    }

    [Fact]
    public void A_method_that_comes_back_comes_back_with_its_defaults()
    {
        var config = Reading.Config(
            "fill: {method: slerp, longest: 1 s}\njoints: [{names: x, fill: none}, {names: x, fill: slerp}]");
        Assert.Equal(new FillSettings { Method = FillMethod.Slerp }, config.SettingsFor("x").Fill);
    }

    [Theory]
    [InlineData("prop1", true)]
    [InlineData("prop12", false)]
    [InlineData("lefthand", false)]
    [InlineData("Hand", true)]
    [InlineData("HandLeft", false)]
    public void Names_are_globs_that_tell_upper_from_lower_case(string joint, bool isNamed) =>
        Assert.Equal(isNamed ? Math.PI / 180 : Math.PI / 360, Reading.Config(Hands).SettingsFor(joint).Reduce.Tolerance);

    [Fact]
    public void A_key_of_a_method_that_only_an_earlier_entry_brings_is_kept_for_joints_that_have_it()
    {
        var config = Reading.Config("joints: [{names: a, smooth: butterworth}, {names: '*', smooth: {cutoff: 8 Hz}}]");
        Assert.Equal(8, config.SettingsFor("a").Smooth.CutoffHertz);
        Assert.Equal(new SmoothSettings(), config.SettingsFor("b").Smooth);
    }

    [Fact]
    public void A_key_that_no_method_in_reach_knows_is_a_mistake()
    {
        var problems = Reading.ProblemsOf("joints: [{names: a, smooth: butterworth}, {names: b, smooth: {order: 2}}]");
        Assert.Equal("day.yaml:3:70: smooth.order belongs to method savitzky-golay, not adaptive or butterworth", problems);
    }

    [Fact]
    public void A_method_that_cannot_be_read_spares_its_keys_a_second_complaint()
    {
        var problems = Reading.ProblemsOf("smooth: {method: butter, cutoff: 6 Hz}");
        Assert.Single(problems.Split('\n'));
        Assert.Contains("smooth.method takes one of", problems, StringComparison.Ordinal);
    }
}
