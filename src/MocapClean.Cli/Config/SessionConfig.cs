using System.Collections.Immutable;
using MocapClean.Core.Diff;
using MocapClean.Core.Stages;

namespace MocapClean.Cli.Config;

/// <summary>All that a run is told. Nothing in it changes once it is read.</summary>
public sealed record SessionConfig
{
    /// <summary>A title.</summary>
    public string Title { get; init; } = "";

    /// <summary>The config as the user named it; empty where there is none.</summary>
    public string File { get; init; } = "";

    /// <summary>The folder that paths and globs are relative to, absolute.</summary>
    public required string Folder { get; init; }

    /// <summary>Which files are takes and how they are read.</summary>
    public SourceSettings Source { get; init; } = new();

    /// <summary>Time code.</summary>
    public TimeCodeSettings TimeCode { get; init; } = new();

    /// <summary>Where results go.</summary>
    public OutputSettings Output { get; init; } = new();

    /// <summary>When a re-shoot is suggested.</summary>
    public VerdictSettings Reshoot { get; init; } = new();

    /// <summary>Bounds on what is read.</summary>
    public LimitSettings Limits { get; init; } = new();

    /// <summary>The settings of stages, the session's own first, then the entries of <c>joints</c>.</summary>
    internal ImmutableArray<StageLayer> Layers { get; init; } = [];

    /// <summary>What the config gives outside <c>joints</c>, by path.</summary>
    internal ImmutableDictionary<string, Given> Given { get; init; } = ImmutableDictionary<string, Given>.Empty;

    /// <summary>Names and globs of the entries of <c>joints</c>.</summary>
    public IEnumerable<string> JointNames => Layers.SelectMany(l => l.Names);

    /// <summary>The output folder, absolute.</summary>
    public string OutputFolder => Absolute(Output.Folder);

    /// <summary>The file of slates, absolute, or null.</summary>
    public string? SlatesFile => TimeCode.Slates.Length == 0 ? null : Absolute(TimeCode.Slates);

    /// <summary>A path of the config, absolute.</summary>
    public string Absolute(string path) => Path.GetFullPath(path, Folder);

    /// <summary>The settings of all stages for a joint.</summary>
    public StageSettings SettingsFor(string joint) => StageLayers.Apply(HeldFor(joint));

    /// <summary>The values given for a joint, by path.</summary>
    internal IReadOnlyDictionary<string, HeldValue> HeldFor(string joint) =>
        StageLayers.Merge(Layers.Where(l => l.Covers(joint)));

    /// <summary>Files and folders with the defaults of everything.</summary>
    /// <param name="paths">Relative to the current folder or absolute; every take of a folder counts.</param>
    /// <param name="output">The output folder, likewise.</param>
    /// <exception cref="ConfigException">A path leads nowhere.</exception>
    public static SessionConfig ForPaths(IReadOnlyCollection<string> paths, string output)
    {
        var lost = paths.Where(p => !Path.Exists(p));
        if (lost.Any())
        {
            throw new ConfigException([.. lost.Select(p => new ConfigProblem(p, TextPlace.Whole, "no such file or folder"))]);
        }

        var only = paths.Count == 1 ? Path.TrimEndingDirectorySeparator(Path.GetFullPath(paths.First())) : "session";
        var title = Path.GetFileNameWithoutExtension(only);
        return new SessionConfig
        {
            Title = title.Length > 0 ? title : "session",
            Folder = Path.GetFullPath("."),
            Source = new SourceSettings { Takes = [.. paths] },
            Output = new OutputSettings { Folder = Path.GetFullPath(output) },
        };
    }
}
