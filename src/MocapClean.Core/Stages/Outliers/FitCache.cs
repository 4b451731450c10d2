namespace MocapClean.Core.Stages.Outliers;

/// <summary>Keeps the fits for neighbours that stand regularly, of which a track has few kinds and many.</summary>
/// <param name="solve">Makes the fit for some neighbours; that of regular ones depends on their pattern alone.</param>
internal sealed class FitCache(FitCache.Solver solve)
{
    private readonly Dictionary<Pattern, NeighbourFit> regular = [];

    /// <summary>Makes a fit.</summary>
    public delegate NeighbourFit Solver(TrustedNeighbours neighbours);

    /// <summary>The fit for these neighbours.</summary>
    public NeighbourFit For(TrustedNeighbours neighbours)
    {
        if (!neighbours.AreRegular)
        {
            return solve(neighbours);
        }

        var pattern = neighbours.Pattern;
        if (!regular.TryGetValue(pattern, out var fit))
        {
            regular[pattern] = fit = solve(neighbours);
        }

        return fit;
    }
}
