using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>How frames of takes become time-code addresses.</summary>
public sealed record TimeCodeSettings
{
    /// <summary>Nominal rate as written, such as <c>29.97</c>; empty: no time code.</summary>
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
        new("rate", Shape.OneOf("23.976", "24", "25", "29.97", "30", "50", "59.94", "60"), "", "time-code frames a second",
            (s, v) => s with { Rate = v.Word }) { Example = "25" },
        new("drop-frame", new Shape.Flag(), "false", "drop-frame counting, at 29.97 and 59.94",
            (s, v) => s with { IsDropFrame = v.Word == "true" }),
        new("slates", new Shape.Text(), "", "CSV with take, frame, timecode and, where wanted, action_first, action_last",
            (s, v) => s with { Slates = v.Word }) { Example = "slates.csv" },
        new("column", new Shape.Text(), "", "carried column with each frame's address, in place of slates",
            (s, v) => s with { Column = v.Word }) { Example = "timecode" },
    ]);

    /// <summary>What does not go together, as a key of this block and a message; null when all does.</summary>
    internal (string Key, string Message)? Conflict() => this switch
    {
        { IsDropFrame: true, Rate: not ("29.97" or "59.94") } => ("drop-frame", "time-code.drop-frame goes with time-code.rate 29.97 or 59.94 only"),
        { Rate: "", Slates.Length: > 0 } => ("slates", "time-code.slates needs time-code.rate"),
        { Rate: "", Column.Length: > 0 } => ("column", "time-code.column needs time-code.rate"),
        { Slates.Length: > 0, Column.Length: > 0 } => ("column", "give time-code.slates or time-code.column, not both"),
        _ => null,
    };
}
