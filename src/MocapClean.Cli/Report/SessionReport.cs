using System.Collections.Immutable;
using MocapClean.Core.Diff;

namespace MocapClean.Cli.Report;

/// <summary>What the session's reports say, whatever order or machine did the takes.</summary>
public sealed record SessionReport
{
    /// <summary>The session's title.</summary>
    public required string Session { get; init; }

    /// <summary>Version of this program.</summary>
    public required string Version { get; init; }

    /// <summary>Always the same words: whose call it is.</summary>
    public string Caution { get; init; } = Cautions.Verdict;

    /// <summary>Number of takes by verdict, and of those that failed or were not run.</summary>
    public required ImmutableArray<VerdictCount> Verdicts { get; init; }

    /// <summary>The effective settings with where each came from.</summary>
    public required ImmutableArray<SettingRow> Settings { get; init; }

    /// <summary>Every take of the session, in order of name.</summary>
    public required ImmutableArray<TakeSummary> Takes { get; init; }

    /// <summary>Trouble by joint across the takes.</summary>
    public required ImmutableArray<JointTrouble> Trouble { get; init; }

    /// <summary>Settings whose names or globs match no joint of any take: mistyped, most likely.</summary>
    public required ImmutableArray<string> UnmatchedJoints { get; init; }

    /// <summary>Matched takes that no run has processed yet.</summary>
    public required ImmutableArray<string> NotRun { get; init; }

    /// <summary>Takes whose outputs are of another source, other settings or another version of the program.</summary>
    public required ImmutableArray<string> Stale { get; init; }

    /// <summary>Files in the output folder that belong to no take or setting of this session.</summary>
    public required ImmutableArray<string> Leftovers { get; init; }

    /// <summary>Takes that are not accepted, the most urgent first.</summary>
    public IEnumerable<TakeSummary> MostUrgentFirst() => Takes
        .Where(t => t.Windows.Length > 0)
        .OrderByDescending(t => t.Verdict == Verdict.Reshoot.Text())
        .ThenByDescending(t => (t.BadFrames + t.LostFrames) / (double)Math.Max(1, t.Frames))
        .ThenBy(t => t.Take, StringComparer.Ordinal);
}

/// <summary>Number of takes with a verdict.</summary>
public sealed record VerdictCount(string Verdict, int Takes);

/// <summary>A setting in force.</summary>
/// <param name="Key">Full name, such as <c>outliers.threshold</c>.</param>
/// <param name="Value">As a person would write it.</param>
/// <param name="From">Where it came from.</param>
public sealed record SettingRow(string Key, string Value, string From);
