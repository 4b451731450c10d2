using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Tests.Orientation;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>What must not change the result, for motions of any length, noise and method.</summary>
[Properties(MaxTest = 40, Arbitrary = [typeof(AnyOrientation), typeof(AnyMotion)], Replay = "(123,457)")]
public sealed class SmoothInvarianceTests
{
    /// <summary>Degrees within which the promise is kept.</summary>
    private const double Promised = 1e-9;

    [Property]
    public void A_constant_turn_in_the_room_turns_the_result(Motion motion, Quat turn) =>
        Same(motion.Smoothed(), motion.Smoothed(q => turn * q), q => turn * q);

    [Property]
    public void A_constant_turn_of_the_joint_turns_the_result(Motion motion, Quat turn) =>
        Same(motion.Smoothed(), motion.Smoothed(q => q * turn), q => q * turn);

    [Property]
    public void Reversed_time_reverses_the_result(Motion motion) =>
        Same([.. motion.Smoothed().Reverse()], (motion with { Samples = [.. motion.Samples.Reverse()] }).Smoothed(), q => q);

    [Property]
    public void Signs_change_nothing_and_stay_as_they_came(Motion motion)
    {
        var random = new Random(motion.Samples.Length);
        var signs = motion.Samples.Select(_ => random.Next(2) == 0).ToArray();
        var plain = motion.Smoothed();
        var mixed = (motion with { Samples = [.. motion.Samples.Zip(signs, (q, s) => s ? -q : q)] }).Smoothed();
        Same(plain, mixed, q => q);
        Assert.All(mixed.Zip(signs.Zip(motion.Samples)), p => Assert.True(Quat.Dot(p.First, p.Second.First ? -p.Second.Second : p.Second.Second) > 0));
    }

    [Property]
    public void Samples_have_length_one(Motion motion) => Assert.All(motion.Smoothed(), q => Assert.Equal(1, q.Norm, 1e-15));

    [Fact]
    public void The_number_of_workers_changes_no_bit()
    {
        var tracks = Enumerable.Range(0, 7).Select(n => Some.Track($"j{n}", NoisyMotion.Swing(200 + n)[..200].Noisy(0.3, n))).ToArray();
        var take = Some.Take(100, tracks);
        var settings = new SmoothSettings();
        var (one, four) = (take.Smooth(settings), take.Smooth(settings, workers: 4));
        Assert.Equal(one.Findings, four.Findings);
        Assert.All(one.Tracks.Zip(four.Tracks), p => Assert.Equal(p.First.Samples, p.Second.Samples));
    }

    private static void Same(Quat[] expected, Quat[] found, Func<Quat, Quat> turned) =>
        Assert.All(NoisyMotion.Apart(expected.Select(turned), found), degrees => Assert.InRange(degrees, 0, Promised));
}

/// <summary>A noisy motion, its clock and a method.</summary>
public sealed record Motion(Quat[] Samples, SmoothMethod Method)
{
    internal Quat[] Smoothed() => Smoothed(q => q);

    internal Quat[] Smoothed(Func<Quat, Quat> turned) => Samples.Select(turned).ToArray().Smooth(Method);
}

/// <summary>Generates swings of 1 to 400 samples, some without noise, some wild.</summary>
public static class AnyMotion
{
    public static Arbitrary<Motion> Motions() =>
        (from frames in Gen.Frequency((3, Gen.Choose(40, 400)), (1, Gen.Choose(1, 40)))
         from noise in Gen.Elements(0, 0.01, 0.5, 3)
         from share in Gen.Elements(0, 0.1, 1, 2.5)
         from seed in Gen.Choose(1, 1_000_000)
         from method in Gen.Elements(SmoothMethod.Adaptive, SmoothMethod.Adaptive, SmoothMethod.Whittaker, SmoothMethod.Butterworth, SmoothMethod.SavitzkyGolay)
         let path = Enumerable.Range(0, frames).Select(n => NoisyMotion.Swing((n / NoisyMotion.Rate) + (seed % 100), share)).ToArray()
         select new Motion(path.Noisy(noise, seed), method)).ToArbitrary();
}
