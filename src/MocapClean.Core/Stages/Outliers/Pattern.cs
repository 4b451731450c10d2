using System.Collections.Immutable;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>What a test looks at: how many neighbours before and after a run, how long the run is, and how bent a path it allows for.</summary>
/// <param name="Before">Neighbours before.</param>
/// <param name="Run">Samples between the nearest two neighbours.</param>
/// <param name="After">Neighbours after.</param>
/// <param name="Degree">Degree of the polynomial through them.</param>
internal readonly record struct Pattern(int Before, int Run, int After, int Degree)
{
    /// <summary>Most neighbours on one side.</summary>
    public const int Most = 6;

    /// <summary>Fewest neighbours in all with which anything can be told.</summary>
    public const int Fewest = 5;

    /// <summary>
    /// The looks to choose from: cubics average more noise away, quintics follow faster motion. Each has neighbours to spare, so that a bad
    /// one among them shows.
    /// </summary>
    public static ImmutableArray<Pattern> Looks { get; } = [Of(4, 3), Of(5, 5), Of(4, 5)];

    /// <summary>The same with the plainest: three neighbours on either side and a steady turn.</summary>
    public static ImmutableArray<Pattern> AllLooks { get; } = [.. Looks, Of(3, 1)];

    /// <summary>A pattern with as many neighbours on either side.</summary>
    public static Pattern Of(int side, int degree) => new(side, 0, side, degree);
}
