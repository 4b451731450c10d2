using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>The Reduce stage.</summary>
public sealed class ReduceStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => take;
}
