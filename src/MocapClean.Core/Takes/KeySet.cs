using System.Collections.Immutable;

namespace MocapClean.Core.Takes;

/// <summary>The frames of a joint that stay as keys, rising. Their orientations are the track's samples there.</summary>
/// <param name="Frames">Frame numbers from 0.</param>
/// <param name="LargestErrorRadians">Largest playback error over all present frames, radians.</param>
/// <param name="RmsErrorRadians">Root mean square playback error over all present frames, radians.</param>
public sealed record KeySet(ImmutableArray<int> Frames, double LargestErrorRadians, double RmsErrorRadians);
