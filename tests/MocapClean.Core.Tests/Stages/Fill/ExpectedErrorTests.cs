using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Fill;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Fill;

/// <summary>The expected error against the error, over many gaps in motions whose truth is known.</summary>
public sealed class ExpectedErrorTests
{
    [Theory]
    [InlineData(FillMethod.GaussianProcess, 5)]
    [InlineData(FillMethod.GaussianProcess, 15)]
    [InlineData(FillMethod.GaussianProcess, 40)]
    [InlineData(FillMethod.Spline, 15)]
    [InlineData(FillMethod.Slerp, 15)]
    public void It_is_neither_boast_nor_fear(FillMethod method, int length)
    {
        var ratios = new List<double>();
        for (var take = 1; take <= 6; take++)
        {
            var path = Motion.Wander(2400, 1000 + take);
            var gaps = Enumerable.Range(0, 12).Select(k => (100 + (k * 180), 100 + (k * 180) + length - 1)).ToArray();
            var (track, findings) = Motion.Run(Motion.Track(path, gaps), Motion.Open with { Method = method });
            ratios.AddRange(findings.Select(f => Rms(track.Samples.AsSpan(), path, f.First, f.Last) / f.ExpectedErrorRadians!.Value));
        }

        ratios.Sort();
        Assert.InRange(ratios[ratios.Count / 2], 0.75, 1.25);
        Assert.True(ratios[ratios.Count * 9 / 10] < 2.5, $"{ratios[ratios.Count * 9 / 10]}");
    }

    private static double Rms(ReadOnlySpan<Quat> samples, Quat[] path, int first, int last)
    {
        var sum = 0.0;
        for (var n = first; n <= last; n++)
        {
            var e = Angle.Between(samples[n], path[n]);
            sum += e * e;
        }

        return Math.Sqrt(sum / (last - first + 1));
    }
}
