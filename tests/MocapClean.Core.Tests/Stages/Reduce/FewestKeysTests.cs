using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Reduce;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Reduce;

public sealed class FewestKeysTests
{
    private const double Forever = 1e9;

    public static TheoryData<string> Tracks => [.. KeyChecks.All.Select(t => t.Name)];

    [Theory]
    [MemberData(nameof(Tracks))]
    public void Counts_are_those_of_exhaustive_searches_outside_this_project(string name)
    {
        var track = KeyChecks.All.Single(t => t.Name == name);
        Assert.All(track.Cases, c =>
        {
            var keys = Keys(c.Playback, track.Samples, track.Times, new(c.Tolerance, c.Widest, Forever), [.. c.Pinned]);
            Assert.Equal(c.Fewest, keys.Length);
            Assert.Superset(c.Pinned.ToHashSet(), keys.ToHashSet());
            Assert.True(c.Greedy is null || keys.Length <= c.Greedy);
            if (c.OnlySet is { } only)
            {
                Assert.Equal(only, keys);
                Assert.Equal(c.ItsError!.Value, Measured(c.Playback, keys, track.Samples, track.Times), Angle.FromDegrees(1e-9));
            }
        });
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void Counts_are_those_of_a_search_over_every_pair(Playback rule)
    {
        for (var seed = 1; seed <= 60; seed++)
        {
            var frames = 2 + (seed * 7 % 120);
            var samples = Motions.Wander(frames, seed, 0.003 * (1 + (seed % 5)), seed % 3 == 0 ? 0.006 : 0);
            var times = Motions.Times(frames, seed, seed % 2 == 0);
            foreach (var degrees in new[] { 0.2, 1, 5 })
            {
                var limits = new SpanLimits(
                    Angle.FromDegrees(degrees), Angle.FromDegrees(seed % 4 == 0 ? 20 : 90), seed % 5 == 0 ? 0.2 : 10);
                var keys = Keys(rule, samples, times, limits);
                Assert.Equal(new EveryPair(rule, samples, times).Fewest(limits), keys.Length);
                Assert.InRange(Measured(rule, keys, samples, times), 0, limits.Tolerance);
            }
        }
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void Tolerances_and_turns_of_any_size_are_searched_exactly(Playback rule)
    {
        for (var seed = 1; seed <= 30; seed++)
        {
            var samples = Motions.Wander(70, 100 + seed, 0.05 * (1 + (seed % 4)), 0.01 * (seed % 3));
            var times = Motions.Times(70, seed, seed % 2 == 0);
            foreach (var degrees in new[] { 0.002, 15, 40, 89 })
            {
                var limits = new SpanLimits(Angle.FromDegrees(degrees), Angle.FromDegrees(60 * (1 + (seed % 3))), 10);
                var keys = Keys(rule, samples, times, limits);
                Assert.Equal(new EveryPair(rule, samples, times).Fewest(limits), keys.Length);
                Assert.InRange(Measured(rule, keys, samples, times), 0, limits.Tolerance);
            }
        }
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void Turning_the_room_or_the_joint_changes_no_count(Playback rule)
    {
        var samples = Motions.Wander(600, 7, 0.004, 0.002);
        var times = Motions.Times(600, 7, regular: true);
        var limits = new SpanLimits(Angle.FromDegrees(0.5), Angle.FromDegrees(90), 10);
        var turn = RotationVector.Exp(new(1.1, -0.4, 2));
        var plain = Keys(rule, samples, times, limits);
        Assert.Equal(plain, Keys(rule, [.. samples.Select(q => turn * q)], times, limits));
        Assert.Equal(plain, Keys(rule, [.. samples.Select(q => q * turn)], times, limits));
        Assert.Equal(plain, Keys(rule, samples, [.. times.Select(t => t + 36000)], limits));
    }

    [Fact]
    public void Reversing_time_changes_no_count()
    {
        var samples = Motions.Wander(900, 11, 0.004, 0.003);
        var times = Motions.Times(900, 11, regular: false);
        var limits = new SpanLimits(Angle.FromDegrees(0.5), Angle.FromDegrees(90), 10);
        var backward = Keys(Playback.Slerp, [.. samples.Reverse()], [.. times.Reverse().Select(t => times[^1] - t)], limits);
        Assert.Equal(Keys(Playback.Slerp, samples, times, limits).Length, backward.Length);
    }

    [Theory]
    [InlineData(Playback.Slerp)]
    [InlineData(Playback.ComponentLinear)]
    public void Near_the_noise_the_fewest_keys_are_clearly_fewer_than_a_greedy_search_finds(Playback rule)
    {
        var random = new Random(5);
        Quat[] samples = [.. Enumerable.Range(0, 700).Select(_ => RotationVector.Exp(Angle.FromDegrees(0.3) * Motions.Noise(random)))];
        var times = Motions.Times(700, 1, regular: true);
        var limits = new SpanLimits(Angle.FromDegrees(1), Angle.FromDegrees(90), 10);
        var greedy = new EveryPair(rule, samples, times).Greedy(limits);
        var fewest = Keys(rule, samples, times, limits).Length;
        Assert.True(fewest < 0.8 * greedy, $"fewest {fewest}, greedy {greedy}");
    }

    [Fact]
    public void One_frame_is_one_key_and_two_are_two_however_far_apart()
    {
        var limits = new SpanLimits(Angle.FromDegrees(0.5), Angle.FromDegrees(10), 0.001);
        Assert.Equal([0], Keys(Playback.Slerp, [Quat.Identity], [0], limits));
        Assert.Equal([0, 1], Keys(Playback.Slerp, [Quat.Identity, RotationVector.Exp(new(2, 0, 0))], [0, 1], limits));
    }

    [Fact]
    public void A_still_joint_needs_keys_only_where_the_longest_time_asks_for_them()
    {
        var samples = Enumerable.Repeat(RotationVector.Exp(new(0.2, 0.3, 0.1)), 1001).ToArray();
        var times = Enumerable.Range(0, 1001).Select(n => n / 100.0).ToArray();
        Assert.Equal([0, 1000], Keys(Playback.Slerp, samples, times, new(0.01, 1, 10 + 1e-8)));
        Assert.Equal(5, Keys(Playback.Slerp, samples, times, new(0.01, 1, 2.5 + 1e-8)).Length);
        Assert.Equal(6, Keys(Playback.Slerp, samples, times, new(0.01, 1, 2.49 + 1e-8)).Length);
    }

    private static int[] Keys(Playback rule, Quat[] samples, double[] times, SpanLimits limits, params int[] pinned) =>
        KeyChoice.Fewest(rule, samples, times, limits, pinned);

    private static double Measured(Playback rule, int[] keys, Quat[] samples, double[] times)
    {
        var pairs = new EveryPair(rule, samples, times);
        return keys.Zip(keys.Skip(1)).Select(k => pairs.Error(k.First, k.Second)).Append(0).Max();
    }
}
