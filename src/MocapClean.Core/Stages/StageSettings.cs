using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Ingest;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Stages.Smooth;

namespace MocapClean.Core.Stages;

/// <summary>The settings of all stages for one joint. The defaults are those of the tables in each stage's folder.</summary>
public sealed record StageSettings
{
    /// <summary>Ingest.</summary>
    public IngestSettings Ingest { get; init; } = new();

    /// <summary>Outlier detection.</summary>
    public OutliersSettings Outliers { get; init; } = new();

    /// <summary>Fill.</summary>
    public FillSettings Fill { get; init; } = new();

    /// <summary>Smoothing.</summary>
    public SmoothSettings Smooth { get; init; } = new();

    /// <summary>Key reduction.</summary>
    public ReduceSettings Reduce { get; init; } = new();
}
