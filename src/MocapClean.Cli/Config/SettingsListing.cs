using System.Collections.Immutable;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>A setting as it holds.</summary>
/// <param name="Key">Its path.</param>
/// <param name="Value">Its value with unit, as written or as defaulted.</param>
/// <param name="Origin">
/// Where it came from: <c>default</c>, <c>line:column</c> of the config, or an entry of <c>joints</c> with its place.
/// </param>
/// <param name="Meaning">One line in plain words.</param>
public sealed record SettingsRow(string Key, string Value, string Origin, string Meaning);

/// <summary>Tells which settings hold and why.</summary>
public static class SettingsListing
{
    /// <summary>The settings of the session, and after them what entries of <c>joints</c> change.</summary>
    public static ImmutableArray<SettingsRow> ForSession(SessionConfig config)
    {
        var held = StageLayers.Merge(config.Layers.Take(1));
        return [.. Rows(config, held), .. config.Layers.Skip(1).SelectMany(Entry)];
    }

    /// <summary>The settings that hold for a joint.</summary>
    public static ImmutableArray<SettingsRow> ForJoint(SessionConfig config, string joint) => [.. Rows(config, config.HeldFor(joint))];

    private static IEnumerable<SettingsRow> Rows(SessionConfig config, IReadOnlyDictionary<string, HeldValue> held) =>
        ConfigCatalog.Root.Leaves().Where(key => StageLayers.Suits(key, held)).Select(key => RowFor(config, held, key));

    private static SettingsRow RowFor(SessionConfig config, IReadOnlyDictionary<string, HeldValue> held, KeyNode key)
    {
        var (given, layer) = key.Setting is Setting<StageSettings>
            ? held.TryGetValue(key.Path, out var holding) ? (holding.Given, holding.Layer.Number) : (null, 0)
            : (config.Given.GetValueOrDefault(key.Path), 0);
        var unset = key.Setting!.Default.Length > 0 ? key.Setting.Default.Trim('"') : $"({key.Setting.Unset})";
        return given is null
            ? new(key.Path, unset, "default", key.Meaning)
            : new(key.Path, given.Text, Origin(given.At, layer), key.Meaning);
    }

    private static IEnumerable<SettingsRow> Entry(StageLayer layer) => layer.Given.Select(g =>
        new SettingsRow($"{g.Key.Path} for {string.Join(", ", layer.Names)}", g.Text, Origin(g.At, layer.Number), g.Key.Meaning));

    private static string Origin(TextPlace at, int layer) => layer == 0 ? at.ToString() : $"{ConfigCatalog.Joints} entry {layer}, {at}";
}
