using System.Collections.Immutable;
using MocapClean.Core.Diff;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report;

/// <summary>All that the reports of one take say, from one place.</summary>
/// <param name="Take">The take after all stages.</param>
/// <param name="Diff">Delivered against written.</param>
/// <param name="Judgement">The suggestion and its windows.</param>
/// <param name="Labels">How frames are named.</param>
/// <param name="Keys">What playing the written keys back measured, one for each track.</param>
public sealed record TakeReport(Take Take, TakeDiff Diff, Judgement Judgement, FrameLabels Labels, ImmutableArray<KeySet> Keys)
{
    /// <summary>Name of the joint of a finding; empty for the whole take.</summary>
    public string JointName(Finding finding) => finding.Joint < 0 ? "" : Take.Tracks[finding.Joint].Name;
}
