using MocapClean.Core.Kernels;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Finds jumps in the increments of every joint and explains each by the cheapest story: spike, step, offset or freeze. Offsets are turned
/// back, runs that must be replaced are rejected and wait for the fill stage, everything else stays as delivered and is said. With the
/// method <c>none</c> only missing samples are told and nothing is changed.
/// </summary>
public sealed class OutliersStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => PerJoint.Run(take, context, (joint, track, findings) =>
    {
        if (context.PerJoint[joint].Outliers.Method != OutliersMethod.None)
        {
            return JointOutliers.Search(take, joint, context.PerJoint[joint], findings);
        }

        var marks = new TrackMarks(joint, track);
        marks.TellGaps();
        var (settled, all) = SignContinuity.Settle(marks.Track, [.. findings.Select(LeaveLeap), .. marks.Findings], joint, flagGuesses: true);
        return new JointResult(settled, all);
    });

    /// <summary>A leap of angles, which only the format can see, stays as delivered where nothing is looked for.</summary>
    private static Finding LeaveLeap(Finding f) => f is { Kind: FaultKind.SignFlip, Note.Length: > 0 } ? f with { Action = FaultAction.Noted } : f;
}
