using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>The Fill stage.</summary>
public sealed class FillStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => take;
}
