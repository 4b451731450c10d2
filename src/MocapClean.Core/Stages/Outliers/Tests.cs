namespace MocapClean.Core.Stages.Outliers;

/// <summary>The tests of one series, which remember their fits.</summary>
/// <param name="Runs">Of runs.</param>
/// <param name="Edges">Of edges.</param>
internal sealed record Tests(RunTest Runs, EdgeTest Edges);
