using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>What a test measured.</summary>
/// <param name="Pattern">What it could see.</param>
/// <param name="Size">How far the run, or the jump, lies from what the neighbours predict, radians.</param>
/// <param name="Misfit">How badly the neighbours agree among themselves once the run or the jump is explained away, radians.</param>
internal readonly record struct RunMeasure(Pattern Pattern, double Size, double Misfit);

/// <summary>
/// The test of a run: are its samples where a smooth path through the neighbours on both sides would have them, and is that path whole?
/// A polynomial in a chart around the middle of the two nearest neighbours.
/// </summary>
internal sealed class RunTest
{
    private readonly FitCache fits = new(Solve);

    /// <summary>Tests the samples from first to last; null where too little is seen to tell.</summary>
    public RunMeasure? At(MotionPath path, int first, int last, Pattern most)
    {
        var neighbours = TrustedNeighbours.Of(path, first, last, most, stackalloc int[2 * Pattern.Most]);
        if (!neighbours.Suffice)
        {
            return null;
        }

        Span<Vec3> values = stackalloc Vec3[neighbours.Count];
        var turn = Chart.Middle(path.Samples[neighbours.Before[0]], path.Samples[neighbours.After[0]]).Conjugate;
        for (var i = 0; i < values.Length; i++)
        {
            values[i] = Chart.Log(turn * path.Samples[neighbours[i]]);
            if (values[i].NormSquared > Chart.Edge * Chart.Edge)
            {
                return null;
            }
        }

        var fit = fits.For(neighbours);
        var size = 0.0;
        for (var n = first; n <= last; n++)
        {
            if (path.Trusted[n])
            {
                var predicted = fit.Predict(n - neighbours.Before[0] - 1, values);
                size = Math.Max(size, (Chart.Log(turn * path.Samples[n]) - predicted).NormSquared);
            }
        }

        return new RunMeasure(neighbours.Pattern, Math.Sqrt(size), fit.Misfit(values));
    }

    private static NeighbourFit Solve(TrustedNeighbours neighbours)
    {
        var run = neighbours.Pattern.Run;
        Span<double> times = stackalloc double[neighbours.Count];
        neighbours.Times(times);
        var wanted = new double[run];
        for (var n = 0; n < run; n++)
        {
            wanted[n] = n - ((run - 1) / 2.0);
        }

        // Where neighbours are short, with two values to spare.
        var degree = Math.Min(neighbours.Pattern.Degree, times.Length - 3);
        return NeighbourFit.Across(times, degree, wanted);
    }
}
