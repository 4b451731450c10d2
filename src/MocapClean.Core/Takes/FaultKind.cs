namespace MocapClean.Core.Takes;

/// <summary>What a finding says about the data. A closed list; <see cref="FaultNames"/> has the spelling.</summary>
public enum FaultKind
{
    /// <summary>q to -q, or an Euler leap to another branch: same orientation, broken curve.</summary>
    SignFlip,

    /// <summary>Missing, not finite or all-zero samples.</summary>
    Gap,

    /// <summary>Leaves and returns within a few frames.</summary>
    Spike,

    /// <summary>Jumps and stays.</summary>
    Step,

    /// <summary>A step that later returns: the motion inside is good but turned by a constant rotation.</summary>
    Offset,

    /// <summary>Repeats while the joint should move.</summary>
    Freeze,

    /// <summary>Norm away from 1.</summary>
    OffUnit,

    /// <summary>Time skips: counts as a gap in every joint.</summary>
    LostFrames,

    /// <summary>Time stands still or runs back.</summary>
    Clock,

    /// <summary>A new value only every n-th frame, regularly.</summary>
    SlowUpdate,

    /// <summary>A posed first frame put in front of the motion.</summary>
    RestPose,

    /// <summary>Not a fault: the row that says how far smoothing moved a segment.</summary>
    Smoothing,
}
