using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>One row of the diff report: a finding with what a comparison of delivered and written samples measured.</summary>
/// <param name="Finding">What was found and done.</param>
/// <param name="LargestRadians">
/// The largest angle between delivered and written within the row; for flagged, left and filled missing samples the jump, or the turn
/// from edge to edge; NaN where there is none.
/// </param>
public sealed record DiffRow(Finding Finding, double LargestRadians);
