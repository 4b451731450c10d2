using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Outliers;

/// <summary>What must not matter to the search does not.</summary>
public sealed class InvarianceTests
{
    private const double Rate = 100;

    /// <summary>Twelve seconds with every sort of fault.</summary>
    private static Quat[] Faulty()
    {
        var samples = Motion.Sample(Motion.Swing, Rate, 12);
        for (var n = 200; n < samples.Length; n++)
        {
            samples[n] = n < 280 || n >= 900 ? Motion.Turn(1, 0, 3, 33) * samples[n] : samples[n];
        }

        samples[350] *= Motion.Turn(0, 1, 0, 9);
        samples[420] *= Motion.Turn(0, 1, 1, 140);
        samples[421] *= Motion.Turn(1, 1, 1, 70);
        samples.AsSpan(500, 12).Fill(Quat.Missing);
        samples.AsSpan(600, 15).Fill(samples[599]);
        return samples;
    }

    private const string Rows =
        "offset 200-279, spike 350-350, spike 420-421, gap 500-511, freeze 600-614, step 900-900";

    [Fact]
    public void All_faults_are_found_as_put_in() => Assert.Equal(Rows, Search.Rows(Search.Run(Rate, Faulty())));

    [Fact]
    public void Signs_change_no_orientation_and_no_finding()
    {
        var samples = Faulty();
        for (var n = 0; n < samples.Length; n++)
        {
            samples[n] = n % 7 < 3 || n > 950 ? -samples[n] : samples[n];
        }

        var (plain, negated) = (Search.Run(Rate, Faulty()), Search.Run(Rate, samples));
        Assert.Equal(Rows, Search.Rows(negated));
        Assert.All(Enumerable.Range(0, samples.Length).Where(n => plain.Tracks[0].Samples[n].IsOrientation), n => Assert.Equal(
            0, Angle.Between(plain.Tracks[0].Samples[n], negated.Tracks[0].Samples[n]), 1e-12));
    }

    [Fact]
    public void The_signs_come_out_continuous_across_what_was_rejected()
    {
        var track = Search.Run(Rate, Faulty()).Tracks[0];
        var believed = Enumerable.Range(0, track.Length)
            .Where(n => track.States[n] is SampleState.Good or SampleState.TurnedBack && n < 900).Select(n => track.Samples[n]).ToList();
        Assert.All(believed.Zip(believed.Skip(1)), p => Assert.True(Quat.Dot(p.First, p.Second) > 0));
    }

    [Fact]
    public void A_constant_turn_of_the_room_or_of_the_sensor_moves_no_finding()
    {
        var (room, mount) = (Motion.Turn(3, 1, 2, 131), Motion.Turn(1, -2, 0, 77));
        var plain = Search.Run(Rate, Faulty());
        var turned = Search.Run(Rate, [.. Faulty().Select(q => q.IsOrientation ? room * q * mount : q)]);
        Assert.Equal(Rows, Search.Rows(turned));
        Assert.All(plain.Findings.Zip(turned.Findings), f => Assert.Equal(f.First.SizeRadians, f.Second.SizeRadians, 1e-9));
        Assert.All(Enumerable.Range(0, plain.Length).Where(n => plain.Tracks[0].Samples[n].IsOrientation), n => Assert.Equal(
            0, Angle.Between(room * plain.Tracks[0].Samples[n] * mount, turned.Tracks[0].Samples[n]), 1e-9));
    }

    [Fact]
    public void Time_run_backwards_gives_the_same_findings_backwards()
    {
        var backwards = Faulty();
        Array.Reverse(backwards);
        // Backwards the first turned frame of a step is the one after its last unturned frame.
        Assert.Equal(
            "step 300-300, freeze 585-599, gap 688-699, spike 778-779, spike 849-849, offset 920-999",
            Search.Rows(Search.Run(Rate, backwards)));
    }

    [Fact]
    public void Any_number_of_workers_gives_the_same()
    {
        var take = Motion.Take(Rate, Faulty(), Motion.Sample(Motion.Fight, Rate, 12), Faulty());
        var stage = new Core.Stages.Outliers.OutliersStage();
        var one = stage.Run(take, Core.Stages.StageContext.Uniform(take, new Core.Stages.StageSettings(), workers: 1));
        var four = stage.Run(take, Core.Stages.StageContext.Uniform(take, new Core.Stages.StageSettings(), workers: 4));
        Assert.Equal(one.Findings, four.Findings);
        Assert.All(one.Tracks.Zip(four.Tracks), t => Assert.Equal(t.First.Samples.AsEnumerable(), t.Second.Samples.AsEnumerable()));
    }
}
