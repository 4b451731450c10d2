using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>A value that a config gives.</summary>
/// <param name="Key">The key.</param>
/// <param name="Value">The value, within its shape.</param>
/// <param name="Text">The value as written.</param>
/// <param name="At">Where it stands.</param>
internal sealed record Given(KeyNode Key, SettingValue Value, string Text, TextPlace At);
