namespace MocapClean.Core.Stages.Smooth;

/// <summary>Mean over a window that moves along, never across the ends of a stretch.</summary>
internal static class MovingMean
{
    /// <summary>
    /// A triangular window, as two even ones after each other, in place. Sums are made of whole blocks and parts of them, not of a running total,
    /// so that a quiet passage after a loud one keeps all its digits.
    /// </summary>
    /// <param name="values">One value a sample.</param>
    /// <param name="starts">First index of each stretch, and the length.</param>
    /// <param name="reach">Half the width of each even window, in samples, without the middle.</param>
    /// <param name="spare">Room for three times as many values.</param>
    public static void Triangular(Span<double> values, ReadOnlySpan<int> starts, int reach, Span<double> spare)
    {
        for (var s = 0; s + 1 < starts.Length && reach > 0; s++)
        {
            var part = values[starts[s]..starts[s + 1]];
            Even(part, reach, spare);
            Even(part, reach, spare);
        }
    }

    private static void Even(Span<double> values, int reach, Span<double> spare)
    {
        var (n, width) = (values.Length, (2 * reach) + 1);
        var before = spare[..n];
        var after = spare.Slice(n, n);
        for (var from = 0; from < n; from += width)
        {
            var to = Math.Min(n, from + width);
            before[from] = values[from];
            for (var i = from + 1; i < to; i++)
            {
                before[i] = before[i - 1] + values[i];
            }

            after[to - 1] = values[to - 1];
            for (var i = to - 2; i >= from; i--)
            {
                after[i] = after[i + 1] + values[i];
            }
        }

        for (var i = 0; i < n; i++)
        {
            var (a, b) = (Math.Max(0, i - reach), Math.Min(n - 1, i + reach));
            var sum = a / width == b / width ? (a % width == 0 ? before[b] : after[a]) : after[a] + before[b];
            values[i] = sum / (b - a + 1);
        }
    }
}
