namespace MocapClean.Core.Diff;

/// <summary>How large a set of changes is, radians; all zero where the set is empty.</summary>
public readonly record struct ChangeSize(double Largest, double Rms, double Percentile95)
{
    /// <summary>Measures a set of angles in radians; the list is sorted in place.</summary>
    public static ChangeSize Of(List<double> angles)
    {
        if (angles.Count == 0)
        {
            return default;
        }

        angles.Sort();
        var squares = 0.0;
        foreach (var a in angles)
        {
            squares += a * a;
        }

        // Nearest-rank percentile: the smallest value with at least 95 % of the set at or below it.
        var rank = (int)Math.Ceiling(0.95 * angles.Count) - 1;
        return new ChangeSize(angles[^1], Math.Sqrt(squares / angles.Count), angles[rank]);
    }
}
