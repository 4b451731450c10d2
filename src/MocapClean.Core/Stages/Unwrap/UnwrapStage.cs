using MocapClean.Core.Kernels;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Unwrap;

/// <summary>
/// Makes every track continuous in sign. The outlier stage settles the signs again once it knows which samples mislead the rule; where it
/// is switched off, guesses are flagged here.
/// </summary>
public sealed class UnwrapStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => PerJoint.Run(take, context, (joint, track, findings) =>
    {
        var last = context.PerJoint[joint].Outliers.Method == OutliersMethod.None;
        var (settled, rows) = SignContinuity.Settle(track, findings, joint, flagGuesses: last);
        return new JointResult(settled, rows);
    });
}
