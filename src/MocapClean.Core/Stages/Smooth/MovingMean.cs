using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>Mean over a window that moves along, never across the ends of a stretch; four series side by side.</summary>
internal static class MovingMean
{
    /// <summary>
    /// A triangular window, as two even ones after each other, in place; near an end the mean of what is left of the window. Sums are made of
    /// whole blocks and parts of them, not of a running total, so that a quiet passage after a loud one keeps all its digits.
    /// </summary>
    /// <param name="values">Four values a sample.</param>
    /// <param name="starts">First index of each stretch, and the length.</param>
    /// <param name="reach">Half the width of each even window, in samples, without the middle.</param>
    /// <param name="spare">Room for as many values and a window.</param>
    public static void Triangular(Span<Vector256<double>> values, ReadOnlySpan<int> starts, int reach, Span<Vector256<double>> spare)
    {
        for (var s = 0; s + 1 < starts.Length; s++)
        {
            var part = values[starts[s]..starts[s + 1]];
            var once = spare[..part.Length];
            Even(part, once, reach, spare[part.Length..]);
            Even(once, part, reach, spare[part.Length..]);
        }
    }

    /// <summary>Room that <see cref="Triangular"/> needs beside the values.</summary>
    public static int Room(int length, int reach) => length + (2 * reach) + 1;

    /// <summary>Reach for a triangle of this whole width, which is two even windows of half of it.</summary>
    public static int Reach(double seconds, double rate) => Math.Max(1, (int)Math.Round(seconds * rate / 4));

    private static void Even(ReadOnlySpan<Vector256<double>> from, Span<Vector256<double>> to, int reach, Span<Vector256<double>> spare)
    {
        var n = from.Length;
        var sum = Vector256<double>.Zero;
        for (var (i, end) = (0, 0); i < Math.Min(reach, n); i++)
        {
            for (; end < Math.Min(n, i + reach + 1); end++)
            {
                sum += from[end];
            }

            to[i] = sum / end;
        }

        sum = Vector256<double>.Zero;
        for (var (i, first) = (n - 1, n); i >= Math.Max(reach, n - reach); i--)
        {
            for (; first > i - reach; first--)
            {
                sum += from[first - 1];
            }

            to[i] = sum / (n - first);
        }

        for (var first = 0; first + reach < n - reach; first += (2 * reach) + 1)
        {
            Block(from, to, first, reach, spare);
        }
    }

    // All whole windows that begin in the block at first: the end of this block and the beginning of the next.
    private static void Block(
        ReadOnlySpan<Vector256<double>> from, Span<Vector256<double>> to, int first, int reach, Span<Vector256<double>> spare)
    {
        var width = (2 * reach) + 1;
        var tail = spare[..width];
        var sum = Vector256<double>.Zero;
        for (var k = width - 1; k >= 0; k--)
        {
            sum += from[first + k];
            tail[k] = sum;
        }

        var share = Vector256.Create(1.0 / width);
        to[first + reach] = sum * share;
        sum = Vector256<double>.Zero;
        for (var k = 1; k < Math.Min(width, from.Length - first - (2 * reach)); k++)
        {
            sum += from[first + width + k - 1];
            to[first + reach + k] = (tail[k] + sum) * share;
        }
    }
}
