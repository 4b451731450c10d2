using System.Collections.Immutable;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Takes;

/// <summary>
/// One joint's series of unit quaternions, one per frame of the take; before ingest they still have the length that the file gave them.
/// <see cref="Delivered"/> never changes after ingest; later stages replace <see cref="Samples"/>, <see cref="States"/> and <see cref="Breaks"/>.
/// </summary>
public sealed record JointTrack
{
    /// <summary>The joint's name as delivered.</summary>
    public required string Name { get; init; }

    /// <summary>What the file held, projected to the unit sphere; NaN where a sample is missing.</summary>
    public required ImmutableArray<Quat> Delivered { get; init; }

    /// <summary>The series as it stands after the last stage; same length as <see cref="Delivered"/>.</summary>
    public required ImmutableArray<Quat> Samples { get; init; }

    /// <summary>State of each sample; same length.</summary>
    public required ImmutableArray<SampleState> States { get; init; }

    /// <summary>
    /// Frames, rising, that begin a new segment: nothing may be smoothed or differenced between such a frame and the one before it
    /// (a step, a guessed sign, time lost).
    /// </summary>
    public ImmutableArray<int> Breaks { get; init; } = [];

    /// <summary>Frames whose delivered length was so far from 1 that the written text must change even where the direction does not.</summary>
    public ImmutableArray<int> Renormalised { get; init; } = [];

    /// <summary>The source writes quaternions, so that q and -q are two texts; angles have no sign to flip.</summary>
    public bool HasSigns { get; init; } = true;

    /// <summary>A new value comes only every n-th frame (1: every frame).</summary>
    public int UpdateEvery { get; init; } = 1;

    /// <summary>What the smoothing stage found out about this joint; null before it.</summary>
    public SmoothingMeasure? Smoothing { get; init; }

    /// <summary>The keys that the reduction stage chose; null before it.</summary>
    public KeySet? Keys { get; init; }

    /// <summary>Number of frames.</summary>
    public int Length => Samples.Length;
}
