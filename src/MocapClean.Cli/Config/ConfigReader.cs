using System.Collections.Immutable;
using MocapClean.Cli.Config.Yaml;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Reads a config file whole, and says all that is wrong with it at once.</summary>
public sealed class ConfigReader
{
    private readonly ProblemList problems;
    private readonly ConfigWalk walk;
    private readonly MethodCheck methods;

    private ConfigReader(string file)
    {
        problems = new ProblemList(file);
        walk = new ConfigWalk(problems);
        methods = new MethodCheck(problems);
    }

    /// <summary>Reads a file.</summary>
    /// <exception cref="ConfigException">Anything is wrong with it.</exception>
    public static SessionConfig Load(string path)
    {
        var reader = new ConfigReader(path);
        return reader.Read(ConfigText.Read(path, reader.problems), path);
    }

    /// <summary>Reads a text as if it were the content of a file.</summary>
    /// <exception cref="ConfigException">Anything is wrong with it.</exception>
    public static SessionConfig Parse(string text, string path) => new ConfigReader(path).Read(text, path);

    private SessionConfig Read(string? text, string path)
    {
        var root = text is null ? null : YamlTree.Read(text, problems);
        var session = root is null ? new BlockContent() : walk.Read(root, ConfigCatalog.Root, root.At);
        methods.Check(session, isEntry: false);
        var layers = Layers(session);
        var config = Build(session, layers, path);
        if (config.TimeCode.Conflict() is var (key, message))
        {
            problems.Add(session.Given.First(g => g.Key.Path == $"time-code.{key}").At, message);
        }

        problems.ThrowIfAny();
        return config;
    }

    private static SessionConfig Build(BlockContent session, ImmutableArray<StageLayer> layers, string path)
    {
        var full = Path.GetFullPath(path);
        var start = new SessionConfig
        {
            Title = Path.GetFileNameWithoutExtension(full),
            File = path,
            Folder = Path.GetDirectoryName(full) ?? full,
            Layers = layers,
            Given = session.Given.DistinctBy(g => g.Key.Path).ToImmutableDictionary(g => g.Key.Path),
        };
        return session.Given.Aggregate(start, (c, g) => g.Key.Setting is Setting<SessionConfig> setting ? setting.With(c, g.Value) : c);
    }

    private ImmutableArray<StageLayer> Layers(BlockContent session)
    {
        var layers = ImmutableArray.CreateBuilder<StageLayer>();
        layers.Add(new(0, [], StageSettingsIn(session)));
        foreach (var item in Entries(session))
        {
            if (item is not BlockNode block)
            {
                problems.Add(item.At, $"an entry of {ConfigCatalog.Joints} is a block with names and settings, not {item.Kind}");
                continue;
            }

            var keys = ConfigCatalog.Root.Child(ConfigCatalog.Joints)! with { IsList = false, Path = "" };
            var content = walk.Read(block, keys, block.At);
            methods.Check(content, isEntry: true);
            var names = content.Given.FirstOrDefault(g => g.Key.Name == ConfigCatalog.Names)?.Value.List ?? [];
            layers.Add(new(layers.Count, names, StageSettingsIn(content)));
        }

        return layers.ToImmutable();
    }

    private ImmutableArray<ConfigNode> Entries(BlockContent session)
    {
        if (!session.Lists.TryGetValue(ConfigCatalog.Joints, out var node) || node.IsNothing)
        {
            return [];
        }

        if (node is ListNode list)
        {
            return list.Items;
        }

        problems.Add(node.At, $"{ConfigCatalog.Joints} takes a list of entries, each starting with a dash, not {node.Kind}");
        return [];
    }

    private static ImmutableArray<Given> StageSettingsIn(BlockContent content) =>
        [.. content.Given.Where(g => g.Key.Setting is Setting<Core.Stages.StageSettings>)];
}
