using System.Collections.Immutable;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Ingest;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Stages.Unwrap;

namespace MocapClean.Core.Stages;

/// <summary>A stage with its name and its settings.</summary>
/// <param name="Name">Name in timings and pages, and of its block in the config where it has settings.</param>
/// <param name="Stage">The stage.</param>
/// <param name="Settings">Its settings; empty where it has none.</param>
public sealed record StageEntry(string Name, IStage Stage, SettingBlock<StageSettings> Settings);

/// <summary>All stages in order of flow. A new stage is one folder and one line here.</summary>
public static class StageCatalog
{
    /// <summary>From the delivered take to the keys.</summary>
    public static ImmutableArray<StageEntry> All { get; } =
    [
        Entry("ingest", new IngestStage(), IngestSettings.Table, s => s.Ingest, (s, v) => s with { Ingest = v }),
        Entry("unwrap", new UnwrapStage()),
        Entry("outliers", new OutliersStage(), OutliersSettings.Table, s => s.Outliers, (s, v) => s with { Outliers = v }),
        Entry("fill", new FillStage(), FillSettings.Table, s => s.Fill, (s, v) => s with { Fill = v }),
        Entry("smooth", new SmoothStage(), SmoothSettings.Table, s => s.Smooth, (s, v) => s with { Smooth = v }),
        Entry("reduce", new ReduceStage(), ReduceSettings.Table, s => s.Reduce, (s, v) => s with { Reduce = v }),
    ];

    private static StageEntry Entry(string name, IStage stage) => new(name, stage, new(name, "", []));

    private static StageEntry Entry<T>(
        string name, IStage stage, SettingBlock<T> block, Func<StageSettings, T> get, Func<StageSettings, T, StageSettings> set) =>
        new(name, stage, new(block.Name, block.Meaning, [.. block.Settings.Select(s => s.Lift(get, set))]));
}
