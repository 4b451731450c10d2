using MathNet.Numerics.LinearAlgebra;

namespace MocapClean.Core.Orientation;

/// <summary>
/// The mean of orientations: the one with the least sum of squared distances between rotation matrices, so signs do not matter. It is the
/// eigenvector of the largest eigenvalue of the sum of w q q^T. Source: Markley, Cheng, Crassidis and Oshman 2007.
/// </summary>
public static class MeanOrientation
{
    /// <summary>The mean, each orientation counting the same, on the side of the first.</summary>
    /// <exception cref="ArgumentException">There is none, or one of them is zero or not finite.</exception>
    public static Quat Of(ReadOnlySpan<Quat> orientations) => Of(orientations, []);

    /// <summary>The weighted mean, on the side of the first. Of several equally good ones, one is given.</summary>
    /// <param name="orientations">At least one; lengths do not matter, but none may be zero.</param>
    /// <param name="weights">One each, not negative and not all zero; empty for equal weights.</param>
    /// <exception cref="ArgumentException">There is none, one of them is zero or not finite, or the weights are not such.</exception>
    public static Quat Of(ReadOnlySpan<Quat> orientations, ReadOnlySpan<double> weights)
    {
        Check(orientations, weights);
        var sum = new double[4, 4];
        for (var n = 0; n < orientations.Length; n++)
        {
            AddOuterProduct(sum, orientations[n].Normalised(), weights.IsEmpty ? 1 : weights[n]);
        }

        // Eigenvalues of a symmetric matrix come in rising order.
        var best = Matrix<double>.Build.DenseOfArray(sum).Evd(Symmetricity.Symmetric).EigenVectors.Column(3);
        var mean = new Quat(best[0], best[1], best[2], best[3]).Normalised();
        return Quat.Dot(mean, orientations[0]) < 0 ? -mean : mean;
    }

    private static void AddOuterProduct(double[,] sum, Quat q, double weight)
    {
        ReadOnlySpan<double> components = [q.W, q.X, q.Y, q.Z];
        for (var row = 0; row < 4; row++)
        {
            for (var column = 0; column < 4; column++)
            {
                sum[row, column] += weight * components[row] * components[column];
            }
        }
    }

    private static void Check(ReadOnlySpan<Quat> orientations, ReadOnlySpan<double> weights)
    {
        if (orientations.IsEmpty)
        {
            throw new ArgumentException("There is no orientation to take the mean of", nameof(orientations));
        }

        foreach (var q in orientations)
        {
            if (!q.IsOrientation)
            {
                throw new ArgumentException($"{q} is no orientation and has no place in a mean", nameof(orientations));
            }
        }

        if (weights.IsEmpty)
        {
            return;
        }

        var total = 0.0;
        foreach (var weight in weights)
        {
            total += weight >= 0 ? weight : double.NaN;
        }

        if (weights.Length != orientations.Length || !(total > 0 && double.IsFinite(total)))
        {
            throw new ArgumentException("Weights are one for each orientation, not negative and not all zero", nameof(weights));
        }
    }
}
