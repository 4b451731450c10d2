using System.Collections.Immutable;

namespace MocapClean.Core.Takes;

/// <summary>One continuous recording: a clock, joints, and the findings so far. Carried columns stay with the file that holds them.</summary>
public sealed record Take
{
    /// <summary>Path relative to the session's root, with forward slashes and extension: the take's name everywhere.</summary>
    public required string Name { get; init; }

    /// <summary>Time of every frame.</summary>
    public required Clock Clock { get; init; }

    /// <summary>One for each joint, in the order delivered, all as long as the clock.</summary>
    public required ImmutableArray<JointTrack> Tracks { get; init; }

    /// <summary>Whether samples are relative to the parent or to the room.</summary>
    public required OrientationSpace Space { get; init; }

    /// <summary>The hierarchy, where the format has one.</summary>
    public Skeleton? Skeleton { get; init; }

    /// <summary>
    /// Half a unit of the last printed digit, as an angle in radians: what rounding of the delivered text can move a sample by.
    /// </summary>
    public double TextRounding { get; init; } = 1e-9;

    /// <summary>What ingest and the stages found, in the order found.</summary>
    public ImmutableArray<Finding> Findings { get; init; } = [];

    /// <summary>What the reader has to say about the take as a whole, a sentence each, such as which joints it had to carry and why.</summary>
    public ImmutableArray<string> Notes { get; init; } = [];

    /// <summary>Number of frames.</summary>
    public int Length => Clock.Length;
}
