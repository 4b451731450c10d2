using System.Collections.Immutable;
using System.IO.Enumeration;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Settings of stages for some joints: those of the whole session, or those of one entry of <c>joints</c>.</summary>
/// <param name="Number">0 for the whole session, else the entry's place in the list, from 1.</param>
/// <param name="Names">Globs of the joints.</param>
/// <param name="Given">What it gives.</param>
internal sealed record StageLayer(int Number, ImmutableArray<string> Names, ImmutableArray<Given> Given)
{
    /// <summary>Whether a joint is among them. Names tell upper from lower case.</summary>
    public bool Covers(string joint) =>
        Number == 0 || Names.Any(n => FileSystemName.MatchesSimpleExpression(n, joint, ignoreCase: false));
}

/// <summary>A value that holds, and the layer that gave it.</summary>
/// <param name="Given">The value.</param>
/// <param name="Layer">The layer.</param>
internal sealed record HeldValue(Given Given, StageLayer Layer);

/// <summary>Lays layers over one another.</summary>
internal static class StageLayers
{
    /// <summary>
    /// The values that hold where these layers meet, by path: key by key, later layers win, a changed method clears the other keys of its
    /// block, and keys of another method than the one that holds fall away.
    /// </summary>
    public static IReadOnlyDictionary<string, HeldValue> Merge(IEnumerable<StageLayer> layers)
    {
        var held = new Dictionary<string, HeldValue>();
        foreach (var layer in layers)
        {
            foreach (var method in layer.Given.Where(g => g.Key.Path == g.Key.MethodPath && g.Value.Word != MethodOf(g.Key, held)))
            {
                foreach (var path in held.Keys.Where(p => held[p].Given.Key.Block == method.Key.Block).ToList())
                {
                    held.Remove(path);
                }
            }

            foreach (var given in layer.Given)
            {
                held[given.Key.Path] = new(given, layer);
            }
        }

        return held.Where(h => Suits(h.Value.Given.Key, held)).ToDictionary();
    }

    /// <summary>The settings with these values set.</summary>
    public static StageSettings Apply(IReadOnlyDictionary<string, HeldValue> held) =>
        held.Values.Aggregate(new StageSettings(), (s, h) => ((Setting<StageSettings>)h.Given.Key.Setting!).With(s, h.Given.Value));

    /// <summary>Whether the method that holds in the key's block knows the key.</summary>
    public static bool Suits(KeyNode key, IReadOnlyDictionary<string, HeldValue> held) =>
        key.Setting!.OnlyFor is [] || key.Setting.OnlyFor.Contains(MethodOf(key, held));

    private static string MethodOf(KeyNode key, IReadOnlyDictionary<string, HeldValue> held) =>
        held.TryGetValue(key.MethodPath, out var holding) ? holding.Given.Value.Word : DefaultMethod(key.Block);

    /// <summary>The method of a block where nothing is given; empty for a block without one.</summary>
    public static string DefaultMethod(string block) => ConfigCatalog.Root.Child(block)?.Child("method")?.Setting?.Default ?? "";
}
