using System.Collections.Immutable;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Report;
using MocapClean.Core.Diff;
using MocapClean.Core.Stages;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Batch;

/// <summary>Everything a run needs to know, settled before the first take is opened.</summary>
public sealed record SessionPlan
{
    /// <summary>The session's title.</summary>
    public required string Title { get; init; }

    /// <summary>All takes of the session, in ordinal order of their names.</summary>
    public required ImmutableArray<PlannedTake> Takes { get; init; }

    /// <summary>How takes are read.</summary>
    public required ReadSettings Read { get; init; }

    /// <summary>Settings of each joint of a take: take name, joint name.</summary>
    public required Func<string, string, StageSettings> SettingsFor { get; init; }

    /// <summary>When a re-shoot is suggested.</summary>
    public required VerdictSettings Verdict { get; init; }

    /// <summary>Frame numbers and time codes of a take that was read.</summary>
    public required Func<ITakeFile, FrameLabels> LabelsFor { get; init; }

    /// <summary>First and last frame of the action of a take; null where it is not known.</summary>
    public required Func<string, Segment?> ActionFor { get; init; }

    /// <summary>The effective settings, for the session report and for the journal.</summary>
    public required ImmutableArray<SettingRow> Settings { get; init; }

    /// <summary>What the slates say of a take, as one text; empty where they say nothing.</summary>
    public required Func<string, string> SlateTextFor { get; init; }

    /// <summary>Fingerprint of all that can change an output beside the source and its slate: settings, program.</summary>
    public required string Fingerprint { get; init; }

    /// <summary>Names and globs of joints in the settings, each with the setting that holds it.</summary>
    public required ImmutableArray<(string Key, string Glob)> JointGlobs { get; init; }

    /// <summary>Whether keys are written.</summary>
    public bool WriteKeys { get; init; } = true;

    /// <summary>A larger source file is not read, bytes.</summary>
    public required long LargestTake { get; init; }

    /// <summary>Takes processed at the same time.</summary>
    public int Workers { get; init; } = Environment.ProcessorCount;
}

/// <summary>A take that a run will process.</summary>
/// <param name="Name">Path relative to the session's root, forward slashes.</param>
/// <param name="FullPath">Where it lies.</param>
public sealed record PlannedTake(string Name, string FullPath);
