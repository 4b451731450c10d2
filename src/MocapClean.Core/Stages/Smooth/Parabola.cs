namespace MocapClean.Core.Stages.Smooth;

/// <summary>The lowest place of a curve that is known on an even grid.</summary>
internal static class Parabola
{
    /// <summary>How far, in grid steps from -1 to 1, the parabola through the lowest value and its neighbours has its foot beside it; 0 at an end.</summary>
    public static double Lowest(ReadOnlySpan<double> values, int lowest)
    {
        if (lowest == 0 || lowest == values.Length - 1)
        {
            return 0;
        }

        var (left, right) = (values[lowest - 1] - values[lowest], values[lowest + 1] - values[lowest]);
        return left + right > 0 ? 0.5 * (left - right) / (left + right) : 0;
    }
}
