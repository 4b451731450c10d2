using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>What each column of a table means. All other columns are carried.</summary>
/// <param name="Joints">Names of a wide table's joints in the order of their first columns; empty for a long one, whose rows name them.</param>
/// <param name="Slots">Columns of w, x, y, z: four for each joint of a wide table, four in all for a long one.</param>
/// <param name="Time">Column of the time, -1 where there is none.</param>
/// <param name="Joint">A long table's column of joint names, else -1.</param>
/// <param name="Frame">A long table's column of frame numbers, else -1.</param>
internal sealed record CsvColumns(ImmutableArray<string> Joints, ImmutableArray<int> Slots, int Time, int Joint = -1, int Frame = -1)
{
    /// <summary>One row a joint and frame.</summary>
    public bool IsLong => Joint >= 0;
}
