using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>How well motion in closed form comes through.</summary>
public sealed class SmoothedMotionTests
{
    [Theory]
    [InlineData(SmoothMethod.Adaptive)]
    [InlineData(SmoothMethod.Whittaker)]
    public void Smooth_motion_without_noise_stays(SmoothMethod method)
    {
        foreach (var frames in new[] { 10, 50, 1000 })
        {
            var samples = NoisyMotion.Swing(frames);
            Assert.InRange(NoisyMotion.Rms(NoisyMotion.Apart(samples, samples.Smooth(method))), 0, 1e-3);
        }
    }

    [Theory]
    [InlineData(4000)]
    [InlineData(8000)]
    public void A_fast_spin_loses_noise_and_gains_no_motion(double degreesASecond)
    {
        var truth = NoisyMotion.SpinUp(600, degreesASecond);
        Assert.InRange(NoisyMotion.Apart(truth, truth.Smooth(SmoothMethod.Adaptive)).Max(), 0, 0.05);
        var noisy = truth.Noisy(0.5, 11);
        var (before, after) = (NoisyMotion.Apart(truth, noisy), NoisyMotion.Apart(truth, noisy.Smooth(SmoothMethod.Adaptive)));
        Assert.InRange(NoisyMotion.Rms(after), 0, 0.8 * NoisyMotion.Rms(before));
        Assert.InRange(after.Max(), 0, before.Max());
    }

    [Fact]
    public void A_steady_turn_about_one_axis_keeps_its_pace_to_both_ends()
    {
        var truth = Some.Spin(500, 2);
        var error = NoisyMotion.Apart(truth, truth.Noisy(0.5, 5).Smooth(SmoothMethod.Adaptive));
        Assert.InRange(NoisyMotion.Rms(error[20..^20]), 0, 0.15);
        // No sag, no ringing: at the very ends no worse than a parabola through the last tenth of a second could be.
        Assert.InRange(Math.Max(error[0], error[^1]), 0, 0.9);
    }

    [Fact]
    public void Jitter_of_a_rest_nearly_goes_while_motion_on_both_sides_stays()
    {
        var truth = Enumerable.Range(0, 2000).Select(n => NoisyMotion.Swing(n / NoisyMotion.Rate, Share(n / NoisyMotion.Rate))).ToArray();
        var (rest, middle) = ((First: 500, Last: 1500), (First: 640, Last: 1360));
        var (errors, jitters) = (new List<double>(), new List<double>());
        for (var seed = 0; seed < 5; seed++)
        {
            var noisy = truth.Noisy(0.5, seed);
            var smoothed = noisy.Smooth(SmoothMethod.Adaptive);
            double Error(Quat[] q, int first, int last) => NoisyMotion.Rms(NoisyMotion.Apart(q, truth)[first..last]);
            double Jitter(Quat[] q) => NoisyMotion.Rms(NoisyMotion.Apart(q[1..], q)[rest.First..rest.Last]);
            errors.Add(Error(smoothed, middle.First, middle.Last) / Error(noisy, middle.First, middle.Last));
            jitters.Add(Jitter(smoothed) / Jitter(noisy));
            Assert.InRange(Error(smoothed, 0, 400) / Error(noisy, 0, 400), 0, 0.45);
        }

        Assert.All(jitters, j => Assert.InRange(j, 0, 0.02));
        Assert.InRange(errors.Average(), 0, 0.1);

        // Seven seconds of rest, from frame 500, eased in and out over half a second.
        static double Share(double t)
        {
            var x = Math.Clamp((t < 7 ? 3.5 - t : t - 10.5) / 0.5, 0, 1);
            return x * x * x * (10 - (15 * x) + (6 * x * x));
        }
    }

    [Theory]
    [MemberData(nameof(NoisyMotion.Methods), MemberType = typeof(NoisyMotion))]
    public void An_irregular_clock_is_taken_at_its_word(SmoothMethod method)
    {
        var random = new Random(9);
        var times = Enumerable.Range(0, 800).Select(n => (n + (0.9 * random.NextDouble())) / 100).ToArray();
        var truth = times.Select(t => NoisyMotion.Swing(t)).ToArray();
        var take = Some.Take(100, Some.Track("clean", truth), Some.Track("noisy", truth.Noisy(0.3, 2)));
        var settings = new SmoothSettings { Method = method, CutoffHertz = 12 };
        var irregular = take with { Clock = new Clock { Delivered = [.. times], Steady = [.. times], Rate = 100, IsRegular = false } };
        double Error(Take t, int joint) => NoisyMotion.Rms(NoisyMotion.Apart(truth, t.Smooth(settings).Tracks[joint].Samples));
        // Half the error of taking the frames as even, and not far from what the same motion leaves on an even clock.
        var even = Enumerable.Range(0, 800).Select(n => NoisyMotion.Swing(n / 100.0)).ToArray();
        var onEven = NoisyMotion.Rms(NoisyMotion.Apart(even, Some.Take(100, Some.Track("even", even.Noisy(0.3, 2))).Smooth(settings).Tracks[0].Samples));
        Assert.InRange(Error(irregular, 0), 0, 0.5 * Error(take, 0));
        Assert.InRange(Error(irregular, 1), 0, 1.25 * onEven);
    }
}
