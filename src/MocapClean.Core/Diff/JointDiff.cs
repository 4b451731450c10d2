namespace MocapClean.Core.Diff;

/// <summary>What was changed in one joint, measured on delivered and written samples.</summary>
public sealed record JointDiff
{
    /// <summary>The joint's name as delivered.</summary>
    public required string Name { get; init; }

    /// <summary>Samples missing after the run.</summary>
    public required int Missing { get; init; }

    /// <summary>Samples whose delivered text is kept to the byte.</summary>
    public required int Identical { get; init; }

    /// <summary>Samples of the same orientation written with the other sign or with length 1.</summary>
    public required int Rewritten { get; init; }

    /// <summary>Samples that only smoothing moved.</summary>
    public required int Smoothed { get; init; }

    /// <summary>Largest, RMS and 95th percentile of what smoothing moved them by, radians.</summary>
    public required ChangeSize Smoothing { get; init; }

    /// <summary>Samples filled or turned back.</summary>
    public required int Mended { get; init; }

    /// <summary>Largest, RMS and 95th percentile of what mends moved delivered samples by, radians; missing ones have no such angle.</summary>
    public required ChangeSize Mends { get; init; }

    /// <summary>Frames with a flagged or left row.</summary>
    public required int BadFrames { get; init; }
}
