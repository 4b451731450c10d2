using System.Collections.Immutable;
using MocapClean.Core.Diff;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>
/// All keys of a config, laid out from the tables of settings. Reader, JSON schema, listing, starter and the README's table walk this.
/// Settings of the session carry a <see cref="Setting{T}"/> of <see cref="SessionConfig"/>, those of a stage one of
/// <see cref="StageSettings"/>.
/// </summary>
internal static class ConfigCatalog
{
    /// <summary>The list of entries for some of the joints.</summary>
    public const string Joints = "joints";

    /// <summary>The key of such an entry that says which joints.</summary>
    public const string Names = "names";

    private const string Ingest = "ingest";

    private static readonly Setting<SessionConfig> Title = new(
        "session", new Shape.FreeText(), "", "a title", (c, v) => c with { Title = v.Word })
    {
        Unset = "name of the config",
        Example = "\"Duel, day 2\"",
    };

    private static readonly Setting<SessionConfig> NamesOfJoints = new(
        Names, new Shape.TextList(), "", "names of joints, or globs (* and ?)", (c, _) => c)
    {
        IsRequired = true,
        Unset = "required",
        Example = "\"hand_*\"",
    };

    private static readonly ImmutableArray<StageEntry> Stages = [.. StageCatalog.All.Where(s => s.Settings.Settings.Length > 0)];

    /// <summary>The top of the config.</summary>
    public static KeyNode Root { get; } = new()
    {
        Name = "",
        Path = "",
        Meaning = "",
        Children =
        [
            Leaf(Title),
            Block(
                SourceSettings.Table,
                Lift(SourceSettings.Table, c => c.Source, (c, s) => c with { Source = s }),
                Stages.Where(s => s.Name == Ingest).SelectMany(s => s.Settings.Settings)),
            Block(TimeCodeSettings.Table, Lift(TimeCodeSettings.Table, c => c.TimeCode, (c, s) => c with { TimeCode = s })),
            Block(OutputSettings.Table, Lift(OutputSettings.Table, c => c.Output, (c, s) => c with { Output = s })),
            .. StageBlocks(),
            Block(VerdictSettings.Table, Lift(VerdictSettings.Table, c => c.Reshoot, (c, s) => c with { Reshoot = s })),
            Block(LimitSettings.Table, Lift(LimitSettings.Table, c => c.Limits, (c, s) => c with { Limits = s })),
            JointList(),
        ],
    };

    private static KeyNode JointList() => new()
    {
        Name = Joints,
        Path = Joints,
        IsList = true,
        Meaning = "Other settings for some joints; later entries win.",
        Children =
        [
            Leaf(NamesOfJoints),
            .. StageBlocks(),
        ],
    };

    private static KeyNode Leaf(Setting setting) => KeyNode.LeafOf(setting.Key, setting.Key, setting);

    // Ingest is about files, not about joints, and stands with the keys that say which.
    private static IEnumerable<KeyNode> StageBlocks() =>
        Stages.Where(s => s.Name != Ingest).Select(s => Block(s.Settings, s.Settings.Settings));

    private static KeyNode Block<T>(SettingBlock<T> block, params IEnumerable<Setting>[] settings) =>
        KeyNode.BlockOf(block.Name, block.Name, block.Meaning, settings.SelectMany(s => s).Select(s => (s.Key, s)));

    private static IEnumerable<Setting> Lift<T>(
        SettingBlock<T> block, Func<SessionConfig, T> get, Func<SessionConfig, T, SessionConfig> set) =>
        block.Settings.Select(s => s.Lift(get, set));
}
