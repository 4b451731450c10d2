using MocapClean.Cli.Config.Yaml;

namespace MocapClean.Cli.Config;

/// <summary>Walks the YAML of a config beside the keys that may stand there, and gathers values and problems.</summary>
internal sealed class ConfigWalk(ProblemList problems)
{
    private readonly ValueReader values = new(problems);

    /// <summary>Reads a block.</summary>
    /// <param name="block">The YAML.</param>
    /// <param name="keys">The keys that may stand there.</param>
    /// <param name="at">Where a missing key is reported.</param>
    public BlockContent Read(BlockNode block, KeyNode keys, TextPlace at)
    {
        var content = new BlockContent();
        Enter(block, keys, content);
        foreach (var missing in keys.Leaves().Where(k => k.Setting!.IsRequired && !content.Asked.Contains(k.Path)))
        {
            var place = block.Entries.FirstOrDefault(e => e.Key == missing.Block)?.At ?? at;
            var wanted = ShapeText.Wanted(missing.Setting!);
            problems.Add(place, $"{missing.Path} is missing; give {wanted}, such as {missing.Setting!.Example}");
        }

        return content;
    }

    private void Enter(BlockNode block, KeyNode keys, BlockContent content)
    {
        foreach (var entry in block.Entries)
        {
            var key = keys.Child(entry.Key) ?? Likely(entry, keys);
            if (key is null)
            {
                continue;
            }

            content.Asked.Add(key.Path);
            if (key.IsList)
            {
                content.Lists.TryAdd(key.Path, entry.Value);
            }
            else if (key.Setting is not null)
            {
                Take(entry.Value, key, content);
            }
            else if (entry.Value is BlockNode inner)
            {
                Enter(inner, key, content);
            }
            else if (key.Child("method") is { } method && entry.Value is WordNode && !entry.Value.IsNothing)
            {
                content.Asked.Add(method.Path);
                Take(entry.Value, method, content);
            }
            else if (!entry.Value.IsNothing)
            {
                var wanted = key.Child("method") is null ? "a block of keys" : "a block of keys or a method";
                problems.Add(entry.Value.At, $"{key.Path} takes {wanted}, not {entry.Value.Kind}");
            }
        }
    }

    private void Take(ConfigNode node, KeyNode key, BlockContent content)
    {
        if (values.Read(node, key) is { } value)
        {
            content.Given.Add(new(key, value, Written(node), node.At));
        }
    }

    private static string Written(ConfigNode node) =>
        node is ListNode list ? $"[{string.Join(", ", list.Items.Select(Written))}]" : ((WordNode)node).Text;

    /// <summary>Reports an unknown key, and returns the one that was probably meant so that what stands below it is read as well.</summary>
    private KeyNode? Likely(KeyedNode entry, KeyNode keys)
    {
        var path = keys.Path.Length == 0 ? entry.Key : $"{keys.Path}.{entry.Key}";
        var likely = NearMiss.Of(entry.Key, keys.Children.Select(c => c.Name));
        var elsewhere = ConfigCatalog.Root.Leaves().Where(k => k.Name == entry.Key && entry.Key != "method").Select(k => k.Path).ToList();
        problems.Add(entry.At, $"unknown key '{path}'" + NearMiss.Hint(likely ?? (elsewhere is [var only] ? only : null)));
        return likely is null ? null : keys.Child(likely);
    }
}
