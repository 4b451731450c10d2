using System.Collections.Immutable;

namespace MocapClean.Core.Stages.Settings;

/// <summary>
/// One setting, declared once: the config reader, the JSON schema, <c>settings</c>, the starter and the README's table all walk these.
/// </summary>
/// <typeparam name="T">The record that the setting belongs to.</typeparam>
/// <param name="Key">Name within its block, such as <c>threshold</c>.</param>
/// <param name="Shape">What it may look like.</param>
/// <param name="Default">The default, written as a person would write it.</param>
/// <param name="Meaning">One line in plain words.</param>
/// <param name="With">The record with this setting set.</param>
public sealed record Setting<T>(string Key, Shape Shape, string Default, string Meaning, Func<T, SettingValue, T> With)
{
    /// <summary>The methods of the block that know this key; empty where all do.</summary>
    public ImmutableArray<string> OnlyFor { get; init; } = [];

    /// <summary>The same setting as one of a larger record.</summary>
    public Setting<TOuter> Lift<TOuter>(Func<TOuter, T> get, Func<TOuter, T, TOuter> set) =>
        new(Key, Shape, Default, Meaning, (outer, value) => set(outer, With(get(outer), value))) { OnlyFor = OnlyFor };
}
