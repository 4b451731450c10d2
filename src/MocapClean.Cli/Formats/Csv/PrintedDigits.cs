namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// How finely numbers were printed. Programs that print a fixed number of significant digits print large numbers coarser than small
/// ones, so numbers are parted by their digits before the decimal mark.
/// </summary>
internal sealed class PrintedDigits
{
    /// <summary>Fewer numbers of a size say little: trailing zeros may have been left out.</summary>
    private const int Enough = 16;

    private readonly int[] most = new int[20];
    private readonly int[] count = new int[20];

    /// <summary>Takes note of a number.</summary>
    public void Add(ReadOnlySpan<byte> text, double value)
    {
        var size = Math.Abs(value) < 1 ? 0 : Math.Min(most.Length - 1, 1 + (int)Math.Log10(Math.Abs(value)));
        most[size] = Math.Max(most[size], NumberText.Decimals(text));
        count[size]++;
    }

    /// <summary>Half a unit of the last digit of the numbers printed finest; null where none has decimals.</summary>
    public double? Finest => most.Max() is > 0 and var decimals ? HalfUnit(decimals) : null;

    /// <summary>Half a unit of the last digit of the numbers printed coarsest, sizes with few numbers left aside.</summary>
    public double Coarsest
    {
        get
        {
            var decimals = int.MaxValue;
            for (var size = 0; size < most.Length; size++)
            {
                decimals = count[size] >= Enough ? Math.Min(decimals, most[size]) : decimals;
            }

            return HalfUnit(decimals < int.MaxValue ? decimals : most.Max());
        }
    }

    private static double HalfUnit(int decimals) => 0.5 * Math.Pow(10, -decimals);
}
