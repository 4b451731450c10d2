using System.Text.Json;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Against exact fractions, SciPy and some of the 1964 table: Data/Smooth/filters-savitzky-golay.json.</summary>
public sealed class SavitzkyGolayCheckTests
{
    private static readonly JsonElement Checks = FilterChecks.Read("filters-savitzky-golay.json");

    [Fact]
    public void Weights_inside_and_at_the_ends()
    {
        var rows = Checks.GetProperty("coefficients").EnumerateArray().ToList();
        Assert.Equal(13, rows.Count);
        Assert.All(rows, row =>
        {
            var (window, degree) = (row.Whole("window"), row.Whole("degree"));
            Same(row.Numbers("weights"), Weights(window, degree, window / 2), 1e-12);
            Same([.. row.Numbers("numerators").Select(n => n / row.Number("denominator"))], Weights(window, degree, window / 2), 1e-12);
            if (row.GetProperty("weights-for-first-samples") is { ValueKind: JsonValueKind.Array } ends)
            {
                var expected = ends.EnumerateArray().Select(e => e.EnumerateArray().Select(w => w.GetDouble()).ToArray()).ToList();
                Assert.Equal(window / 2, expected.Count);
                for (var n = 0; n < expected.Count; n++)
                {
                    Same(expected[n], Weights(window, degree, n), 1e-12);
                    Same([.. expected[n].Reverse()], Weights(window, degree, window - 1 - n), 1e-12);
                }
            }
        });
    }

    [Fact]
    public void A_filtered_series()
    {
        var curve = FilterChecks.Curve(Checks.Numbers("x"));
        var rows = Checks.GetProperty("filtered").EnumerateArray().ToList();
        Assert.Equal(4, rows.Count);
        Assert.All(rows, row => Same(row.Numbers("y"), new SavitzkyGolaySmoother(row.Whole("window"), row.Whole("degree")).Smooth(curve).Series(), 1e-10));
    }

    [Fact]
    public void Polynomials_of_its_degree_pass_on_any_clock()
    {
        var random = new Random(3);
        var times = Enumerable.Range(0, 21).Select(n => 1000 + n + (0.4 * random.NextDouble())).ToArray();
        var weights = new double[21];
        foreach (var at in times)
        {
            LocalPolynomial.Weights(times, 3, at, weights);
            foreach (var power in new[] { 0, 1, 2, 3 })
            {
                Assert.Equal(Math.Pow((at - 1010) / 10, power), weights.Zip(times, (w, t) => w * Math.Pow((t - 1010) / 10, power)).Sum(), 1e-11);
            }
        }
    }

    private static double[] Weights(int window, int degree, int at)
    {
        var weights = new double[window];
        LocalPolynomial.Weights([.. Enumerable.Range(0, window).Select(n => (double)n)], degree, at, weights);
        return weights;
    }

    private static void Same(double[] expected, double[] found, double tolerance)
    {
        Assert.Equal(expected.Length, found.Length);
        Assert.All(expected.Zip(found), p => Assert.Equal(p.First, p.Second, tolerance));
    }
}
