using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Unwrap;

/// <summary>The Unwrap stage.</summary>
public sealed class UnwrapStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => take;
}
