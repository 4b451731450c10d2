using MocapClean.Core.Diff;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report;

/// <summary>One joint of a take in figures, degrees and hertz.</summary>
public sealed record JointSummary
{
    /// <summary>The joint's name.</summary>
    public required string Name { get; init; }

    /// <summary>Frames with a flagged or left row.</summary>
    public int BadFrames { get; init; }

    /// <summary>Samples filled or turned back.</summary>
    public int Mended { get; init; }

    /// <summary>Samples only smoothed.</summary>
    public int Smoothed { get; init; }

    /// <summary>The farthest that smoothing moved a sample.</summary>
    public double? LargestSmoothingDeg { get; init; }

    /// <summary>RMS of what smoothing moved samples by.</summary>
    public double? RmsSmoothingDeg { get; init; }

    /// <summary>95th percentile of what smoothing moved samples by.</summary>
    public double? Percentile95SmoothingDeg { get; init; }

    /// <summary>The farthest that a mend moved a delivered sample.</summary>
    public double? LargestMendDeg { get; init; }

    /// <summary>Estimated noise of one sample, RMS per axis.</summary>
    public double? NoiseDeg { get; init; }

    /// <summary>Cutoff of the two-pass low-pass of equal effect.</summary>
    public double? CutoffHz { get; init; }

    /// <summary>Keys.</summary>
    public int Keys { get; init; }

    /// <summary>Largest playback error of the written keys.</summary>
    public double? LargestKeyErrorDeg { get; init; }

    /// <summary>The figures of one joint.</summary>
    public static JointSummary Of(JointTrack track, JointDiff diff, KeySet keys) => new()
    {
        Name = track.Name,
        BadFrames = diff.BadFrames,
        Mended = diff.Mended,
        Smoothed = diff.Smoothed,
        LargestSmoothingDeg = ReportDegrees.Of(diff.Smoothing.Largest),
        RmsSmoothingDeg = ReportDegrees.Of(diff.Smoothing.Rms),
        Percentile95SmoothingDeg = ReportDegrees.Of(diff.Smoothing.Percentile95),
        LargestMendDeg = ReportDegrees.Of(diff.Mends.Largest),
        NoiseDeg = ReportDegrees.Of(track.Smoothing?.NoiseRadians),
        CutoffHz = track.Smoothing is { } s && double.IsFinite(s.CutoffHertz) ? Math.Round(s.CutoffHertz, 3) : null,
        Keys = keys.Frames.Length,
        LargestKeyErrorDeg = keys.Frames.Length > 0 ? ReportDegrees.Of(keys.LargestErrorRadians) : null,
    };
}
