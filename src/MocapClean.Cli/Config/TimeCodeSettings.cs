using System.Collections.Immutable;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Config;

/// <summary>How frames of takes become time-code addresses.</summary>
public sealed record TimeCodeSettings
{
    private static readonly ImmutableArray<string> Rates = [.. TimeCodeRate.All.Where(r => !r.DropFrame).Select(r => r.Name)];

    /// <summary>Rate as written, such as <c>29.97</c>; empty: no time code.</summary>
    public string Rate { get; init; } = "";

    /// <summary>Drop-frame counting, at 29.97 and 59.94 only.</summary>
    public bool IsDropFrame { get; init; }

    /// <summary>CSV file of slates, relative to the config's folder or absolute; empty: none.</summary>
    public string Slates { get; init; } = "";

    /// <summary>Carried column that holds each frame's address; empty: none.</summary>
    public string Column { get; init; } = "";

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<TimeCodeSettings> Table { get; } = new("time-code", "Addresses (SMPTE ST 12-1) beside frame numbers.",
    [
        new("rate", new Shape.Choice(Rates), "", "time-code frames a second",
            (s, v) => s with { Rate = v.Word }) { Example = "25" },
        new("drop-frame", new Shape.Flag(), "false", "drop-frame counting, at 29.97 and 59.94",
            (s, v) => s with { IsDropFrame = v.Word == "true" }),
        new("slates", new Shape.FreeText(), "", "CSV with take, frame, timecode and, where wanted, action_first, action_last",
            (s, v) => s with { Slates = v.Word }) { Example = "slates.csv" },
        new("column", new Shape.FreeText(), "", "carried column with each frame's address, in place of slates",
            (s, v) => s with { Column = v.Word }) { Example = "timecode" },
    ]);

    /// <summary>How frames are counted; null where there is no time code.</summary>
    public TimeCodeRate? CountedAt => TimeCodeRate.All.FirstOrDefault(r => r.Name == (IsDropFrame ? Rate + " DF" : Rate));

    /// <summary>What does not go together, as a key of this block and a message; null when all does.</summary>
    internal (string Key, string Message)? Conflict() => this switch
    {
        { IsDropFrame: true, CountedAt: null } => ("drop-frame", "time-code.drop-frame goes with time-code.rate 29.97 or 59.94 only"),
        { Rate: "", Slates.Length: > 0 } => ("slates", "time-code.slates needs time-code.rate"),
        { Rate: "", Column.Length: > 0 } => ("column", "time-code.column needs time-code.rate"),
        { Slates.Length: > 0, Column.Length: > 0 } => ("column", "give time-code.slates or time-code.column, not both"),
        _ => null,
    };
}
