using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Reduce;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Reduce;

public sealed class KeyPlaybackTests
{
    private static readonly Quat Quarter = RotationVector.Exp(new(Math.PI / 2, 0, 0));

    [Fact]
    public void Slerp_turns_at_constant_speed_along_the_shorter_arc()
    {
        var played = KeyPlayback.At(Playback.Slerp, Quat.Identity, -Quarter, 0.25);
        Assert.Equal(0, Angle.Between(RotationVector.Exp(new(Math.PI / 8, 0, 0)), played), 1e-15);
    }

    [Fact]
    public void Component_linear_is_slow_at_the_ends_and_plays_signs_as_written()
    {
        // tan of half the turn at a quarter of the way: sin 45 / (3 + cos 45), by hand.
        var turn = 2 * Math.Atan(Math.Sin(Math.PI / 4) / (3 + Math.Cos(Math.PI / 4)));
        Assert.Equal(turn, Angle.Between(Quat.Identity, KeyPlayback.At(Playback.ComponentLinear, Quat.Identity, Quarter, 0.25)), 1e-15);
        Assert.Equal(1.5 * Math.PI / 2, Angle.Between(Quarter, KeyPlayback.At(Playback.ComponentLinear, Quat.Identity, -Quarter, 0.5)), 1e-14);
    }

    [Fact]
    public void Missing_frames_are_not_measured_and_the_first_worst_frame_is_named()
    {
        Quat[] samples = [Quat.Identity, Quat.Missing, Quarter, Quat.Identity, Quarter, Quat.Identity];
        var error = KeyPlayback.Measure(Playback.Slerp, [0, 5], [samples[0], samples[5]], [0, 1, 2, 3, 4, 5], samples);
        Assert.Equal(Math.PI / 2, error.LargestRadians, 1e-15);
        Assert.Equal(2, error.LargestFrame);
        Assert.Equal(Math.PI / 2 * Math.Sqrt(2 / 5.0), error.RmsRadians, 1e-15);
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void The_vector_kernel_misses_each_frame_by_what_the_plain_playback_does(Playback rule)
    {
        for (var seed = 1; seed <= 40; seed++)
        {
            var last = 3 + seed;
            var samples = Motions.Wander(last + 1, seed, 0.002 * seed, 0.004);
            var times = Motions.Times(last + 1, seed, seed % 2 == 0);
            using var stretch = new Stretch(samples, times);
            double[] errors = [0, .. Enumerable.Range(1, last - 1).Select(n => Error(rule, samples, times, n))];
            foreach (var error in errors.Skip(1))
            {
                Assert.Equal(Array.FindIndex(errors, e => e > error - 1e-13), Breach(rule, stretch, last, error - 1e-13));
                Assert.Equal(Array.FindIndex(errors, e => e > error + 1e-13), Breach(rule, stretch, last, error + 1e-13));
            }
        }
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void A_sample_inside_a_span_may_have_either_sign(Playback rule)
    {
        var samples = Motions.Wander(9, 1, 0.01, 0);
        samples[5] = -samples[5];
        var times = Motions.Times(9, 1, regular: true);
        using var stretch = new Stretch(samples, times);
        var largest = Enumerable.Range(1, 7).Max(n => Error(rule, samples, times, n));
        Assert.Equal(-1, Breach(rule, stretch, 8, largest + 1e-10));
        Assert.InRange(Breach(rule, stretch, 8, largest - 1e-10), 1, 7);
    }

    private static double Error(Playback rule, Quat[] samples, double[] times, int n) =>
        Angle.Between(KeyPlayback.At(rule, samples[0], samples[^1], times[n] / times[^1]), samples[n]);

    private static int Breach(Playback rule, Stretch stretch, int last, double angle) => rule == Playback.Slerp
        ? SpanCheck.Breach<SlerpCurve>(stretch, 0, last, SpanCheck.SquaredChord(angle), new Suspects())
        : SpanCheck.Breach<ChordCurve>(stretch, 0, last, SpanCheck.SquaredChord(angle), new Suspects());
}
