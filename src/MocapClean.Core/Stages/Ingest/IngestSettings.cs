using MocapClean.Core.Stages.Settings;

namespace MocapClean.Core.Stages.Ingest;

/// <summary>Settings of the ingest stage.</summary>
public sealed record IngestSettings
{
    /// <summary>Norm error that is a finding, as a fraction of 1; smaller ones are rounding.</summary>
    public double OffUnit { get; init; } = 0.01;

    /// <summary>A first frame in which most joints are posed elsewhere is recognised and left alone.</summary>
    public bool RecogniseRestPose { get; init; } = true;

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<IngestSettings> Table { get; } = new("ingest", "What is read and how.",
    [
        new("off-unit", Shape.Of(Unit.Percent, 0.0001, 50), "1 %",
            "norm error that is a finding; smaller ones are rounding", (s, v) => s with { OffUnit = v.Fraction }),
        new("bvh.rest-frame", Shape.OneOf("auto", "as-motion"), "auto",
            "auto: a first frame in which most joints stand elsewhere is labelled rest-pose and left; as-motion: judged like any other",
            (s, v) => s with { RecogniseRestPose = v.Word == "auto" }),
    ]);
}
