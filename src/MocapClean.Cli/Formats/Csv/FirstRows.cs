using System.Globalization;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>The first rows of an unknown table.</summary>
internal sealed class FirstRows
{
    private const int Count = 64;

    /// <summary>Lengths that an orientation may have where a file is not clean.</summary>
    private const double Shortest = 0.5;

    private const double Longest = 2;

    private readonly List<string[]> texts = [];
    private int orientations;
    private int others;

    /// <summary>Numbers are written with a comma.</summary>
    public bool DecimalComma { get; private init; }

    /// <summary>Most samples that are there have about the length 1, or none is there.</summary>
    public bool HasOrientations => orientations >= others;

    /// <summary>Reads them; null where they are no table.</summary>
    public static FirstRows? Read(TakeSource source, CsvHeader header, CsvColumns columns)
    {
        try
        {
            using var rows = CsvRows.Open(source, header, columns);
            var first = new FirstRows { DecimalComma = rows.DecimalComma };
            while (first.texts.Count < Count && rows.Next())
            {
                first.Add(rows, header, columns);
            }

            return first;
        }
        catch (InputFormatException)
        {
            return null;
        }
    }

    /// <summary>A column's numbers; null where a cell holds something else or there are too few rows to tell.</summary>
    public double[]? Numbers(int column)
    {
        var style = DecimalComma ? NumberText.Comma : NumberText.Point;
        var numbers = new double[texts.Count];
        for (var row = 0; row < numbers.Length; row++)
        {
            if (!double.TryParse(texts[row][column], NumberStyles.Float, style, out numbers[row]) || !double.IsFinite(numbers[row]))
            {
                return null;
            }
        }

        return numbers.Length > 1 ? numbers : null;
    }

    private void Add(CsvRows rows, CsvHeader header, CsvColumns columns)
    {
        texts.Add([.. Enumerable.Range(0, header.Names.Length).Select(rows.TextOf)]);
        Span<double> values = stackalloc double[4];
        for (var i = 0; i < columns.Slots.Length; i += 4)
        {
            var numbers = true;
            for (var k = 0; k < 4; k++)
            {
                numbers &= rows.TryNumber(columns.Slots[i + k], out values[k]);
            }

            var norm = new Quat(values[0], values[1], values[2], values[3]).Norm;
            var present = numbers && norm > 0;
            orientations += present && norm is > Shortest and < Longest ? 1 : 0;
            others += present && norm is not (> Shortest and < Longest) ? 1 : 0;
        }
    }
}
