using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

public sealed class SmoothStageTests
{
    [Fact]
    public void Method_none_touches_nothing_and_says_nothing()
    {
        var take = Some.Take(100, Some.Track("joint", NoisyMotion.Swing(200).Noisy(0.5, 1)));
        var smoothed = take.Smooth(new SmoothSettings { Method = SmoothMethod.None });
        Assert.Empty(smoothed.Findings);
        Assert.Equal(take.Tracks[0], smoothed.Tracks[0]);
    }

    [Theory]
    [MemberData(nameof(NoisyMotion.Methods), MemberType = typeof(NoisyMotion))]
    public void One_to_eight_samples_pass_as_they_are_and_a_row_says_so(SmoothMethod method)
    {
        for (var frames = 1; frames <= 8; frames++)
        {
            var samples = NoisyMotion.Swing(frames).Noisy(0.5, frames);
            var smoothed = samples.Smooth(new SmoothSettings { Method = method });
            Assert.Equal(samples, smoothed.Tracks[0].Samples);
            var row = Assert.Single(smoothed.Findings);
            Assert.Equal((0, frames - 1, FaultKind.Smoothing, FaultAction.Unsmoothed), (row.First, row.Last, row.Kind, row.Action));
            Assert.Contains("too few", row.Note, StringComparison.Ordinal);
            Assert.True(double.IsNaN(smoothed.Tracks[0].Smoothing!.CutoffHertz));
        }
    }

    [Theory]
    [MemberData(nameof(NoisyMotion.Methods), MemberType = typeof(NoisyMotion))]
    public void Every_segment_is_smoothed_by_itself_and_has_its_row(SmoothMethod method)
    {
        // A step at 100, a missing run and a flagged sample: stillness on both sides of each must stay what it is.
        var (here, there) = (Some.About(1, 2, 3, 20), Some.About(3, -1, 0, 70));
        var track = Some.Track("joint", [.. Enumerable.Range(0, 300).Select(n => n < 100 ? here : there)]);
        var states = track.States.ToArray();
        states[200] = SampleState.Missing;
        states[250] = SampleState.Flagged;
        track = track with { Breaks = [100], States = [.. states] };
        var smoothed = Some.Take(100, track).Smooth(new SmoothSettings { Method = method });
        Assert.All(NoisyMotion.Apart(track.Samples, smoothed.Tracks[0].Samples), degrees => Assert.InRange(degrees, 0, 1e-9));
        Assert.Equal([(0, 99), (100, 199), (201, 249), (251, 299)], smoothed.Findings.Select(f => (f.First, f.Last)));
        Assert.All(smoothed.Findings, f => Assert.Equal(FaultAction.Smoothed, f.Action));
    }

    [Theory]
    [MemberData(nameof(NoisyMotion.Methods), MemberType = typeof(NoisyMotion))]
    public void Rows_say_how_far_the_furthest_sample_moved_and_the_track_what_noise_went(SmoothMethod method)
    {
        var samples = NoisyMotion.Swing(1000).Noisy(0.5, 7);
        var smoothed = samples.Smooth(new SmoothSettings { Method = method });
        var row = Assert.Single(smoothed.Findings);
        Assert.Equal(NoisyMotion.Apart(samples, smoothed.Tracks[0].Samples).Max(), Angle.ToDegrees(row.SizeRadians), 1e-9);
        Assert.InRange(Angle.ToDegrees(smoothed.Tracks[0].Smoothing!.NoiseRadians), 0.47, 0.53);
        Assert.InRange(smoothed.Tracks[0].Smoothing!.CutoffHertz, 2, 12);
        Assert.InRange(NoisyMotion.Rms(NoisyMotion.Apart(NoisyMotion.Swing(1000), smoothed.Tracks[0].Samples)), 0, 0.4);
    }

