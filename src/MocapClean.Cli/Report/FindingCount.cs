using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report;

/// <summary>How many rows of a kind and action a take has, and how many frames they hold.</summary>
public sealed record FindingCount(string Kind, string Action, int Rows, long Frames)
{
    /// <summary>The counts of a take's findings, in the order of the kinds; smoothing left out.</summary>
    public static ImmutableArray<FindingCount> Of(ImmutableArray<Finding> findings) =>
    [
        .. findings.Where(f => f.Kind != FaultKind.Smoothing).GroupBy(f => (f.Kind, f.Action)).OrderBy(g => g.Key)
            .Select(g => new FindingCount(g.Key.Kind.Text(), g.Key.Action.Text(), g.Count(), g.Sum(f => (long)f.Count))),
    ];
}
