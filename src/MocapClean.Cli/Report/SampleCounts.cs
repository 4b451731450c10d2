using MocapClean.Core.Diff;

namespace MocapClean.Cli.Report;

/// <summary>The samples of a take by what was done to them.</summary>
public sealed record SampleCounts
{
    /// <summary>Text kept to the byte.</summary>
    public long Identical { get; init; }

    /// <summary>Same orientation, written with the other sign or with length 1.</summary>
    public long Rewritten { get; init; }

    /// <summary>Only smoothed.</summary>
    public long Smoothed { get; init; }

    /// <summary>The farthest that smoothing moved a sample, degrees.</summary>
    public double? LargestSmoothingDeg { get; init; }

    /// <summary>Filled or turned back.</summary>
    public long Mended { get; init; }

    /// <summary>The farthest that a mend moved a delivered sample, degrees.</summary>
    public double? LargestMendDeg { get; init; }

    /// <summary>Missing before and after.</summary>
    public long Missing { get; init; }

    /// <summary>The counts of a take.</summary>
    public static SampleCounts Of(TakeDiff diff) => new()
    {
        Identical = diff.Joints.Sum(j => (long)j.Identical),
        Rewritten = diff.Joints.Sum(j => (long)j.Rewritten),
        Smoothed = diff.Joints.Sum(j => (long)j.Smoothed),
        LargestSmoothingDeg = ReportDegrees.Of(diff.Joints.Max(j => j.Smoothing.Largest)),
        Mended = diff.Joints.Sum(j => (long)j.Mended),
        LargestMendDeg = ReportDegrees.Of(diff.Joints.Max(j => j.Mends.Largest)),
        Missing = diff.Joints.Sum(j => (long)j.Missing),
    };
}
