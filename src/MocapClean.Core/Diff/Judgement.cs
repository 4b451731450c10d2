using System.Collections.Immutable;

namespace MocapClean.Core.Diff;

/// <summary>The verdict on a take, what carried it, and the windows to shoot again or to look at.</summary>
/// <param name="Verdict">The suggestion.</param>
/// <param name="Reason">Plain words; what carried the verdict, joints named.</param>
/// <param name="Windows">In order of frames; empty where the take is accepted.</param>
/// <param name="BadFrames">Bad frames inside the action.</param>
/// <param name="LostFrames">Frames never recorded inside the action.</param>
/// <param name="ActionFrames">Frames inside the action.</param>
public sealed record Judgement(
    Verdict Verdict, string Reason, ImmutableArray<ReshootWindow> Windows, int BadFrames, long LostFrames, int ActionFrames);
