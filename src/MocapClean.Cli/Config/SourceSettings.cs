using System.Collections.Immutable;
using MocapClean.Cli.Formats;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Config;

/// <summary>Which files are takes and how they are read.</summary>
public sealed record SourceSettings
{
    /// <summary>Files, folders or globs, relative to the config's folder or absolute.</summary>
    public ImmutableArray<string> Takes { get; init; } = [];

    /// <summary>Globs of files that are no takes.</summary>
    public ImmutableArray<string> Except { get; init; } = [];

    /// <summary>What relative output paths start from; empty: the deepest folder common to the fixed parts of the globs.</summary>
    public string Root { get; init; } = "";

    /// <summary>How takes are read.</summary>
    public ReadSettings Read { get; init; } = new();

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<SourceSettings> Table { get; } = new("ingest", "What is read and how.",
    [
        new("takes", new Shape.TextList(), "", "files, folders or globs (* within a name, ** across folders)",
            (s, v) => s with { Takes = v.List })
        {
            IsRequired = true, Unset = "required", Example = "takes/**/*.csv",
        },
        new("except", new Shape.TextList(), "", "globs of files that are no takes", (s, v) => s with { Except = v.List })
        {
            Example = "\"**/*_calibration.csv\"",
        },
        new("root", new Shape.FreeText(), "", "what relative output paths start from", (s, v) => s with { Root = v.Word })
        {
            Unset = "deepest folder common to the fixed parts of the globs", Example = "takes",
        },
        new("orientations", Shape.OneOf("world", "local"), "", "whether a joint's samples are relative to the room or to its parent",
            (s, v) => s with { Read = s.Read with { Space = v.Word == "world" ? OrientationSpace.World : OrientationSpace.Local } })
        {
            Unset = "world for CSV, local for BVH", Example = "world",
        },
        new("rate", Shape.Of(Unit.Hertz, 1, 100000), "", "frames a second, for takes without a time column",
            (s, v) => s with { Read = s.Read with { Rate = v.Number } })
        {
            Unset = "from the clock", Example = "120 Hz",
        },
        new("csv.layout", Shape.OneOf("auto", "wide", "long"), "auto", "wide: one row a frame; long: one row a joint and frame",
            (s, v) => s with { Read = s.Read with { CsvLayout = v.Word } }),
        new("csv.joint-columns", new Shape.FreeText("{joint}", "{component}"), "\"{joint}.{component}\"",
            "how a wide file names its orientation columns", (s, v) => s with { Read = s.Read with { CsvJointColumns = v.Word } }),
        new("csv.components", new Shape.TextList(Length: 4), "[qw, qx, qy, qz]", "names of the components in the order w, x, y, z",
            (s, v) => s with { Read = s.Read with { CsvComponents = v.List } }),
        new("csv.time", new Shape.FreeText(), "time", "name of the time column, in seconds",
            (s, v) => s with { Read = s.Read with { CsvTime = v.Word } }),
    ]);
}
