using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Real motion, turned by hand and seen by cameras (Data/Smooth/turned-by-hand.csv, CC BY 4.0), with noise put on.</summary>
public sealed class OpenDataTests
{
    [Theory]
    [InlineData(0, 0.1, 0.85)]
    [InlineData(0, 0.5, 0.85)]
    [InlineData(0, 1.5, 0.85)]
    [InlineData(1, 0.1, 0.97)]
    [InlineData(1, 0.5, 0.97)]
    [InlineData(1, 1.5, 0.98)]
    public void Leaves_less_error_than_the_best_fixed_cutoff_chosen_with_the_truth_at_hand(int track, double noise, double ratio)
    {
        var truth = FilterChecks.TurnedByHand(track);
        var noisy = truth.Noisy(noise, 20);
        double Error(SmoothSettings settings) => NoisyMotion.Rms(NoisyMotion.Apart(truth, noisy.Smooth(settings).Tracks[0].Samples));
        var best = Enumerable.Range(0, 24).Min(k => Error(new() { Method = SmoothMethod.Butterworth, CutoffHertz = 2.5 * Math.Pow(1.15, k) }));
        Assert.InRange(Error(new()), 0, ratio * best);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Every_second_sample_of_clean_motion_hardly_moves(int track)
    {
        var samples = FilterChecks.TurnedByHand(track).Where((_, n) => n % 2 == 0).ToArray();
        Assert.InRange(NoisyMotion.Rms(NoisyMotion.Apart(samples, samples.Smooth(SmoothMethod.Adaptive))), 0, 0.05);
    }
}
