using System.Collections.Immutable;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Core.Diff;

/// <summary>When a take should be shot again, in the tool's opinion.</summary>
public sealed record VerdictSettings
{
    /// <summary>Share of bad frames inside the action above which a re-shoot is suggested, as a fraction of 1.</summary>
    public double BadFrames { get; init; } = 0.02;

    /// <summary>A longer gap that was not filled suggests a re-shoot.</summary>
    public Extent LongestGap { get; init; } = Extent.Seconds(0.5);

    /// <summary>Names or globs of joints in which a few bad frames already suggest a re-shoot.</summary>
    public ImmutableArray<string> Critical { get; init; } = [];

    /// <summary>How many bad frames in a critical joint are still accepted.</summary>
    public int CriticalFrames { get; init; } = 3;

    /// <summary>Names or globs of joints that count in no verdict.</summary>
    public ImmutableArray<string> Ignore { get; init; } = [];

    /// <summary>Lead before the bad frames of a re-shoot window.</summary>
    public Extent Before { get; init; } = Extent.Seconds(1);

    /// <summary>Time after the bad frames of a re-shoot window.</summary>
    public Extent After { get; init; } = Extent.Seconds(1);

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<VerdictSettings> Table { get; } = new("reshoot", "When a re-shoot is suggested.",
    [
        new("bad-frames", Shape.Of(Unit.Percent, 0, 100), "2 %",
            "share of bad frames inside the action above which a re-shoot is suggested", (s, v) => s with { BadFrames = v.Fraction }),
        new("longest-gap", Shape.Of(Unit.FramesOrTime, 0, 1000000), "500 ms",
            "a longer gap that was not filled suggests a re-shoot", (s, v) => s with { LongestGap = v.Extent }),
        new("critical", new Shape.TextList(), "",
            "joints (globs) in which a few bad frames already suggest a re-shoot", (s, v) => s with { Critical = v.List })
            { Example = "[pelvis, \"foot_*\"]" },
        new("critical-frames", Shape.Of(Unit.Frames, 0, 1000000), "3 frames",
            "bad frames in a critical joint that are still accepted", (s, v) => s with { CriticalFrames = v.Whole }),
        new("ignore", new Shape.TextList(), "", "joints (globs) that count in no verdict", (s, v) => s with { Ignore = v.List })
            { Example = "\"*thumb*\"" },
        new("before", Shape.Of(Unit.FramesOrTime, 0, 1000000), "1 s", "lead before the bad frames of a window", (s, v) => s with { Before = v.Extent }),
        new("after", Shape.Of(Unit.FramesOrTime, 0, 1000000), "1 s", "time after the bad frames of a window", (s, v) => s with { After = v.Extent }),
    ]);
}
