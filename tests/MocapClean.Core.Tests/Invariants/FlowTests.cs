using MocapClean.Core.Diff;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Invariants;

/// <summary>What must hold of the whole flow, on generated takes with known faults.</summary>
public sealed class FlowTests
{
    public static TheoryData<uint> Seeds() => [1, 2, 3, 4];

    [Theory]
    [MemberData(nameof(Seeds))]
    public void The_known_faults_are_found_and_told_by_their_kinds(uint seed)
    {
        var findings = SpoiltTake.Run(SpoiltTake.Make(seed)).Findings;
        (int Joint, int First, int Last, FaultKind Kind)[] known =
        [
            (0, 150, 151, FaultKind.Spike), (0, 400, 411, FaultKind.Gap), (0, 600, 600, FaultKind.Step), (1, 200, 259, FaultKind.Offset),
            (1, 300, 419, FaultKind.SignFlip), (1, 500, 500, FaultKind.Gap), (2, 700, 703, FaultKind.Spike), (2, 800, 889, FaultKind.Gap),
        ];
        Assert.All(known, k => Assert.Contains(findings, f => (f.Joint, f.First, f.Last, f.Kind) == k));
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void Any_number_of_workers_gives_the_same_bits(uint seed)
    {
        var (one, four) = (SpoiltTake.Run(SpoiltTake.Make(seed)), SpoiltTake.Run(SpoiltTake.Make(seed), workers: 4));
        Assert.Equal(one.Findings, four.Findings);
        Assert.All(one.Tracks.Zip(four.Tracks), p => Assert.Equal(p.First.Samples, p.Second.Samples));
        Assert.All(one.Tracks.Zip(four.Tracks), p => Assert.Equal(p.First.Keys!.Frames, p.Second.Keys!.Frames));
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void Negating_samples_changes_no_orientation_and_no_finding_but_sign_flips(uint seed)
    {
        var take = SpoiltTake.Make(seed);
        var plain = SpoiltTake.Run(take);
        var negated = SpoiltTake.Run(take.With((j, n, q) => (n * 7919 + j) % 3 == 0 ? -q : q));
        Assert.Equal(Told(plain), Told(negated));
        AssertSame(plain, negated, q => q, 1e-12);
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void Turning_the_whole_take_on_either_side_turns_the_result_and_moves_no_finding_and_no_key_count(uint seed)
    {
        var (take, turn) = (SpoiltTake.Make(seed), RotationVector.Exp(new Vec3(0.4, -1.1, 0.7)));
        var plain = SpoiltTake.Run(take);
        var inRoom = SpoiltTake.Run(take.With((_, _, q) => turn * q));
        var inJoint = SpoiltTake.Run(take.With((_, _, q) => q * turn));
        Assert.Equal(Told(plain), Told(inRoom));
        Assert.Equal(Told(plain), Told(inJoint));
        AssertSame(plain, inRoom, q => turn * q, 1e-9);
        AssertSame(plain, inJoint, q => q * turn, 1e-9);
        Assert.Equal(plain.Tracks.Select(t => t.Keys!.Frames.Length), inRoom.Tracks.Select(t => t.Keys!.Frames.Length));
        Assert.Equal(plain.Tracks.Select(t => t.Keys!.Frames.Length), inJoint.Tracks.Select(t => t.Keys!.Frames.Length));
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void Reversing_time_reverses_findings_and_smoothing(uint seed)
    {
        var take = SpoiltTake.Make(seed);
        var last = take.Length - 1;
        var plain = SpoiltTake.Run(take);
        var back = SpoiltTake.Run(take with { Tracks = [.. take.Tracks.Select(t => Some.Track(t.Name, [.. t.Delivered.Reverse()]))] });
        // A step is known by its first turned frame, which is the frame after its last one seen from the other end.
        (int, int, int, FaultKind, FaultAction) Mirror(Finding f) => f.Kind == FaultKind.Step
            ? (f.Joint, last - f.First + 1, last - f.First + 1, f.Kind, f.Action)
            : (f.Joint, last - f.Last, last - f.First, f.Kind, f.Action);
        var found = back.Findings.Where(Counts).Select(Mirror).Order();
        Assert.Equal(plain.Findings.Where(Counts).Select(f => (f.Joint, f.First, f.Last, f.Kind, f.Action)).Order(), found);
        for (var j = 0; j < take.Tracks.Length; j++)
        {
            for (var n = 0; n <= last; n++)
            {
                var angle = Angle.Between(plain.Tracks[j].Samples[n], back.Tracks[j].Samples[last - n]);
                Assert.True(double.IsNaN(angle) || Angle.ToDegrees(angle) < 1e-9, $"joint {j} frame {n}: {Angle.ToDegrees(angle)} deg");
            }
        }
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void Written_samples_have_length_one_and_neighbours_the_same_sign(uint seed)
    {
        foreach (var track in SpoiltTake.Run(SpoiltTake.Make(seed)).Tracks)
        {
            for (var n = 0; n < track.Length; n++)
            {
                Assert.True(track.States[n] == SampleState.Missing || Math.Abs(track.Samples[n].Norm - 1) < 1e-12);
                var trusted = n > 0 && IsTrusted(track.States[n]) && IsTrusted(track.States[n - 1]);
                Assert.True(!trusted || Quat.Dot(track.Samples[n], track.Samples[n - 1]) >= 0, $"{track.Name} frame {n}");
            }
        }
    }

    [Theory]
    [MemberData(nameof(Seeds))]
    public void Every_changed_sample_lies_inside_a_row_and_rows_of_one_event_never_overlap(uint seed)
    {
        var take = SpoiltTake.Run(SpoiltTake.Make(seed));
        for (var j = 0; j < take.Tracks.Length; j++)
        {
            var rows = take.Findings.Where(f => f.Joint == j).ToList();
            for (var n = 0; n < take.Length; n++)
            {
                Assert.True(
                    !TakeDiff.IsRewritten(take.Tracks[j], n) || rows.Any(f => f.First <= n && n <= f.Last && f.Action is not (FaultAction.Left or FaultAction.Noted)),
                    $"joint {j} frame {n} changed outside every row");
            }

            var events = rows.Where(f => f.Kind is FaultKind.Spike or FaultKind.Step or FaultKind.Offset or FaultKind.Gap or FaultKind.Freeze).OrderBy(f => f.First).ToList();
            Assert.All(events.Zip(events.Skip(1)), p => Assert.True(p.First.Last < p.Second.First, $"{p.First} overlaps {p.Second}"));
        }
    }

    [Theory]
    [InlineData(0.25, Playback.Slerp)]
    [InlineData(1, Playback.Slerp)]
    [InlineData(0.5, Playback.ComponentLinear)]
    public void Keys_play_back_within_the_tolerance_and_stand_at_every_edge(double degrees, Playback playback)
    {
        var settings = new StageSettings { Reduce = new ReduceSettings { Tolerance = Angle.FromDegrees(degrees), Playback = playback } };
        var take = SpoiltTake.Run(SpoiltTake.Make(5), settings);
        foreach (var track in take.Tracks)
        {
            var keys = track.Keys!.Frames;
            var error = KeyPlayback.Measure(playback, keys.AsSpan(), keys.Select(k => track.Samples[k]).ToArray(), take.Clock.Steady.AsSpan(), track.Samples.AsSpan());
            Assert.InRange(Angle.ToDegrees(error.LargestRadians), 0, degrees);
            Assert.All(Segment.Present(track), s => Assert.True(keys.Contains(s.First) && keys.Contains(s.Last), $"{track.Name} {s}"));
        }
    }

    [Fact]
    public void With_every_stage_off_nothing_changes_but_signs()
    {
        var settings = new StageSettings
        {
            Outliers = new OutliersSettings { Method = OutliersMethod.None },
            Fill = new FillSettings { Method = FillMethod.None },
            Smooth = new SmoothSettings { Method = SmoothMethod.None },
        };
        var take = SpoiltTake.Run(SpoiltTake.Make(6), settings);
        Assert.All(take.Tracks, t => Assert.All(t.Samples.Zip(t.Delivered), p => Assert.True(p.First.Equals(p.Second) || p.First.Equals(-p.Second))));
        Assert.All(take.Findings, f => Assert.True(f.Kind is FaultKind.Gap or FaultKind.SignFlip, f.ToString()));
    }

    private static bool IsTrusted(SampleState state) => state is SampleState.Good or SampleState.Filled or SampleState.TurnedBack;

    private static bool Counts(Finding f) => f.Kind is not (FaultKind.SignFlip or FaultKind.Freeze or FaultKind.Smoothing);

    private static IEnumerable<(int, int, int, FaultKind, FaultAction)> Told(Take take) =>
        take.Findings.Where(f => f.Kind != FaultKind.SignFlip).Select(f => (f.Joint, f.First, f.Last, f.Kind, f.Action));

    private static void AssertSame(Take plain, Take other, Func<Quat, Quat> turn, double degrees)
    {
        for (var j = 0; j < plain.Tracks.Length; j++)
        {
            for (var n = 0; n < plain.Length; n++)
            {
                var angle = Angle.ToDegrees(Angle.Between(turn(plain.Tracks[j].Samples[n]), other.Tracks[j].Samples[n]));
                Assert.True(double.IsNaN(angle) || angle < degrees, $"joint {j} frame {n}: {angle} deg");
            }
        }
    }
}
