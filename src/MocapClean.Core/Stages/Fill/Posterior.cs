using System.Runtime.CompilerServices;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// What one model of the motion says about the turns inside a run, given the turns beside it and that their sum is known
/// (Rasmussen and Williams 2006, chapter 2). The three axes are independent with one covariance, so that all turns with the frame.
/// </summary>
internal sealed class Posterior
{
    private readonly MotionModel model;
    private readonly Increments increments;
    private readonly int[] beside;
    private readonly int first;
    private readonly Cholesky factor;
    private readonly double[] x, y, z;
    private readonly double squares;

    /// <summary>Conditions the model on the known increments beside a run.</summary>
    /// <param name="model">Covariance and noise.</param>
    /// <param name="increments">The track.</param>
    /// <param name="beside">The increments given.</param>
    /// <param name="first">First interval inside the run.</param>
    /// <param name="count">Number of intervals inside the run.</param>
    public Posterior(MotionModel model, Increments increments, int[] beside, int first, int count)
    {
        (this.model, this.increments, this.beside, this.first) = (model, increments, beside, first);
        factor = Cholesky.Factor(OwnCovariance(), beside.Length);
        x = Array.ConvertAll(beside, i => increments.Turn(i).X);
        y = Array.ConvertAll(beside, i => increments.Turn(i).Y);
        z = Array.ConvertAll(beside, i => increments.Turn(i).Z);
        factor.Forward(x);
        factor.Forward(y);
        factor.Forward(z);
        squares = LagProducts.Dot(x, x) + LagProducts.Dot(y, y) + LagProducts.Dot(z, z);
        (Turns, Shares, SquaredErrors) = (new Vec3[count], new double[count], new double[count]);
        Condition();
    }

    /// <summary>Expected turns inside the run, before they are closed.</summary>
    public Vec3[] Turns { get; }

    /// <summary>Shares of a closing error: the expected change of each turn when the sum is off by one. Their sum is 1.</summary>
    public double[] Shares { get; }

    /// <summary>Expected square of the angular error after each turn, once the sum is closed.</summary>
    public double[] SquaredErrors { get; }

    /// <summary>
    /// How much livelier than the model the joint is here: the mean square of the whitened neighbours. As a variance estimated from so
    /// many numbers it is divided by two fewer (the mean of a Student t's square); without neighbours the model holds as it is.
    /// </summary>
    private double Liveliness => beside.Length == 0 ? 1 : squares / ((3 * beside.Length) - 2);

    /// <summary>Logarithm of the evidence for the model, its liveliness being unknown, up to a constant.</summary>
    public double Evidence => (-1.5 * factor.LogDeterminant()) - (1.5 * beside.Length * Math.Log(squares + 1e-9));

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private double[] OwnCovariance()
    {
        var size = beside.Length;
        var matrix = new double[size * size];
        for (var i = 0; i < size; i++)
        {
            for (var j = 0; j <= i; j++)
            {
                matrix[(i * size) + j] = model.Covariance[increments.At(beside[i]) - increments.At(beside[j])];
            }

            matrix[(i * size) + i] += model.Noise;
        }

        return matrix;
    }

    /// <summary>Turns, shares and errors from sums along the run; the covariance inside it is never held as a matrix.</summary>
    private void Condition()
    {
        var (size, count) = (beside.Length, Turns.Length);
        var rows = new double[count * size];
        var total = new double[size];
        var priorVariances = new double[count];
        for (var g = 0; g < count; g++)
        {
            var row = rows.AsSpan(g * size, size);
            Explain(first + g, row);
            Turns[g] = new Vec3(LagProducts.Dot(row, x), LagProducts.Dot(row, y), LagProducts.Dot(row, z));
            Add(total, row);
            (Shares[g], priorVariances[g]) = Prior(g);
            priorVariances[g] += g > 0 ? priorVariances[g - 1] : 0;
        }

        // The variance of the sum from edge to edge; where rounding leaves none, the prior's last digits stand for it.
        var whole = Math.Max(priorVariances[^1] - LagProducts.Dot(total, total), 1e-12 * priorVariances[^1]) + double.Epsilon;
        var sum = new double[size];
        var share = 0.0;
        for (var g = 0; g < count; g++)
        {
            var row = rows.AsSpan(g * size, size);
            Add(sum, row);
            Shares[g] = (Shares[g] - LagProducts.Dot(row, total)) / whole;
            share += Shares[g];
            var variance = priorVariances[g] - LagProducts.Dot(sum, sum) - (share * share * whole);
            SquaredErrors[g] = 3 * Liveliness * Math.Max(0, variance);
        }

        for (var g = 0; g < count; g++)
        {
            Shares[g] = share > 0.5 ? Shares[g] / share : increments.Tick(first + g) / increments.Elapsed(first, count);
        }
    }

    /// <summary>The part of an interval's turn that the neighbours explain, in their whitened coordinates.</summary>
    private void Explain(int interval, Span<double> row)
    {
        for (var i = 0; i < row.Length; i++)
        {
            row[i] = increments.Tick(interval) * model.Covariance[increments.At(interval) - increments.At(beside[i])];
        }

        factor.Forward(row);
    }

    /// <summary>Prior covariance of a turn with the sum of all, and what it adds to the variance of the sum up to it.</summary>
    private (double WithAll, double Added) Prior(int g)
    {
        var (all, added) = (0.0, 0.0);
        for (var h = 0; h < Turns.Length; h++)
        {
            var c = increments.Tick(first + g) * increments.Tick(first + h)
                * model.Covariance[increments.At(first + g) - increments.At(first + h)];
            all += c;
            added += h < g ? 2 * c : h == g ? c : 0;
        }

        return (all, added);
    }

    private static void Add(Span<double> to, ReadOnlySpan<double> row)
    {
        for (var i = 0; i < to.Length; i++)
        {
            to[i] += row[i];
        }
    }
}
