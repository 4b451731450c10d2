using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// Bridges runs that are missing or rejected, joint by joint, where the settings allow it, and settles what the findings say about
/// them: filled with an expected error, or left or flagged with the reason. Nothing is put in before the first or after the last sample.
/// </summary>
public sealed class FillStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => PerJoint.Run(take, context, (j, track, findings) =>
        track.States.AsSpan().IndexOfAny(SampleState.Missing, SampleState.Rejected) < 0
            ? new JointResult(track, findings)
            : Fill(j, track, findings, new JointFill(track, take.Clock, take.TextRounding, context.PerJoint[j].Fill)));

    private static JointResult Fill(int joint, JointTrack track, ImmutableArray<Finding> findings, JointFill fill)
    {
        var runs = fill.Decide();
        return SignSettlement.Settle(joint, fill.Apply(runs), FillFindings.Settle(joint, track, findings, runs), runs);
    }
}
