using System.Collections.Immutable;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Where results go and how they are numbered.</summary>
public sealed record OutputSettings
{
    /// <summary>The folder, relative to the config's folder or absolute.</summary>
    public string Folder { get; init; } = "";

    /// <summary>Formats of the keys.</summary>
    public ImmutableArray<string> Keys { get; init; } = ["csv"];

    /// <summary>Number of the first frame in everything a person reads.</summary>
    public int FirstFrame { get; init; }

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<OutputSettings> Table { get; } = new("output", "Where results go.",
    [
        new("folder", new Shape.FreeText(), "", "a folder of its own, made where it is missing", (s, v) => s with { Folder = v.Word })
        {
            IsRequired = true, Unset = "required", Example = "out",
        },
        new("keys", new Shape.WordList("csv"), "[csv]", "formats of the keys", (s, v) => s with { Keys = v.List }),
        new("first-frame", new Shape.WholeNumber(0, 1_000_000_000), "0", "number of the first frame in everything a person reads",
            (s, v) => s with { FirstFrame = v.Whole }),
    ]);
}