    [Fact]
    public void A_fixed_cutoff_is_its_own_equivalent()
    {
        var smoothed = NoisyMotion.Swing(1000).Noisy(0.5, 7).Smooth(new SmoothSettings { Method = SmoothMethod.Butterworth, CutoffHertz = 6 });
        Assert.Equal(6, smoothed.Tracks[0].Smoothing!.CutoffHertz, 0.1);
    }

    [Fact]
    public void Faults_that_nobody_found_hardly_count_as_noise()
    {
        var samples = NoisyMotion.Swing(2000).Noisy(0.5, 7);
        for (var n = 25; n < samples.Length; n += 50)
        {
            samples[n] *= Some.About(1, 0, 0, 15);
        }

        var measure = samples.Smooth(new SmoothSettings()).Tracks[0].Smoothing!;
        Assert.InRange(Angle.ToDegrees(measure.NoiseRadians), 0.4, 0.75);
    }

    [Fact]
    public void No_sample_moves_further_than_the_bound()
    {
        var samples = NoisyMotion.Swing(600).Noisy(1, 3);
        var free = samples.Smooth(new SmoothSettings()).Tracks[0].Samples;
        var bounded = samples.Smooth(new SmoothSettings { LargestRadians = Angle.FromDegrees(0.7) });
        var (far, near) = (NoisyMotion.Apart(samples, free), NoisyMotion.Apart(samples, bounded.Tracks[0].Samples));
        Assert.Equal(0.7, near.Max(), 1e-9);
        Assert.Equal(0.7, Angle.ToDegrees(bounded.Findings[0].SizeRadians), 1e-9);
        var told = bounded.Findings.Skip(1).SelectMany(f => Enumerable.Range(f.First, f.Count));
        Assert.Equal(Enumerable.Range(0, far.Length).Where(n => far[n] > 0.7), told);
        Assert.All(far.Zip(near), p => Assert.Equal(Math.Min(p.First, 0.7), p.Second, 1e-9));
    }

    [Fact]
    public void A_spin_faster_than_the_filter_is_kept_and_said()
    {
        var samples = NoisyMotion.SpinUp(600, 8000);
        var smoothed = samples.Smooth(new SmoothSettings { Method = SmoothMethod.Butterworth, CutoffHertz = 6 });
        var rows = smoothed.Findings.Where(f => f.Action == FaultAction.Unsmoothed).ToList();
        Assert.NotEmpty(rows);
        Assert.All(rows, f => Assert.Contains("faster", f.Note, StringComparison.Ordinal));
        Assert.Equal(599, rows[^1].Last);
        Assert.All(rows, f => Assert.Equal(samples[f.First..(f.Last + 1)], smoothed.Tracks[0].Samples[f.First..(f.Last + 1)]));
    }

    [Theory]
    [InlineData(SmoothMethod.Butterworth, "half of")]
    [InlineData(SmoothMethod.SavitzkyGolay, "nothing to average")]
    public void Settings_that_leave_nothing_to_do_are_said(SmoothMethod method, string reason)
    {
        var samples = NoisyMotion.Swing(200);
        var smoothed = samples.Smooth(new SmoothSettings
        {
            Method = method,
            CutoffHertz = 90,
            Window = MocapClean.Core.Stages.Settings.Extent.Frames(5),
            Order = 5,
        });
        Assert.Equal(samples, smoothed.Tracks[0].Samples);
        Assert.Contains(reason, Assert.Single(smoothed.Findings).Note, StringComparison.Ordinal);
    }

    [Fact]
    public void The_setting_largest_is_a_bound_in_degrees_or_off()
    {
        var setting = SmoothSettings.Table.Settings.Single(s => s.Key == "largest");
        var bound = setting.With(new(), new() { Number = 2 });
        Assert.Equal(Angle.FromDegrees(2), bound.LargestRadians);
        Assert.Equal(double.PositiveInfinity, setting.With(bound, new() { Word = "off" }).LargestRadians);
    }
}
