using System.Collections.Immutable;

namespace MocapClean.Core.Diff;

/// <summary>Merged bad frames of a take with a lead before and after.</summary>
/// <param name="First">First frame of the window.</param>
/// <param name="Last">Last frame, included.</param>
/// <param name="Joints">Names of the joints with bad frames in it, in the take's order; empty for the whole take.</param>
/// <param name="Reason">Plain words.</param>
/// <param name="BadFrames">How many frames in it are bad.</param>
public sealed record ReshootWindow(int First, int Last, ImmutableArray<string> Joints, string Reason, int BadFrames);
