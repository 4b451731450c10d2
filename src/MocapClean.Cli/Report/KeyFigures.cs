using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report;

/// <summary>Keys and their playback error as measured from the written file, degrees.</summary>
public sealed record KeyFigures(int Count, double? LargestErrorDeg, double? RmsErrorDeg)
{
    /// <summary>The figures of all joints together.</summary>
    public static KeyFigures Of(ImmutableArray<KeySet> keys)
    {
        var with = keys.Where(k => k.Frames.Length > 0).ToList();
        return with.Count == 0
            ? new KeyFigures(0, null, null)
            : new KeyFigures(
                with.Sum(k => k.Frames.Length),
                ReportDegrees.Of(with.Max(k => k.LargestErrorRadians)),
                ReportDegrees.Of(Math.Sqrt(with.Average(k => k.RmsErrorRadians * k.RmsErrorRadians))));
    }
}
