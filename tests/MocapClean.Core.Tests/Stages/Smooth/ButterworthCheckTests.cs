using System.Numerics;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using System.Text.Json;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Against SciPy, a closed form in 50 digits and own least squares: Data/Smooth/filters-butterworth.json.</summary>
public sealed class ButterworthCheckTests
{
    private static readonly JsonElement Checks = FilterChecks.Read("filters-butterworth.json");

    [Fact]
    public void The_factor_of_two_passes()
    {
        var row = Checks.GetProperty("dual-pass-factors").EnumerateArray().Single(r => r.Whole("passes") == 2);
        Assert.Equal(ButterworthDesign.TwoPassFactor, row.Number("factor"), 1e-15);
    }

    [Fact]
    public void Coefficients_of_one_pass_and_of_one_of_two()
    {
        var rows = Checks.GetProperty("coefficients").EnumerateArray().ToList();
        Assert.Equal(14, rows.Count);
        Assert.All(rows, row =>
        {
            var (cutoff, rate) = (row.Number("cutoff-hz"), row.Number("rate-hz"));
            Same(row, ButterworthDesign.OnePass(cutoff, rate));
            var corrected = row.GetProperty("corrected");
            Same(corrected, ButterworthDesign.OneOfTwoPasses(cutoff, rate));
            Same(corrected, ButterworthDesign.OnePass(corrected.Number("design-cutoff-hz"), rate));
            Assert.Equal(row.Number("dual-pass-gain-at-cutoff"), Gain(ButterworthDesign.OnePass(cutoff, rate), cutoff / rate), 1e-12);
            Assert.Equal(corrected.Number("dual-pass-gain-at-cutoff"), Gain(ButterworthDesign.OneOfTwoPasses(cutoff, rate), cutoff / rate), 1e-12);
            Assert.Equal(Math.Sqrt(0.5), Gain(ButterworthDesign.OneOfTwoPasses(cutoff, rate), cutoff / rate), 1e-12);
            if (row.GetProperty("simply-divided") is { ValueKind: JsonValueKind.Object } divided)
            {
                // Common practice, and not what we do: the gain at the cutoff is off.
                Assert.Equal(divided.Number("dual-pass-gain-at-cutoff"), Gain(ButterworthDesign.OnePass(cutoff / ButterworthDesign.TwoPassFactor, rate), cutoff / rate), 1e-12);
            }
        });
    }

    [Fact]
    public void Runs_both_ways_with_the_states_of_Gustafsson()
    {
        var x = Checks.GetProperty("series").Numbers("x");
        var rows = Checks.GetProperty("filtfilt").EnumerateArray().ToList();
        Assert.Equal(4, rows.Count);
        Assert.All(rows, row =>
        {
            var design = new ButterworthDesign(row.Numbers("b")[0], row.Numbers("a")[1], row.Numbers("a")[2]);
            var y = Filter(design, x);
            Assert.All(row.Numbers("gustafsson").Zip(y), p => Assert.Equal(p.First, p.Second, 1e-9));
            // Other treatments of the ends, here 60 samples of odd padding, are the same only where the ends are forgotten.
            Assert.Equal(row.Numbers("odd-padding-60")[40], y[40], 0.02);
            Assert.All(y.Zip(Filter(design, [.. x.Reverse()]).Reverse()), p => Assert.Equal(p.First, p.Second, 1e-11));
        });
    }

    [Fact]
    public void Components_of_a_quaternion_track()
    {
        var row = Checks.GetProperty("quaternion-components");
        Quat[] input = [.. row.GetProperty("input").EnumerateArray().Select(Quat)];
        Quat[] expected = [.. row.GetProperty("smoothed-then-renormalised").EnumerateArray().Select(Quat)];
        var output = new Quat[input.Length];
        var filter = new TwoPassFilter(ButterworthDesign.OneOfTwoPasses(row.Number("cutoff-hz"), row.Number("rate-hz")), input.Length);
        filter.Run(MemoryMarshal.Cast<Quat, Vector256<double>>(input), MemoryMarshal.Cast<Quat, Vector256<double>>(output.AsSpan()));
        // The check value has padded ends, so only the middle can agree, as far as 6 Hz have forgotten the ends after 25 samples.
        Assert.All(Enumerable.Range(25, 10), n => Assert.Equal(0, Angle.Between(expected[n], output[n].Normalised()), 1e-3));
    }

    [Theory]
    [InlineData(6, 120)]
    [InlineData(20, 143)]
    [InlineData(55, 120)]
    [InlineData(0.5, 60)]
    public void Share_of_white_noise_that_passes(double cutoff, double rate)
    {
        var design = ButterworthDesign.OneOfTwoPasses(cutoff, rate);
        var mean = Enumerable.Range(0, 20000).Average(k => Gain(design, (k + 0.5) / 40000));
        Assert.Equal(mean, ButterworthDesign.Passed(cutoff, rate), 1e-6);
    }

    private static double[] Filter(ButterworthDesign design, double[] x)
    {
        var y = new Vector256<double>[x.Length];
        new TwoPassFilter(design, x.Length).Run(x.Select(v => Vector256.Create(v, 0, -2 * v, 1)).ToArray(), y);
        Assert.All(y, v => Assert.Equal(-2 * v[0], v[2], 1e-9));
        Assert.All(y, v => Assert.Equal(1, v[3], 1e-9));
        return [.. y.Select(v => v[0])];
    }

    private static void Same(JsonElement row, ButterworthDesign design)
    {
        double[] expected = [.. row.Numbers("b"), .. row.Numbers("a")];
        double[] found = [design.B0, 2 * design.B0, design.B0, 1, design.A1, design.A2];
        Assert.All(expected.Zip(found), p => Assert.Equal(p.First, p.Second, 1e-12));
    }

    // Gain of two passes at a share of the rate.
    private static double Gain(ButterworthDesign design, double share)
    {
        var z = Complex.FromPolarCoordinates(1, -2 * Math.PI * share);
        var gain = Complex.Abs(design.B0 * (1 + z) * (1 + z) / (1 + (design.A1 * z) + (design.A2 * z * z)));
        return gain * gain;
    }

    private static Quat Quat(JsonElement e) => new(e[0].GetDouble(), e[1].GetDouble(), e[2].GetDouble(), e[3].GetDouble());
}
