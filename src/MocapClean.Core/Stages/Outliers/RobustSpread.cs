namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// The robust spread of lengths: 1.4826 times their median, the median absolute deviation from no deviation at all. Up to half of the
/// values may be anything. Source: Rousseeuw and Croux 1993.
/// </summary>
internal static class RobustSpread
{
    /// <summary>Makes the median of absolute normal values their standard deviation.</summary>
    public const double Scale = 1.4826;

    /// <summary>Spread of values that are not negative; sorts them. NaN for none.</summary>
    public static double Of(Span<double> values)
    {
        if (values.IsEmpty)
        {
            return double.NaN;
        }

        values.Sort();
        var half = values.Length / 2;
        return Scale * (values.Length % 2 == 1 ? values[half] : (values[half - 1] + values[half]) / 2);
    }
}
