using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Finds jumps in the increments of every joint and explains each by the cheapest story: spike, step, offset or freeze. Offsets are turned
/// back, runs that must be replaced are rejected and wait for the fill stage, everything else stays as delivered and is said.
/// </summary>
public sealed class OutliersStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => PerJoint.Run(take, context, (joint, track, findings) =>
        JointOutliers.Search(take, joint, context.PerJoint[joint], findings));
}
