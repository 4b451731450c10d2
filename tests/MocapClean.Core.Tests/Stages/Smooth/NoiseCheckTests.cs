using System.Text.Json;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Against SciPy and an inverse error function in 50 digits: Data/Smooth/filters-mad.json.</summary>
public sealed class NoiseCheckTests
{
    private static readonly JsonElement Checks = FilterChecks.Read("filters-mad.json");

    [Fact]
    public void Medians_and_median_absolute_deviations()
    {
        Assert.Equal(RobustSpread.Scale, Checks.Number("rounded"));
        var sets = Checks.GetProperty("sets").EnumerateArray().ToList();
        Assert.Equal(5, sets.Count);
        Assert.All(sets, set =>
        {
            var values = set.Numbers("values");
            Assert.Equal(set.Number("median"), Median(values), 1e-14);
            var deviations = values.Select(v => Math.Abs(v - set.Number("median"))).ToArray();
            Assert.Equal(set.Number("mad"), Median(deviations), 1e-14);
            Assert.Equal(set.Number("scaled") / Checks.Number("constant"), RobustSpread.Of(deviations) / RobustSpread.Scale, 1e-14);
        });
    }

    [Fact]
    public void Normal_noise_of_three_axes_is_measured_as_it_is_beside_a_few_faults()
    {
        var random = new Random(8);
        double Square() => Math.Pow(0.2 * NoisyMotion.Normal(random), 2);
        var squared = Enumerable.Range(0, 40000).Select(n => n % 50 == 0 ? 1e6 : 0.75 * (Square() + Square() + Square())).ToArray();
        var leverage = Enumerable.Repeat(0.25, squared.Length).ToArray();
        Assert.InRange(NoiseEstimate.Variance(squared, leverage, 0), 0.98 * 0.04, 1.05 * 0.04);
        Assert.Equal(25, NoiseEstimate.Variance(squared, leverage, 10));
    }

    // What the noise makes of the median, with the median of three normal axes taken out again.
    private static double Median(double[] values)
    {
        const double MedianOfThree = 2.365973884375338;
        return MedianOfThree * NoiseEstimate.Variance(values, new double[values.Length], 0);
    }
}
