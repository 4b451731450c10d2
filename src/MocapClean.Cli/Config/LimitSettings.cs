using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Bounds against files that are no takes.</summary>
public sealed record LimitSettings
{
    /// <summary>Largest file that is read, bytes. A take lies in memory whole, in one array, and no array holds more than 2 GB.</summary>
    public long TakeSize { get; init; } = 2_000_000_000;

    /// <summary>The settings as the config knows them.</summary>
    public static SettingBlock<LimitSettings> Table { get; } = new("limits", "Bounds on what is read.",
    [
        new("take-size", Shape.Of(Unit.Bytes, 1000, 2e9), "2 GB", "a larger take fails with a clear line",
            (s, v) => s with { TakeSize = (long)v.Number }),
    ]);
}
