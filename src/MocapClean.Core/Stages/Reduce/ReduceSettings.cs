using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>The rule by which the receiving software turns keys into motion.</summary>
public enum Playback
{
    /// <summary>Constant speed along the shorter arc.</summary>
    Slerp,

    /// <summary>Components interpolated, then renormalised.</summary>
    ComponentLinear,
}

/// <summary>Settings of the reduction stage.</summary>
public sealed record ReduceSettings
{
    /// <summary>Largest angle at any frame between the track and its keys as played back, radians.</summary>
    public double Tolerance { get; init; } = Angle.FromDegrees(0.5);

    /// <summary>Playback rule.</summary>
    public Playback Playback { get; init; } = Playback.Slerp;

    /// <summary>Widest turn between neighbouring keys, radians.</summary>
    public double Widest { get; init; } = Angle.FromDegrees(90);

    /// <summary>Longest time between neighbouring keys.</summary>
    public Extent Longest { get; init; } = Extent.Seconds(10);

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<ReduceSettings> Table { get; } = new("reduce", "The fewest keys that play back within the tolerance.",
    [
        new("tolerance", Shape.Of(Unit.Degrees, 0.001, 90), "0.5 deg",
            "largest angle at any frame between the track and its keys as played back", (s, v) => s with { Tolerance = v.Radians }),
        new("playback", Shape.OneOf("slerp", "component-linear"), "slerp",
            "how the receiving software turns keys into motion",
            (s, v) => s with { Playback = v.Word == "slerp" ? Playback.Slerp : Playback.ComponentLinear }),
        new("widest", Shape.Of(Unit.Degrees, 1, 180), "90 deg", "widest turn between neighbouring keys", (s, v) => s with { Widest = v.Radians }),
        new("longest", Shape.Of(Unit.FramesOrTime, 0.001, 1000000), "10 s",
            "longest time between neighbouring keys", (s, v) => s with { Longest = v.Extent }),
    ]);
}
