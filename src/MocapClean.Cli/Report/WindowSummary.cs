using System.Collections.Immutable;
using MocapClean.Core.Diff;

namespace MocapClean.Cli.Report;

/// <summary>A window to shoot again or to look at, as a person reads it.</summary>
public sealed record WindowSummary(
    int FirstFrame, int LastFrame, string FirstTimecode, string LastTimecode, ImmutableArray<string> Joints, string Reason, int BadFrames)
{
    /// <summary>The window with its frames named.</summary>
    public static WindowSummary Of(ReshootWindow w, FrameLabels labels) => new(
        labels.Number(w.First), labels.Number(w.Last), labels.TimeCode(w.First), labels.TimeCode(w.Last), w.Joints, w.Reason, w.BadFrames);
}
