using System.Collections.Immutable;

namespace MocapClean.Core.Stages.Settings;

/// <summary>The settings under one name of the config. A key called <c>method</c> may also be given as a word in place of the block.</summary>
/// <typeparam name="T">The record that the settings belong to.</typeparam>
/// <param name="Name">Name of the block, such as <c>outliers</c>.</param>
/// <param name="Meaning">One line in plain words.</param>
/// <param name="Settings">In the order in which they are shown.</param>
public sealed record SettingBlock<T>(string Name, string Meaning, ImmutableArray<Setting<T>> Settings);
