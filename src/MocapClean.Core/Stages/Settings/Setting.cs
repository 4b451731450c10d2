using System.Collections.Immutable;

namespace MocapClean.Core.Stages.Settings;

/// <summary>What a setting is called, what it may look like and what it means, whatever record it belongs to.</summary>
/// <param name="Key">Name within its block, such as <c>threshold</c>; a dot leads into a block within the block.</param>
/// <param name="Shape">What it may look like.</param>
/// <param name="Default">The default, written as a person would write it; empty where nothing is the default.</param>
/// <param name="Meaning">One line in plain words.</param>
public abstract record Setting(string Key, Shape Shape, string Default, string Meaning)
{
    /// <summary>The methods of the block that know this key; empty where all do.</summary>
    public ImmutableArray<string> OnlyFor { get; init; } = [];

    /// <summary>The config must give it.</summary>
    public bool IsRequired { get; init; }

    /// <summary>What holds where <see cref="Default"/> is empty and the config gives nothing, in a few words.</summary>
    public string Unset { get; init; } = "none";

    /// <summary>A value as a person would write it, where <see cref="Default"/> is empty.</summary>
    public string Example { get; init; } = "";
}

/// <summary>
/// One setting, declared once: the config reader, the JSON schema, <c>settings</c>, the starter and the README's table all walk these.
/// </summary>
/// <typeparam name="T">The record that the setting belongs to.</typeparam>
/// <param name="Key">Name within its block, such as <c>threshold</c>; a dot leads into a block within the block.</param>
/// <param name="Shape">What it may look like.</param>
/// <param name="Default">The default, written as a person would write it; empty where nothing is the default.</param>
/// <param name="Meaning">One line in plain words.</param>
/// <param name="With">The record with this setting set.</param>
public sealed record Setting<T>(string Key, Shape Shape, string Default, string Meaning, Func<T, SettingValue, T> With)
    : Setting(Key, Shape, Default, Meaning)
{
    /// <summary>The same setting as one of a larger record.</summary>
    public Setting<TOuter> Lift<TOuter>(Func<TOuter, T> get, Func<TOuter, T, TOuter> set) =>
        new(Key, Shape, Default, Meaning, (outer, value) => set(outer, With(get(outer), value)))
        {
            OnlyFor = OnlyFor,
            IsRequired = IsRequired,
            Unset = Unset,
            Example = Example,
        };
}
