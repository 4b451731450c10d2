using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>The Outliers stage.</summary>
public sealed class OutliersStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => take;
}
