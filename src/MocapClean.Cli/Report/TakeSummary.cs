using System.Collections.Immutable;
using MocapClean.Core.Diff;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report;

/// <summary>What the session's reports say of one take; kept in the journal so that a later run need not do the take again.</summary>
public sealed record TakeSummary
{
    /// <summary>Path relative to the session's root.</summary>
    public required string Take { get; init; }

    /// <summary>Why the take could not be processed; null where it was.</summary>
    public string? Failure { get; init; }

    /// <summary>SHA-256 of the source, lower-case hexadecimal; empty where it could not be read.</summary>
    public string SourceSha256 { get; init; } = "";

    /// <summary>Number of joints.</summary>
    public int Joints { get; init; }

    /// <summary>Number of frames.</summary>
    public int Frames { get; init; }

    /// <summary>Frames per second.</summary>
    public double Rate { get; init; }

    /// <summary>The suggestion, as written.</summary>
    public string Verdict { get; init; } = "";

    /// <summary>What carried the verdict.</summary>
    public string Reason { get; init; } = "";

    /// <summary>Bad frames inside the action.</summary>
    public int BadFrames { get; init; }

    /// <summary>Frames never recorded inside the action.</summary>
    public long LostFrames { get; init; }

    /// <summary>The finding that matters most, in plain words; empty where there is none.</summary>
    public string WorstFinding { get; init; } = "";

    /// <summary>SMPTE address of the worst finding.</summary>
    public string WorstTimecode { get; init; } = "";

    /// <summary>What was kept and what was changed.</summary>
    public SampleCounts Samples { get; init; } = new();

    /// <summary>Number of rows by kind and action.</summary>
    public ImmutableArray<FindingCount> Findings { get; init; } = [];

    /// <summary>Keys in all and what playing them back measured.</summary>
    public KeyFigures Keys { get; init; } = new(0, null, null);

    /// <summary>What the format had to say about the file.</summary>
    public ImmutableArray<string> Notes { get; init; } = [];

    /// <summary>What to shoot again or to look at.</summary>
    public ImmutableArray<WindowSummary> Windows { get; init; } = [];

    /// <summary>Joint by joint.</summary>
    public ImmutableArray<JointSummary> PerJoint { get; init; } = [];

    /// <summary>A take that could not be processed.</summary>
    public static TakeSummary Failed(string take, string sha256, string failure) =>
        new() { Take = take, SourceSha256 = sha256, Failure = failure };

    /// <summary>The summary of a processed take.</summary>
    public static TakeSummary Of(TakeReport report, string sha256)
    {
        var (take, judgement, labels) = (report.Take, report.Judgement, report.Labels);
        var worst = Worst(take);
        return new TakeSummary
        {
            Take = take.Name,
            SourceSha256 = sha256,
            Joints = take.Tracks.Length,
            Frames = take.Length,
            Rate = Math.Round(take.Clock.Rate, 6),
            Verdict = judgement.Verdict.Text(),
            Reason = judgement.Reason,
            BadFrames = judgement.BadFrames,
            LostFrames = judgement.LostFrames,
            WorstFinding = worst is null ? "" : $"{report.JointName(worst)} {FindingWords.What(worst, take.Clock.Rate)}".TrimStart(),
            WorstTimecode = worst is null ? "" : labels.TimeCode(worst.First),
            Samples = SampleCounts.Of(report.Diff),
            Findings = FindingCount.Of(take.Findings),
            Keys = KeyFigures.Of(report.Keys),
            Notes = take.Notes,
            Windows = [.. judgement.Windows.Select(w => WindowSummary.Of(w, labels))],
            PerJoint = [.. take.Tracks.Select((t, j) => JointSummary.Of(t, report.Diff.Joints[j], report.Keys[j]))],
        };
    }

    /// <summary>Flagged before mended, then the longest, then the largest.</summary>
    private static Finding? Worst(Take take) => take.Findings
        .Where(f => f.Kind is not (FaultKind.Smoothing or FaultKind.OffUnit or FaultKind.RestPose))
        .Where(f => f.Kind != FaultKind.SignFlip || f.Action == FaultAction.Flagged)
        .OrderByDescending(f => f.Action is FaultAction.Flagged or FaultAction.Left)
        .ThenByDescending(f => f.Count + f.Lost).ThenByDescending(f => double.IsNaN(f.SizeRadians) ? 0 : f.SizeRadians)
        .ThenBy(f => f.Joint).ThenBy(f => f.First).FirstOrDefault();
}
