using FsCheck.Xunit;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Ingest;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Unwrap;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Unwrap;

public sealed class UnwrapStageTests
{
    [Fact]
    public void A_negated_run_is_one_row_and_comes_back()
    {
        var spin = Some.Spin(50, 2);
        var result = Run([.. spin.Select((q, n) => n is >= 20 and < 30 ? -q : q)]);
        var row = Assert.Single(result.Findings);
        Assert.Equal((20, 29, FaultKind.SignFlip, FaultAction.Flipped), (row.First, row.Last, row.Kind, row.Action));
        Assert.All(result.Tracks[0].Samples.Zip(spin), p => Assert.Equal(1, Quat.Dot(p.First, p.Second), 1e-14));
    }

    [Fact]
    public void The_track_keeps_the_sign_that_changes_fewest_samples()
    {
        var spin = Some.Spin(50, 2);
        var result = Run([.. spin.Select((q, n) => n >= 10 ? -q : q)]);
        var row = Assert.Single(result.Findings);
        Assert.Equal((0, 9), (row.First, row.Last));
    }

    [Fact]
    public void A_gap_inside_a_negated_run_does_not_cut_the_row()
    {
        var spin = Some.Spin(60, 1).Select((q, n) => n is >= 20 and < 40 ? -q : q).ToArray();
        for (var n = 25; n < 30; n++)
        {
            spin[n] = Quat.Missing;
        }

        var row = Assert.Single(Run(spin).Findings);
        Assert.Equal((20, 39), (row.First, row.Last));
    }

    [Fact]
    public void Half_a_turn_between_frames_is_flagged_as_a_guess_when_nobody_else_looks()
    {
        var spin = Some.Spin(20, 0.1).Select((q, n) => n >= 10 ? Some.About(1, 0, 0, 178) * q : q).ToArray();
        var row = Assert.Single(Run(spin, OutliersMethod.None).Findings, f => f.Action == FaultAction.Flagged);
        Assert.Equal(10, row.First);
        Assert.Equal(178, Angle.ToDegrees(row.SizeRadians), 0.5);
    }

    [Property(MaxTest = 100, Replay = "(123,457)")]
    public bool Any_signs_give_the_same_orientations_and_a_second_pass_changes_nothing(bool[] negated)
    {
        var spin = Some.Spin(40, 3);
        var signed = spin.Select((q, n) => negated.Length > 0 && negated[n % negated.Length] ? -q : q).ToArray();
        var once = Run(signed);
        var again = Run([.. once.Tracks[0].Samples]);
        var settled = once.Tracks[0].Samples;
        return again.Tracks[0].Samples.Zip(settled).All(p => Quat.Dot(p.First, p.Second) > 0) && again.Findings.IsEmpty
            && settled.Zip(spin).All(p => Math.Abs(Math.Abs(Quat.Dot(p.First, p.Second)) - 1) < 1e-14)
            && settled.Zip(settled.Skip(1)).All(p => Quat.Dot(p.First, p.Second) >= 0);
    }

    private static Take Run(Quat[] samples, OutliersMethod method = OutliersMethod.Innovation)
    {
        var take = Some.Take(100, Some.Track("a", samples));
        var settings = new StageSettings { Outliers = new OutliersSettings { Method = method } };
        var context = StageContext.Uniform(take, settings);
        return new UnwrapStage().Run(new IngestStage().Run(take, context), context);
    }
}
