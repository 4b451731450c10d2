using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Fill;

/// <summary>What must hold for any motion: turning, mirroring in time, sign, number of workers.</summary>
public sealed class FillInvarianceTests
{
    private const double Tolerance = 1e-9 * Math.PI / 180;
    private static readonly (int First, int Last)[] Gaps = [(80, 84), (150, 164), (260, 299), (305, 309), (450, 549)];

    public static TheoryData<FillMethod> Methods => [FillMethod.GaussianProcess, FillMethod.Spline, FillMethod.Slerp];

    [Theory]
    [MemberData(nameof(Methods))]
    public void Turning_the_room_or_the_joint_turns_the_result(FillMethod method)
    {
        var path = Motion.Wander(800, 11);
        var (room, joint) = (new Quat(0.5, 0.5, -0.5, 0.5), RotationVector.Exp(new Vec3(1, -2, 0.3)));
        var (plain, findings) = Motion.Run(Motion.Track(path, Gaps), Motion.Open with { Method = method });
        var (turned, turnedFindings) = Motion.Run(
            Motion.Track([.. path.Select(q => room * q * joint)], Gaps), Motion.Open with { Method = method });
        Assert.True(Motion.Largest(turned, [.. plain.Samples.Select(q => room * q * joint)], 0, 799) < Tolerance);
        AssertSameErrors(findings, turnedFindings);
    }

    [Theory]
    [MemberData(nameof(Methods))]
    public void Time_run_backwards_gives_the_same_path(FillMethod method)
    {
        var path = Motion.Wander(800, 13);
        var back = Gaps.Select(g => (799 - g.Last, 799 - g.First)).ToArray();
        var (plain, findings) = Motion.Run(Motion.Track(path, Gaps), Motion.Open with { Method = method });
        var (reversed, reversedFindings) = Motion.Run(
            Motion.Track([.. path.Reverse()], back), Motion.Open with { Method = method });
        Assert.True(Motion.Largest(reversed, [.. plain.Samples.Reverse()], 0, 799) < Tolerance);
        AssertSameErrors(findings, [.. reversedFindings.Reverse()]);
    }

    [Fact]
    public void Negating_samples_changes_no_orientation()
    {
        var path = Motion.Wander(800, 17);
        var (plain, _) = Motion.Run(Motion.Track(path, Gaps), Motion.Open);
        var (negated, _) = Motion.Run(Motion.Track([.. path.Select((q, n) => n > 280 ? -q : q)], Gaps), Motion.Open);
        Assert.True(Motion.Largest(negated, [.. plain.Samples], 0, 799) < Tolerance);
    }

    [Fact]
    public void Filled_samples_have_length_1_and_continue_in_sign()
    {
        var (track, _) = Motion.Run(Motion.Track(Motion.Wander(800, 19), Gaps), Motion.Open);
        Assert.All(track.Samples, q => Assert.True(Math.Abs(q.Norm - 1) < 1e-12));
        for (var n = 1; n < track.Length; n++)
        {
            Assert.True(Quat.Dot(track.Samples[n - 1], track.Samples[n]) >= 0, $"frame {n}");
        }
    }

    [Fact]
    public void Any_number_of_workers_gives_the_same_bits()
    {
        var tracks = Enumerable.Range(1, 5).Select(k => Motion.Track(Motion.Wander(400, 100 + k), (100, 139))).ToImmutableArray();
        var take = new Take { Name = "t.csv", Clock = Clock.Regular(400, 120), Tracks = tracks, Space = OrientationSpace.World };
        var settings = new StageSettings { Fill = Motion.Open };
        var one = new FillStage().Run(take, StageContext.Uniform(take, settings, workers: 1, TestContext.Current.CancellationToken));
        var four = new FillStage().Run(take, StageContext.Uniform(take, settings, workers: 4, TestContext.Current.CancellationToken));
        Assert.Equal(one.Findings, four.Findings);
        Assert.All(one.Tracks.Zip(four.Tracks), p => Assert.Equal(p.First.Samples, p.Second.Samples));
    }

    [Fact]
    public void A_bridge_of_more_than_half_a_turn_changes_the_signs_after_it_and_says_so()
    {
        // 305 degrees in the gap: continuous signs arrive negated at the right edge, whose delivered sign takes the short way.
        var path = Motion.Spin(600, 600);
        var track = Motion.Track([.. path.Select((q, n) => n >= 360 ? -q : q)], (300, 359));
        var (filled, findings) = Motion.Run(track, Motion.Open);
        for (var n = 1; n < filled.Length; n++)
        {
            Assert.True(Quat.Dot(filled.Samples[n - 1], filled.Samples[n]) > 0, $"frame {n}");
        }

        var flip = Assert.Single(findings, f => f.Kind == FaultKind.SignFlip);
        Assert.Equal((360, 599, FaultAction.Flipped), (flip.First, flip.Last, flip.Action));
    }

    private static void AssertSameErrors(ImmutableArray<Finding> expected, ImmutableArray<Finding> actual)
    {
        Assert.Equal(expected.Length, actual.Length);
        foreach (var (one, other) in expected.Zip(actual))
        {
            Assert.Equal(one.ExpectedErrorRadians!.Value, other.ExpectedErrorRadians!.Value, 1e-9);
        }
    }
}
