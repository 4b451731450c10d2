using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Looks over the whole series once, cheaply, and names the samples that deserve a closer look. Strides of one, two and four samples see
/// runs of up to eight whose edges are soft.
/// </summary>
internal sealed class Screen
{
    private static readonly int[] Strides = [1, 2, 4];

    /// <summary>
    /// Share of the threshold at which a closer look begins: the largest innovation around a fault is at least this part of the fault.
    /// </summary>
    private const double Sensitivity = 0.7;

    /// <summary>Seconds, and at least frames, over which the local spread is taken: more than twice the longest spike with its reach.</summary>
    private const double BlockSeconds = 0.45;
    private const int ShortestBlock = 48;

    /// <summary>Samples of the longest place: where everything is striking, the search must not grow with the square of its length.</summary>
    private const int LongestPlace = 64;

    /// <summary>
    /// The noise of the finest motion-capture sensors, 0.025 degrees an axis, as the robust spread of its length, radians: about 2.3 times
    /// that. Nothing is judged in finer units.
    /// </summary>
    private const double FinestNoise = 1e-3;

    private readonly MotionPath path;
    private readonly double[][] innovations;
    private readonly double[][] spreads;
    private readonly double threshold;
    private readonly double slowestDot;

    /// <summary>Looks over a series.</summary>
    /// <param name="path">The series.</param>
    /// <param name="threshold">Robust spreads that make a jump.</param>
    /// <param name="topTurn">A turn between neighbours, radians, beyond which they are looked at in any case.</param>
    public Screen(MotionPath path, double threshold, double topTurn)
    {
        this.path = path;
        this.threshold = threshold;
        slowestDot = Math.Cos(topTurn / 2);
        innovations = [.. Strides.Select(_ => new double[path.Length])];
        var blocks = Math.Max(1, (int)(path.Length / Math.Max(ShortestBlock, BlockSeconds * path.Rate)));
        for (var s = 0; s < Strides.Length; s++)
        {
            Measure(s, 0, path.Length - 1);
        }

        spreads = [.. Strides.Select((_, s) => Blocks(innovations[s], blocks))];
        Noise = Math.Max(Math.Max(FinestNoise, path.Rounding), Quietest(spreads[0]) / Innovations.NoiseGain);
        for (var s = 0; s < Strides.Length; s++)
        {
            spreads[s] = Widest(spreads[s], Noise * Innovations.NoiseGain);
        }
    }

    /// <summary>Robust spread of the length of one sample's noise, radians.</summary>
    public double Noise { get; }

    /// <summary>Looks again at a range after something in it was explained.</summary>
    public void Refresh(int first, int last)
    {
        for (var s = 0; s < Strides.Length; s++)
        {
            Measure(s, Math.Max(0, first), Math.Min(path.Length - 1, last));
        }
    }

    /// <summary>The places that deserve a closer look, the most striking first.</summary>
    /// <param name="together">Striking samples no farther apart than this are one place.</param>
    public List<(int First, int Last)> Places(int together)
    {
        var found = new List<(int First, int Last, double Strength)>();
        for (var n = 0; n < path.Length; n++)
        {
            var strength = Strength(n);
            if (strength < 1 && !IsBesideNothing(n))
            {
                continue;
            }

            if (found.Count > 0 && n - found[^1].Last <= together && n - found[^1].First < LongestPlace)
            {
                found[^1] = (found[^1].First, n, Math.Max(strength, found[^1].Strength));
            }
            else
            {
                found.Add((n, n, strength));
            }
        }

        return [.. found.OrderByDescending(p => p.Strength).Select(p => (p.First, p.Last))];
    }

    /// <summary>The first and last striking sample of a range, -1 where there is none.</summary>
    public (int First, int Last) Striking(int first, int last)
    {
        var found = (First: -1, Last: -1);
        for (var n = first; n <= last; n++)
        {
            if (Strength(n) >= 1)
            {
                found = (found.First < 0 ? n : found.First, n);
            }
        }

        return found;
    }

