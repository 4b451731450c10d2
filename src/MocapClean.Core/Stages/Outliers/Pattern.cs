namespace MocapClean.Core.Stages.Outliers;

/// <summary>How many neighbours stand before and after a run, and how long the run is: what a test can see, whatever the motion.</summary>
/// <param name="Before">Neighbours before.</param>
/// <param name="Run">Samples between the nearest two neighbours.</param>
/// <param name="After">Neighbours after.</param>
internal readonly record struct Pattern(int Before, int Run, int After)
{
    /// <summary>
    /// Neighbours taken on each side where there are as many: a cubic then has four values more than it needs, so that a bad one among
    /// them shows, and spans no longer a time than it can follow.
    /// </summary>
    public const int Side = 4;

    /// <summary>Fewest neighbours in all with which anything can be told.</summary>
    public const int Fewest = Side + 1;

    /// <summary>All neighbours on both sides.</summary>
    public bool IsFull => Before == Side && After == Side;
}
