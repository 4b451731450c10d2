using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>How jumps are found.</summary>
public enum OutliersMethod
{
    /// <summary>Increments against what the trusted neighbourhood predicts.</summary>
    Innovation,

    /// <summary>Nothing is looked for.</summary>
    None,
}

/// <summary>Settings of the outlier stage.</summary>
public sealed record OutliersSettings
{
    /// <summary>Method.</summary>
    public OutliersMethod Method { get; init; } = OutliersMethod.Innovation;

    /// <summary>How many robust standard deviations make a jump.</summary>
    public double Threshold { get; init; } = 6;

    /// <summary>Turning faster than this is a jump to explain, radians per second; capped by the stage at 170 degrees a frame.</summary>
    public double TopSpeed { get; init; } = Angle.FromDegrees(12000);

    /// <summary>The longest run that may be a spike.</summary>
    public Extent LongestSpike { get; init; } = Extent.Frames(8);

    /// <summary>The longest run that may be an offset.</summary>
    public Extent LongestOffset { get; init; } = Extent.Seconds(3);

    /// <summary>The shortest run of exact repeats that may be a freeze; at least 4 frames.</summary>
    public Extent Freeze { get; init; } = Extent.Seconds(0.025);

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<OutliersSettings> Table { get; } = new("outliers", "Outlier detection by angular jump.",
    [
        new("method", Shape.OneOf("innovation", "none"), "innovation",
            "innovation: jumps against what the neighbourhood predicts; none: nothing is looked for",
            (s, v) => s with { Method = v.Word == "none" ? OutliersMethod.None : OutliersMethod.Innovation }),
        new("threshold", Shape.Of(Unit.Spreads, 1, 100), "6 spreads",
            "robust standard deviations that make a jump", (s, v) => s with { Threshold = v.Number }) { OnlyFor = ["innovation"] },
        new("top-speed", Shape.Of(Unit.DegreesPerSecond, 100, 100000), "12000 deg/s",
            "turning faster is a jump to explain, never a fault by itself; capped at 170 deg a frame",
            (s, v) => s with { TopSpeed = v.Radians }) { OnlyFor = ["innovation"] },
        new("longest-spike", Shape.Of(Unit.FramesOrTime, 0, 1000), "8 frames",
            "the longest run that may be a spike", (s, v) => s with { LongestSpike = v.Extent }) { OnlyFor = ["innovation"] },
        new("longest-offset", Shape.Of(Unit.FramesOrTime, 0, 100000), "3 s",
            "the longest run that may be an offset", (s, v) => s with { LongestOffset = v.Extent }) { OnlyFor = ["innovation"] },
        new("freeze", Shape.Of(Unit.FramesOrTime, 0, 100000), "25 ms",
            "the shortest run of repeats that may be a freeze, at least 4 frames",
            (s, v) => s with { Freeze = v.Extent }) { OnlyFor = ["innovation"] },
    ]);
}
