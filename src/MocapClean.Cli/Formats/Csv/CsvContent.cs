using System.Collections.Immutable;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>What the rows of a table held.</summary>
internal sealed record CsvContent
{
    /// <summary>Names of the joints.</summary>
    public required ImmutableArray<string> Joints { get; init; }

    /// <summary>For each joint a sample a frame, as long as the file has it; NaN where one of the four numbers is missing.</summary>
    public required ImmutableArray<ImmutableArray<Quat>> Samples { get; init; }

    /// <summary>A time a frame, in seconds, or frame numbers where the table has those and no time; null where it has neither.</summary>
    public double[]? Times { get; init; }

    /// <summary>The times are numbers of frames.</summary>
    public bool TimesAreFrames { get; init; }

    /// <summary>Half a unit of the last digit of the times, in seconds.</summary>
    public double TimeRounding { get; init; }

    /// <summary>Half a unit of the last digit of the components.</summary>
    public required double ComponentRounding { get; init; }

    /// <summary>Whose sample a row of a long table holds; null for a wide one, where row n is frame n of all joints.</summary>
    public RowPlaces? Places { get; init; }

    /// <summary>Numbers are written with a comma.</summary>
    public required bool DecimalComma { get; init; }
}
