using MocapClean.Core.Stages.Settings;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>How a track is smoothed.</summary>
public enum SmoothMethod
{
    /// <summary>Whittaker with a penalty that follows the motion.</summary>
    Adaptive,

    /// <summary>Third-difference penalty of one strength for the track.</summary>
    Whittaker,

    /// <summary>Second order, run forwards and backwards.</summary>
    Butterworth,

    /// <summary>Local least-squares polynomial.</summary>
    SavitzkyGolay,

    /// <summary>Nothing is smoothed.</summary>
    None,
}

/// <summary>Settings of the smoothing stage.</summary>
public sealed record SmoothSettings
{
    /// <summary>Method.</summary>
    public SmoothMethod Method { get; init; } = SmoothMethod.Adaptive;

    /// <summary>Cutoff of the two passes together, hertz; NaN chooses by cross-validation.</summary>
    public double CutoffHertz { get; init; } = double.NaN;

    /// <summary>Length of the polynomial's window.</summary>
    public Extent Window { get; init; } = Extent.Seconds(0.1);

    /// <summary>Degree of the polynomial.</summary>
    public int Order { get; init; } = 3;

    /// <summary>Largest angle in radians that any sample may be moved by; infinite where there is no bound.</summary>
    public double LargestRadians { get; init; } = double.PositiveInfinity;

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<SmoothSettings> Table { get; } = new("smooth", "Smoothing in the quaternion domain, renormalised.",
    [
        new("method", Shape.OneOf("adaptive", "whittaker", "butterworth", "savitzky-golay", "none"), "adaptive", "strong at rest and weak in motion; one strength a joint; two-pass low-pass; local polynomial; not at all",
            (s, v) => s with
            {
                Method = v.Word switch
                {
                    "whittaker" => SmoothMethod.Whittaker,
                    "butterworth" => SmoothMethod.Butterworth,
                    "savitzky-golay" => SmoothMethod.SavitzkyGolay,
                    "none" => SmoothMethod.None,
                    _ => SmoothMethod.Adaptive,
                },
            }),
        new("cutoff", Shape.Of(Unit.Hertz, 0.01, 10000, "auto"), "auto",
            "cutoff of both passes together; auto chooses by cross-validation, joint by joint",
            (s, v) => s with { CutoffHertz = v.Number }) { OnlyFor = ["butterworth"] },
        new("window", Shape.Of(Unit.FramesOrTime, 0.001, 100000), "100 ms",
            "length of the polynomial's window, made odd", (s, v) => s with { Window = v.Extent }) { OnlyFor = ["savitzky-golay"] },
        new("order", new Shape.WholeNumber(0, 7), "3", "degree of the polynomial", (s, v) => s with { Order = v.Whole }) { OnlyFor = ["savitzky-golay"] },
        new("largest", Shape.Of(Unit.Degrees, 0.001, 180, "off"), "off", "largest turn by which any sample may be moved",
            (s, v) => s with { LargestRadians = v.IsWord ? double.PositiveInfinity : v.Radians }),
    ]);
}
