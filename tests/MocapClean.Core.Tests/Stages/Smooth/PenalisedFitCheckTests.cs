using System.Runtime.Intrinsics;
using System.Text.Json;
using MocapClean.Core.Stages.Smooth;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Against a dense solve, 50 digits and eigenvalues: Data/Smooth/filters-whittaker.json.</summary>
public sealed class PenalisedFitCheckTests
{
    private static readonly JsonElement Checks = FilterChecks.Read("filters-whittaker.json");
    private static readonly double[] X = Checks.Numbers("x");

    [Fact]
    public void Solutions_with_trace_residual_and_score()
    {
        var rows = Checks.GetProperty("solutions").EnumerateArray().Where(r => r.TryGetProperty("z", out _)).ToList();
        Assert.Equal(9, rows.Count);
        Assert.All(rows, row =>
        {
            var (z, trace, squares) = Fit(row.Whole("difference-order"), row.Number("lambda"), X);
            Assert.All(row.Numbers("z").Zip(z), p => Assert.Equal(p.First, p.Second, 1e-8));
            Assert.Equal(1, trace / row.Number("trace"), 1e-9);
            Assert.Equal(1, squares / row.Number("rss"), 1e-9);
            Assert.Equal(1, Score(trace, squares) / row.Number("gcv"), 1e-9);
        });
    }

    [Fact]
    public void The_score_on_a_grid_and_its_least()
    {
        var rows = Checks.GetProperty("solutions").EnumerateArray().Where(r => r.TryGetProperty("grid", out _)).ToList();
        Assert.Equal(3, rows.Count);
        Assert.All(rows, row =>
        {
            var (best, least) = (double.NaN, double.PositiveInfinity);
            foreach (var entry in row.GetProperty("grid").EnumerateArray())
            {
                var (_, trace, squares) = Fit(row.Whole("difference-order"), entry[0].GetDouble(), X);
                Assert.Equal(1, trace / entry[1].GetDouble(), 1e-7);
                Assert.Equal(1, squares / entry[2].GetDouble(), 1e-7);
                Assert.Equal(1, Score(trace, squares) / entry[3].GetDouble(), 1e-7);
                (best, least) = Score(trace, squares) < least ? (entry[0].GetDouble(), Score(trace, squares)) : (best, least);
            }

            Assert.Equal(row.Number("best-lambda"), best, 1e-12);
        });
    }

    [Fact]
    public void Samples_that_are_missing_are_the_curve_itself()
    {
        // Without samples of its own the curve is free of residuals there: put it in for the missing samples until it stays.
        var row = Checks.GetProperty("with-gaps");
        var missing = row.GetProperty("missing-frames").EnumerateArray().Select(n => n.GetInt32()).ToList();
        var (x, z) = (X.ToArray(), X);
        for (var round = 0; round < 1000; round++)
        {
            missing.ForEach(n => x[n] = z[n]);
            z = Fit(row.Whole("difference-order"), row.Number("lambda"), x).Z;
        }

        Assert.All(row.Numbers("z").Zip(z), p => Assert.Equal(p.First, p.Second, 1e-8));
    }

    private static (double[] Z, double Trace, double Squares) Fit(int order, double lambda, double[] x)
    {
        var times = Enumerable.Range(0, x.Length).Select(n => (double)n).ToArray();
        using var fit = new PenalisedFit(new PenaltyRows(order, times, [0, x.Length]));
        var y = x.Select(Vector256.Create).ToArray();
        var z = new Vector256<double>[y.Length];
        var leverage = new Vector256<double>[y.Length];
        fit.Factor(Vector256.Create(1 / lambda, 1, 2 / lambda, 1e-9), []);
        fit.Leverage(leverage);
        fit.Fit(y, z);
        return ([.. z.Select(v => v[0])], leverage.Sum(h => h[0]), z.Zip(x, (v, w) => (w - v[0]) * (w - v[0])).Sum());
    }

    private static double Score(double trace, double squares) => X.Length * squares / ((X.Length - trace) * (X.Length - trace));
}
