using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Ingest;

/// <summary>The Ingest stage.</summary>
public sealed class IngestStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) => take;
}
