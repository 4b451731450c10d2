using System.Collections.Immutable;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>A key that a config may hold: a setting, a block of keys, or a list of blocks.</summary>
internal sealed record KeyNode
{
    /// <summary>The key itself.</summary>
    public required string Name { get; init; }

    /// <summary>The key with all above it, such as <c>ingest.csv.time</c>; within a list of blocks from the block on.</summary>
    public required string Path { get; init; }

    /// <summary>One line in plain words; may be empty for a block.</summary>
    public required string Meaning { get; init; }

    /// <summary>The setting; null for a block.</summary>
    public Setting? Setting { get; init; }

    /// <summary>The keys of the block, in the order in which they are shown.</summary>
    public ImmutableArray<KeyNode> Children { get; init; } = [];

    /// <summary>A list of such blocks.</summary>
    public bool IsList { get; init; }

    /// <summary>The path of the block that the key stands in.</summary>
    public string Block => Path.Length == Name.Length ? "" : Path[..^(Name.Length + 1)];

    /// <summary>The path of the block's method, whether or not it has one.</summary>
    public string MethodPath => Block + ".method";

    /// <summary>The key below this one with that name, or null.</summary>
    public KeyNode? Child(string name) => Children.FirstOrDefault(c => c.Name == name);

    /// <summary>This key and all below it that hold a setting; lists are not entered.</summary>
    public IEnumerable<KeyNode> Leaves() =>
        Setting is not null ? [this] : IsList ? [] : Children.SelectMany(c => c.Leaves());

    /// <summary>A key that holds a setting.</summary>
    public static KeyNode LeafOf(string name, string path, Setting setting) =>
        new() { Name = name, Path = path, Meaning = setting.Meaning, Setting = setting };

    /// <summary>Lays settings out as a block; a dot in a key opens a block within it.</summary>
    public static KeyNode BlockOf(string name, string path, string meaning, IEnumerable<(string Key, Setting Setting)> settings) => new()
    {
        Name = name,
        Path = path,
        Meaning = meaning,
        Children =
        [
            .. settings.GroupBy(s => s.Key.Split('.')[0]).Select(group =>
                group.First().Key == group.Key
                    ? LeafOf(group.Key, Below(path, group.Key), group.First().Setting)
                    : BlockOf(group.Key, Below(path, group.Key), "", group.Select(s => (s.Key[(group.Key.Length + 1)..], s.Setting)))),
        ],
    };

    private static string Below(string path, string key) => path.Length == 0 ? key : $"{path}.{key}";
}
