using System.Runtime.CompilerServices;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// The lower triangle L with <c>L L' = A</c> of a symmetric positive definite matrix, row by row, and solves by it. Rows are adjacent
/// in memory, so each step is an inner product of two rows.
/// </summary>
internal sealed class Cholesky
{
    private readonly double[] rows;
    private readonly int size;

    private Cholesky(double[] rows, int size) => (this.rows, this.size) = (rows, size);

    /// <summary>
    /// Factors a matrix given by its lower triangle, row-major, in place. A pivot that rounding made negative counts as tiny.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static Cholesky Factor(double[] matrix, int size)
    {
        for (var i = 0; i < size; i++)
        {
            var row = matrix.AsSpan(i * size, i + 1);
            for (var j = 0; j < i; j++)
            {
                var other = matrix.AsSpan(j * size, j + 1);
                row[j] = (row[j] - LagProducts.Dot(row[..j], other[..j])) / other[j];
            }

            var pivot = row[i] - LagProducts.Dot(row[..i], row[..i]);
            row[i] = Math.Sqrt(Math.Max(pivot, 1e-14 * Math.Max(row[i], double.Epsilon)));
        }

        return new Cholesky(matrix, size);
    }

    /// <summary>Solves <c>L x = b</c> in place.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void Forward(Span<double> b)
    {
        for (var i = 0; i < size; i++)
        {
            var row = rows.AsSpan(i * size, i + 1);
            b[i] = (b[i] - LagProducts.Dot(row[..i], b[..i])) / row[i];
        }
    }

    /// <summary>Logarithm of the determinant of A.</summary>
    public double LogDeterminant()
    {
        var sum = 0.0;
        for (var i = 0; i < size; i++)
        {
            sum += Math.Log(rows[(i * size) + i]);
        }

        return 2 * sum;
    }
}
