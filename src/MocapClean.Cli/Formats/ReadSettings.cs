using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats;

/// <summary>How takes are read.</summary>
public sealed record ReadSettings
{
    /// <summary>Null: the format's own (world for CSV, local for BVH).</summary>
    public OrientationSpace? Space { get; init; }

    /// <summary>Frames per second for takes without a time column; null: such takes cannot be read.</summary>
    public double? Rate { get; init; }

    /// <summary>CSV layout: auto, wide or long.</summary>
    public string CsvLayout { get; init; } = "auto";

    /// <summary>Pattern of a wide CSV's orientation columns, holding <c>{joint}</c> and <c>{component}</c>.</summary>
    public string CsvJointColumns { get; init; } = "{joint}.{component}";

    /// <summary>Names of the components in the order w, x, y, z.</summary>
    public ImmutableArray<string> CsvComponents { get; init; } = ["qw", "qx", "qy", "qz"];

    /// <summary>Name of the time column, in seconds.</summary>
    public string CsvTime { get; init; } = "time";
}
