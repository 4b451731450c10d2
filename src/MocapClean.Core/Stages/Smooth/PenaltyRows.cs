using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// The penalty on the differences of a curve, as a random walk of its highest difference: from one sample to the next the curve goes on along
/// the polynomial through the samples before it, save for a push whose variance is the reciprocal of the penalty. In Newton's form of that
/// polynomial irregular clocks need nothing special: the differences are divided ones, weighted by the time they span.
/// </summary>
internal sealed class PenaltyRows
{
    /// <summary>The steps of every sample.</summary>
    private readonly Step[] _steps;

    /// <summary>Builds the rows.</summary>
    /// <param name="order">Order of the difference that is penalised, 1 to 3.</param>
    /// <param name="times">Rising within each stretch, in frame intervals.</param>
    /// <param name="starts">First index of each stretch and the length; every stretch has more samples than the order.</param>
    public PenaltyRows(int order, ReadOnlySpan<double> times, ReadOnlySpan<int> starts)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(order, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(order, 3);
        Order = order;
        Starts = starts.ToArray();
        _steps = new Step[times.Length];
        for (var s = 0; s + 1 < starts.Length; s++)
        {
            if (starts[s + 1] - starts[s] <= order)
            {
                throw new ArgumentException($"a stretch of {starts[s + 1] - starts[s]} samples has no difference of order {order}", nameof(starts));
            }

            for (var i = starts[s]; i < starts[s + 1]; i++)
            {
                var one = i > starts[s] ? times[i] - times[i - 1] : 0;
                var two = i > starts[s] + 1 ? times[i] - times[i - 2] : 0;
                _steps[i] = new Step(one, two, i < starts[s] + order ? 0 : Push(order, times, i));
            }
        }
    }

    /// <summary>Order of the difference.</summary>
    public int Order { get; }

    /// <summary>First index of each stretch, and the number of samples.</summary>
    public int[] Starts { get; }

    /// <summary>Number of samples.</summary>
    public int Length => _steps.Length;

    /// <summary>The step that leads to each sample.</summary>
    public ReadOnlySpan<Step> Steps => _steps;

    /// <summary>The third difference that ends at a sample, scaled as the penalty squares it: on a regular clock the plain one.</summary>
    public Vector256<double> ThirdDifference(ReadOnlySpan<Vector256<double>> z, int i)
    {
        var late = (z[i] - z[i - 1]) / _steps[i].One;
        var middle = (z[i - 1] - z[i - 2]) / _steps[i - 1].One;
        var early = (z[i - 2] - z[i - 3]) / _steps[i - 2].One;
        var change = ((late - middle) / _steps[i].Two) - ((middle - early) / _steps[i - 1].Two);
        return change / Math.Sqrt(_steps[i].Push);
    }

    /// <summary>Shares of the first samples of a stretch, as many as the order.</summary>
    /// <param name="first">The sample after them.</param>
    public Part[] Beginning(int first)
    {
        var shares = new Part[Order];
        shares[^1].Value = 1;
        if (Order >= 2)
        {
            var (one, two) = (_steps[first - 1].One, _steps[first - 1].Two);
            shares[^1].Slope = 1 / one;
            shares[^2].Slope = -1 / one;
            if (Order == 3)
            {
                var before = _steps[first - 2].One;
                shares[2].Bend = 1 / (one * two);
                shares[1].Bend = -((1 / one) + (1 / before)) / two;
                shares[0].Bend = 1 / (before * two);
            }
        }

        return shares;
    }

    /// <summary>The way from one sample to the next.</summary>
    /// <param name="One">Intervals since the sample before.</param>
    /// <param name="Two">Intervals since the one before that.</param>
    /// <param name="Push">Variance of the push on the highest divided difference at penalty 1; 0 where a stretch has just begun.</param>
    [StructLayout(LayoutKind.Auto)]
    public readonly record struct Step(double One, double Two, double Push);

    /// <summary>What a sample among the first of a stretch adds to the value, slope and bend (divided differences) at the last of them.</summary>
    [StructLayout(LayoutKind.Auto)]
    public record struct Part(double Value, double Slope, double Bend);

    // The penalty is span / order x (order! x divided difference)^2, which on a regular clock is the plain difference squared.
    // The push moves the divided difference of one order less, by the divided difference times the span.
    private static double Push(int order, ReadOnlySpan<double> times, int i)
    {
        var span = times[i] - times[i - order];
        return order switch
        {
            1 => span,
            2 => span / 2,
            _ => span / 12,
        };
    }
}
