using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>How finely the angles of a file are printed.</summary>
internal static class BvhRounding
{
    private const int MostLines = 500;

    /// <summary>
    /// What the rounding of the text can move a sample by, radians: half a unit of the last digit in each of three angles. Exporters that drop
    /// closing zeros print some angles shorter, so the middle number of decimals counts, over evenly spaced lines; zeros say nothing.
    /// </summary>
    /// <param name="bytes">The file.</param>
    /// <param name="motion">Its values.</param>
    /// <param name="columns">The columns of angles.</param>
    /// <param name="otherwise">Where every angle is zero or missing.</param>
    public static double Of(ReadOnlySpan<byte> bytes, BvhMotion motion, IReadOnlySet<int> columns, double otherwise)
    {
        var decimals = new List<int>();
        for (var n = 0; n < motion.Frames; n += 1 + (motion.Frames / MostLines))
        {
            var fields = new BvhFields(motion.Line(bytes, n));
            for (var column = 0; fields.MoveNext(); column++)
            {
                if (columns.Contains(column) && motion[n, column] is not 0 and var value && double.IsFinite(value))
                {
                    decimals.Add(BvhText.Decimals(fields.Field));
                }
            }
        }

        decimals.Sort();
        return decimals.Count == 0
            ? otherwise
            : Math.Sqrt(3) * Angle.FromDegrees(BvhText.HalfUnit(decimals[decimals.Count / 2]));
    }
}
