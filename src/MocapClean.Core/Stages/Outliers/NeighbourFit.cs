using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Least-squares polynomial through the neighbours on both sides of a run or an edge, one column of an orthonormal basis a coefficient.
/// With a jump, the samples after the edge may lie apart from those before it by any constant vector. Depends on the places of the
/// neighbours only, so that one fit serves every place with the same pattern.
/// </summary>
internal sealed class NeighbourFit
{
    private readonly double[][] basis;
    private readonly double[][] inside;

    private NeighbourFit(double[][] basis, double[][] inside)
    {
        this.basis = basis;
        this.inside = inside;
        Freedom = basis[0].Length - basis.Length;
    }

    /// <summary>Neighbours less coefficients: what is left to disagree.</summary>
    public int Freedom { get; }

    /// <summary>The fit across a run whose samples are not used, with the values it predicts at places in the run.</summary>
    /// <param name="times">Places of the neighbours, in samples.</param>
    /// <param name="degree">Degree of the polynomial.</param>
    /// <param name="wanted">Places to predict.</param>
    public static NeighbourFit Across(ReadOnlySpan<double> times, int degree, ReadOnlySpan<double> wanted)
    {
        var (columns, at) = Powers(times, degree, wanted);
        return Orthonormal(columns, at);
    }

    /// <summary>The fit with a jump before the first neighbour of the second group; predicts the motion across the edge.</summary>
    /// <param name="times">Places of the neighbours; those before the edge first, each group nearest first.</param>
    /// <param name="before">How many of them lie before the edge.</param>
    /// <param name="degree">Degree of the polynomial.</param>
    public static NeighbourFit WithJump(ReadOnlySpan<double> times, int before, int degree)
    {
        var (columns, _) = Powers(times, degree, []);
        // Values after the edge are P(t) less the motion across it, so the motion is the coefficient of a column of -1 there.
        var jump = new double[times.Length];
        jump.AsSpan(before).Fill(-1);
        var motion = new double[degree + 2];
        motion[^1] = 1;
        return Orthonormal([.. columns, jump], [motion]);
    }

    /// <summary>Root of the sum of squares of what the polynomial leaves over.</summary>
    public double Misfit(ReadOnlySpan<Vec3> values)
    {
        var left = 0.0;
        foreach (var v in values)
        {
            left += v.NormSquared;
        }

        foreach (var column in basis)
        {
            left -= Sum(column, values).NormSquared;
        }

        return Math.Sqrt(Math.Max(0, left));
    }

    /// <summary>The value predicted at the wanted place of the given index.</summary>
    public Vec3 Predict(int index, ReadOnlySpan<Vec3> values) => Sum(inside[index], values);

    private static Vec3 Sum(double[] weights, ReadOnlySpan<Vec3> values)
    {
        double x = 0, y = 0, z = 0;
        for (var i = 0; i < values.Length; i++)
        {
            x += weights[i] * values[i].X;
            y += weights[i] * values[i].Y;
            z += weights[i] * values[i].Z;
        }

        return new(x, y, z);
    }

    private static (double[][] Columns, double[][] At) Powers(ReadOnlySpan<double> times, int degree, ReadOnlySpan<double> wanted)
    {
        var columns = new double[degree + 1][];
        var at = new double[wanted.Length][];
        for (var p = 0; p <= degree; p++)
        {
            columns[p] = new double[times.Length];
            for (var i = 0; i < times.Length; i++)
            {
                columns[p][i] = Math.Pow(times[i], p);
            }
        }

        for (var k = 0; k < wanted.Length; k++)
        {
            at[k] = new double[degree + 1];
            for (var p = 0; p <= degree; p++)
            {
                at[k][p] = Math.Pow(wanted[k], p);
            }
        }

        return (columns, at);
    }

    /// <summary>
    /// Gram and Schmidt, each column cleaned twice, carrying the rows of wanted values along; then each wanted row times the basis is
    /// its weight on the neighbours.
    /// </summary>
    private static NeighbourFit Orthonormal(double[][] columns, double[][] at)
    {
        for (var p = 0; p < columns.Length; p++)
        {
            for (var r = 0; r < 2 * p; r++)
            {
                var (other, dot) = (r % p, Dot(columns[p], columns[r % p]));
                Subtract(columns[p], dot, columns[other]);
                foreach (var row in at)
                {
                    row[p] -= dot * row[other];
                }
            }

            var norm = Math.Sqrt(Dot(columns[p], columns[p]));
            Scale(columns[p], 1 / norm);
            foreach (var row in at)
            {
                row[p] /= norm;
            }
        }

        var weights = at.Select(row => Enumerable.Range(0, columns[0].Length)
            .Select(i => columns.Select((c, p) => c[i] * row[p]).Sum()).ToArray()).ToArray();
        return new NeighbourFit(columns, weights);
    }

    private static double Dot(double[] a, double[] b)
    {
        var sum = 0.0;
        for (var i = 0; i < a.Length; i++)
        {
            sum += a[i] * b[i];
        }

        return sum;
    }

    private static void Subtract(double[] a, double factor, double[] b)
    {
        for (var i = 0; i < a.Length; i++)
        {
            a[i] -= factor * b[i];
        }
    }

    private static void Scale(double[] a, double factor)
    {
        for (var i = 0; i < a.Length; i++)
        {
            a[i] *= factor;
        }
    }
}
