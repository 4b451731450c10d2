using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>The Smooth stage.</summary>
public sealed class SmoothStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => take;
}
