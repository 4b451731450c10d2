using System.Collections.Immutable;
using System.Runtime.CompilerServices;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Reads orientations and times off the current row, and notes how finely they are printed.</summary>
internal sealed class SampleReader(CsvRows rows, CsvColumns columns, int estimate)
{
    /// <summary>Rows, spread over the table, whose digits are counted.</summary>
    private const int RowsCounted = 128;

    /// <summary>From here a component is large enough that its last digit limits how finely the orientation is known.</summary>
    private const double LargeComponent = 0.5;

    /// <summary>What is assumed where no component has decimals.</summary>
    private const double DefaultRounding = 5e-10;

    private readonly ImmutableArray<int> slots = columns.Slots;
    private readonly PrintedDigits components = new();
    private readonly PrintedDigits times = new();
    private readonly int stride = Math.Max(1, estimate / RowsCounted);
    private readonly string expected = rows.DecimalComma
        ? "a number with a decimal comma, as before, or an empty cell"
        : "a number or an empty cell";

    /// <summary>Half a unit of the last digit of the components.</summary>
    public double ComponentRounding => components.Finest ?? DefaultRounding;

    /// <summary>Half a unit of the last digit of the times.</summary>
    public double TimeRounding => times.Coarsest;

    /// <summary>The sample of a joint: of a wide table's, or of the row's own where the table is long (joint 0).</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Quat Sample(int joint)
    {
        var at = 4 * joint;
        if (rows.TryNumber(slots[at], out var w) & rows.TryNumber(slots[at + 1], out var x)
            & rows.TryNumber(slots[at + 2], out var y) & rows.TryNumber(slots[at + 3], out var z)
            && double.IsFinite((w + x) + (y + z)))
        {
            // A sum is finite only if its terms are. Terms that are, and whose sum is not, have no length either.
            return new Quat(w, x, y, z);
        }

        RefuseText(at);
        return Quat.Missing;
    }

    /// <summary>The time or frame number of the row.</summary>
    /// <exception cref="InputFormatException">The cell is empty or holds no finite number.</exception>
    public double Time(int column)
    {
        if (!rows.TryNumber(column, out var time) || !double.IsFinite(time))
        {
            throw rows.Unreadable(column, column == columns.Frame ? "the number of a frame" : "a time in seconds");
        }

        if (column == columns.Time)
        {
            times.Add(rows.Text(column), time);
        }

        return time;
    }

    /// <summary>Counts the decimals of some rows.</summary>
    public void CountDigits()
    {
        if (rows.Row % stride != 0)
        {
            return;
        }

        foreach (var column in slots)
        {
            if (rows.TryNumber(column, out var value) && Math.Abs(value) >= LargeComponent && double.IsFinite(value))
            {
                components.Add(rows.Text(column), value);
            }
        }
    }

    private void RefuseText(int at)
    {
        for (var i = at; i < at + 4; i++)
        {
            if (!rows.TryNumber(slots[i], out _) && !NumberText.IsMissing(rows.Text(slots[i])))
            {
                throw rows.Unreadable(slots[i], expected);
            }
        }
    }
}
