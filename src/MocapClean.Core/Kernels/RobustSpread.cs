namespace MocapClean.Core.Kernels;

/// <summary>Median and median absolute deviation (Rousseeuw and Croux 1993, section 1).</summary>
public static class RobustSpread
{
    /// <summary>
    /// 1 over the upper quartile of the standard normal distribution: times the median absolute deviation it is the standard deviation
    /// of normal values.
    /// </summary>
    public const double NormalScale = 1.4826022185056018;

    /// <summary>The median, the mean of the two middle values where their number is even; NaN of none. Reorders the values.</summary>
    public static double MedianInPlace(Span<double> values)
    {
        if (values.IsEmpty)
        {
            return double.NaN;
        }

        var middle = values.Length / 2;
        var upper = Select(values, middle);
        if (values.Length % 2 == 1)
        {
            return upper;
        }

        var lower = double.NegativeInfinity;
        foreach (var v in values[..middle])
        {
            lower = Math.Max(lower, v);
        }

        return (lower + upper) / 2;
    }

    /// <summary>Median of the distances from the median. Overwrites the values.</summary>
    public static double DeviationInPlace(Span<double> values)
    {
        var median = MedianInPlace(values);
        for (var i = 0; i < values.Length; i++)
        {
            values[i] = Math.Abs(values[i] - median);
        }

        return MedianInPlace(values);
    }

    // Hoare's selection: afterwards no value before the index is larger and none after it smaller. Middle of three as pivot.
    private static double Select(Span<double> values, int index)
    {
        var (low, high) = (0, values.Length - 1);
        while (low < high)
        {
            var (a, b, c) = (values[low], values[(low + high) / 2], values[high]);
            var pivot = Math.Max(Math.Min(a, b), Math.Min(Math.Max(a, b), c));
            var (i, j) = (low, high);
            while (i <= j)
            {
                while (values[i] < pivot)
                {
                    i++;
                }

                while (values[j] > pivot)
                {
                    j--;
                }

                if (i <= j)
                {
                    (values[i], values[j]) = (values[j], values[i]);
                    i++;
                    j--;
                }
            }

            if (index <= j)
            {
                high = j;
            }
            else if (index >= i)
            {
                low = i;
            }
            else
            {
                return values[index];
            }
        }

        return values[index];
    }
}