    /// <summary>
    /// Runs of samples that lie farther from the cubic through their neighbours than any motion takes them, no farther apart than this.
    /// </summary>
    /// <param name="together">Samples no farther apart than this are one run.</param>
    /// <param name="beyond">Radians that no motion can explain.</param>
    public List<(int First, int Last, double Size)> Wild(int together, double beyond)
    {
        var found = new List<(int First, int Last, double Size)>();
        for (var n = 0; n < path.Length; n++)
        {
            var size = innovations[0][n];
            if (!(size > beyond))
            {
                continue;
            }

            if (found.Count > 0 && n - found[^1].Last <= together)
            {
                found[^1] = (found[^1].First, n, Math.Max(size, found[^1].Size));
            }
            else
            {
                found.Add((n, n, size));
            }
        }

        return found;
    }

    /// <summary>How far a sample is beyond what goes unnoticed, as a factor.</summary>
    private double Strength(int n)
    {
        if (!path.Trusted[n])
        {
            return 0;
        }

        var block = (int)((n + 0.5) * spreads[0].Length / path.Length);
        var most = IsTooFast(n) ? 1.0 : 0;
        for (var s = 0; s < Strides.Length; s++)
        {
            var factor = innovations[s][n] / (Sensitivity * threshold * spreads[s][block]);
            most = factor > most ? factor : most;
        }

        return most;
    }

    private bool IsTooFast(int n) => n > 0 && path.Trusted[n - 1] && !path.Cut[n]
        && Math.Abs(Quat.Dot(path.Samples[n - 1], path.Samples[n])) < slowestDot;

    /// <summary>Next to something missing or cut, where no innovation can be had.</summary>
    private bool IsBesideNothing(int n) => path.Trusted[n]
        && (n == 0 || n == path.Length - 1 || path.Cut[n] || path.Cut[n + 1] || !path.Trusted[n - 1] || !path.Trusted[n + 1]);

    private void Measure(int s, int first, int last)
    {
        var (stride, found) = (Strides[s], innovations[s]);
        found.AsSpan(first, last - first + 1).Fill(double.NaN);
        for (var n = Math.Max(0, first - (2 * stride)); n <= last; n++)
        {
            if (!path.Trusted[n])
            {
                continue;
            }

            var end = path.RunEnd(n, last + (2 * stride));
            for (var m = Math.Max(first, n + (2 * stride)); m <= Math.Min(last, end - (2 * stride)); m++)
            {
                found[m] = Innovations.At(path.Samples, m, stride);
            }

            n = end;
        }
    }

    private static double[] Blocks(double[] values, int count)
    {
        var found = new double[count];
        var kept = new double[(values.Length / count) + 2];
        for (var b = 0; b < count; b++)
        {
            // Neighbours share the sample between them where they do not part evenly, so that a reversed series has the same blocks.
            var (first, end) = (values.Length * (long)b / count, ((values.Length * (long)(b + 1)) + count - 1) / count);
            var held = 0;
            for (var n = first; n < end; n++)
            {
                if (!double.IsNaN(values[n]))
                {
                    kept[held++] = values[n];
                }
            }

            found[b] = RobustSpread.Of(kept.AsSpan(0, held));
        }

        return found;
    }

    /// <summary>The tenth part of the blocks that is quietest shows the sensor rather than the motion.</summary>
    private static double Quietest(double[] spreads)
    {
        var sorted = spreads.Where(s => !double.IsNaN(s)).Order().ToArray();
        return sorted.Length == 0 ? 0 : sorted[sorted.Length / 10];
    }

    /// <summary>Each block takes the widest spread of itself and its neighbours: a joint that begins to move is no fault.</summary>
    private static double[] Widest(double[] spreads, double floor)
    {
        var found = new double[spreads.Length];
        for (var b = 0; b < spreads.Length; b++)
        {
            found[b] = floor;
            for (var n = Math.Max(0, b - 1); n <= Math.Min(spreads.Length - 1, b + 1); n++)
            {
                found[b] = spreads[n] > found[b] ? spreads[n] : found[b];
            }
        }

        return found;
    }
}
