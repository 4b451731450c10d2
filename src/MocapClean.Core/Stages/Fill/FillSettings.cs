using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Core.Stages.Fill;

/// <summary>How missing and rejected runs are bridged.</summary>
public enum FillMethod
{
    /// <summary>Gaussian-process regression on the angular velocity.</summary>
    GaussianProcess,

    /// <summary>Cubic in the rotation vector, with end speeds from the neighbours.</summary>
    Spline,

    /// <summary>Constant angular velocity from edge to edge.</summary>
    Slerp,

    /// <summary>Nothing is filled.</summary>
    None,
}

/// <summary>Settings of the fill stage.</summary>
public sealed record FillSettings
{
    /// <summary>Method.</summary>
    public FillMethod Method { get; init; } = FillMethod.GaussianProcess;

    /// <summary>Longest run that is filled.</summary>
    public Extent Longest { get; init; } = Extent.Seconds(0.5);

    /// <summary>Widest turn from edge to edge that is filled, radians.</summary>
    public double Widest { get; init; } = Angle.FromDegrees(90);

    /// <summary>Largest expected error, RMS over the run, that is filled, radians.</summary>
    public double Worst { get; init; } = Angle.FromDegrees(3);

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<FillSettings> Table { get; } = new("fill", "Missing and rejected runs are bridged.",
    [
        new("method", Shape.OneOf("gaussian-process", "spline", "slerp", "none"), "gaussian-process", "how a run is bridged: as the joint moves in this take, by a cubic in the rotation vector, straight, or not at all",
            (s, v) => s with
            {
                Method = v.Word switch
                {
                    "spline" => FillMethod.Spline,
                    "slerp" => FillMethod.Slerp,
                    "none" => FillMethod.None,
                    _ => FillMethod.GaussianProcess,
                },
            }),
        new("longest", Shape.Of(Unit.FramesOrTime, 0, 100000), "500 ms",
            "longest run that is filled; longer ones are flagged", (s, v) => s with { Longest = v.Extent })
            { OnlyFor = ["gaussian-process", "spline", "slerp"] },
        new("widest", Shape.Of(Unit.Degrees, 0, 180), "90 deg",
            "widest turn from edge to edge that is filled", (s, v) => s with { Widest = v.Radians })
            { OnlyFor = ["gaussian-process", "spline", "slerp"] },
        new("worst", Shape.Of(Unit.Degrees, 0, 180), "3 deg",
            "largest expected error that is filled, and largest disagreement of the two ends of an offset that is turned back",
            (s, v) => s with { Worst = v.Radians }) { OnlyFor = ["gaussian-process", "spline", "slerp"] },
    ]);
}
