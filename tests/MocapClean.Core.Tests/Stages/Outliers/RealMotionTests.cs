using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Outliers;

/// <summary>Real fast motion is not a fault.</summary>
public sealed class RealMotionTests
{
    [Theory]
    [InlineData(60, 0.03)]
    [InlineData(120, 0.03)]
    [InlineData(240, 0.03)]
    [InlineData(120, 0)]
    [InlineData(240, 0.1)]
    public void A_fight_with_blows_spins_and_a_landing_has_no_finding(double rate, double noise)
    {
        for (var seed = 1u; seed <= 3; seed++)
        {
            Assert.Equal("", Search.Rows(Search.Run(rate, Motion.Sample(Motion.Fight, rate, 10, noise, seed))));
        }
    }

    [Theory]
    [InlineData(30)]
    [InlineData(60)]
    [InlineData(142.857)]
    [InlineData(480)]
    public void Swinging_at_any_rate_has_no_finding(double rate) =>
        Assert.Equal("", Search.Rows(Search.Run(rate, Motion.Sample(Motion.Swing, rate, 12))));

    [Theory]
    [InlineData(0)]
    [InlineData(0.03)]
    public void A_long_rest_and_the_start_after_it_have_no_finding(double noise)
    {
        static Quat StartAfterRest(double t) => t < 6 ? Motion.Swing(0) : Motion.Swing(t - 6);
        Assert.Equal("", Search.Rows(Search.Run(120, Motion.Sample(StartAfterRest, 120, 10, noise))));
    }

    [Fact]
    public void A_joint_that_never_moves_has_no_finding() =>
        Assert.Equal("", Search.Rows(Search.Run(120, Motion.Sample(_ => Motion.Swing(1), 120, 5, noise: 0))));

    [Fact]
    public void A_take_of_a_few_frames_has_no_finding()
    {
        for (var frames = 1; frames < 12; frames++)
        {
            var samples = Motion.Sample(Motion.Swing, 120, 1)[..frames];
            Assert.Equal("", Search.Rows(Search.Run(120, samples)));
        }
    }

    [Fact]
    public void Easing_into_a_hold_without_any_noise_and_out_of_it_is_no_freeze()
    {
        static double Ease(double x) => x <= 0 ? 0 : x >= 1 ? 1 : x * x * x * (10 - (15 * x) + (6 * x * x));
        static Quat Hold(double t) => Motion.Turn(0, 0, 1, 90 * (Ease(t - 1) - Ease(t - 3)));
        Assert.Equal("", Search.Rows(Search.Run(120, Motion.Sample(Hold, 120, 5, noise: 0))));
    }

    [Fact]
    public void Samples_without_a_finding_stay_as_they_were()
    {
        var take = Motion.Take(120, Motion.Sample(Motion.Fight, 120, 10));
        var track = Search.Run(take).Tracks[0];
        Assert.Equal(take.Tracks[0].Samples, track.Samples);
        Assert.All(track.States, s => Assert.Equal(SampleState.Good, s));
        Assert.Empty(track.Breaks);
    }
}
