namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// What the tests measure on healthy motion before and after a place: the unit in which a fault is told from motion. The livelier side
/// counts, so that neither the end of a rest nor a blow is a fault.
/// </summary>
/// <param name="path">The series.</param>
/// <param name="tests">The tests.</param>
/// <param name="place">The samples that are in doubt and are not asked.</param>
/// <param name="noise">Floor: the spread of one sample's noise, radians.</param>
internal sealed class LocalSpread(MotionPath path, Tests tests, (int First, int Last) place, double noise)
{
    /// <summary>Seconds on either side that are the neighbourhood.</summary>
    private const double Seconds = 0.4;

    /// <summary>Tests on either side: enough for a median.</summary>
    private const int Wanted = 20;
    private const int Fewest = 8;

    private readonly Dictionary<Pattern, RunMeasure?> ofRuns = [];
    private readonly Dictionary<Pattern, RunMeasure?> ofEdges = [];
    private readonly Dictionary<Pattern, RunMeasure?> ofMotion = [];

    /// <summary>Spreads of size and misfit of healthy runs seen with the same neighbours; null where nothing healthy is near.</summary>
    public RunMeasure? OfRun(Pattern pattern) => Once(ofRuns, pattern, first => tests.Runs.At(path, first, first + pattern.Run - 1, pattern));

    /// <summary>Spreads of size and misfit of healthy edges.</summary>
    public RunMeasure? OfEdge(Pattern pattern) => Once(
        ofEdges, pattern, first => tests.Edges.Across(path, first, first + pattern.Run - 1, pattern)?.Room);

    /// <summary>Spread of the distance of healthy samples from where the motion on one side leads, radians.</summary>
    public double OfMotion => Math.Max(
        noise,
        Once(ofMotion, new Pattern(4, 1, 4, 2), n => new RunMeasure(default, MotionTest.OneSided(path, n, -1), 0))?.Size ?? 0);

    /// <summary>
    /// The look at runs, or at edges, that predicts healthy motion best here: more neighbours where noise is all there is, a more bent path
    /// where the motion is fast. Null where nothing healthy is near.
    /// </summary>
    /// <param name="run">Samples of the run that decides; 0 for edges.</param>
    public Pattern? Best(int run)
    {
        var (best, least) = ((Pattern?)null, double.PositiveInfinity);
        foreach (var pattern in Pattern.Looks)
        {
            var look = pattern with { Run = run };
            if ((run == 0 ? OfEdge(look) : OfRun(look)) is { } usual && usual.Size < least)
            {
                (best, least) = (pattern, usual.Size);
            }
        }

        return best;
    }

    private RunMeasure? Once(Dictionary<Pattern, RunMeasure?> known, Pattern pattern, Func<int, RunMeasure?> test)
    {
        if (!known.TryGetValue(pattern, out var found))
        {
            known[pattern] = found = Around(pattern, test);
        }

        return found;
    }

    private RunMeasure? Around(Pattern pattern, Func<int, RunMeasure?> test)
    {
        var before = OneSide(pattern, place.First - 1, -1, test);
        var after = OneSide(pattern, place.Last + 1, 1, test);
        if (before is null && after is null)
        {
            return null;
        }

        var size = Math.Max(before?.Size ?? 0, after?.Size ?? 0);
        var misfit = Math.Max(before?.Misfit ?? 0, after?.Misfit ?? 0);
        // White noise leaves its own size times the root of the free values over.
        var free = Math.Max(1, pattern.Before + pattern.After - pattern.Degree - 1);
        return new RunMeasure(pattern, Math.Max(size, noise), Math.Max(misfit, noise * Math.Sqrt(free)));
    }

    private RunMeasure? OneSide(Pattern pattern, int from, int direction, Func<int, RunMeasure?> test)
    {
        var window = Math.Max((int)(Seconds * path.Rate), Wanted);
        var stride = Math.Max(1, window / Wanted);
        Span<double> sizes = stackalloc double[Wanted];
        Span<double> misfits = stackalloc double[Wanted];
        var count = 0;
        for (var step = 0; count < Wanted && step < 4 * window; step += stride)
        {
            var near = from + (direction * step);
            var first = direction > 0 ? near + pattern.Before : near - pattern.After - pattern.Run + 1;
            if (path.IsWhole(first - pattern.Before, first + pattern.Run + pattern.After - 1) && test(first) is { } healthy)
            {
                (sizes[count], misfits[count]) = (healthy.Size, healthy.Misfit);
                count++;
            }
        }

        return count < Fewest ? null : new RunMeasure(pattern, RobustSpread.Of(sizes[..count]), RobustSpread.Of(misfits[..count]));
    }
}
