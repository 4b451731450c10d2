using System.Buffers;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Least squares with a penalty on differences (Whittaker 1923, Eilers 2003): the curve z that makes sum (y - z)^2 + sum of the penalties least,
/// and the exact leverages, dz/dy of each sample, in time linear in samples. Four independent problems side by side, one a lane.
/// <para>
/// The usual banded factors lose about 1e-15 x penalty: at 143 Hz a cutoff of 0.25 Hz is a penalty of 6e11, so no digit would be sure. The same
/// minimum is the mean of a random walk given its samples (Wahba 1978), found by one pass forwards with gains and one backwards (Koopman 1993,
/// disturbance smoother); each stretch begins exactly, from its first samples. Checked against 113-bit factors: 1e-13 at a penalty of 1e14.
/// The leverages are those of Hutchinson and de Hoog 1985.
/// </para>
/// </summary>
internal sealed class PenalisedFit : IDisposable
{
    private readonly PenaltyRows _rows;
    private readonly CurveSpread.Gain[] _gains;
    private readonly Vector256<double>[] _surprises;

    /// <summary>Makes room for fits with these rows.</summary>
    public PenalisedFit(PenaltyRows rows)
    {
        _rows = rows;
        _gains = ArrayPool<CurveSpread.Gain>.Shared.Rent(rows.Length);
        _surprises = ArrayPool<Vector256<double>>.Shared.Rent(4 * rows.Length);
    }

    /// <summary>Forwards: how much of each surprise goes to value, slope and bend. The penalty of lane and row is 1 / (looseness x local).</summary>
    /// <param name="looseness">One over the strength, a lane each.</param>
    /// <param name="local">One over the local strength, at the last sample of each difference; empty where it is 1 throughout.</param>
    public void Factor(Vector256<double> looseness, ReadOnlySpan<double> local)
    {
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            var first = _rows.Starts[s] + _rows.Order;
            var spread = CurveSpread.Of(_rows.Beginning(first));
            spread.Forwards(_rows, first, _rows.Starts[s + 1], looseness, local, _gains);
        }
    }

    /// <summary>Leverage of each sample, a lane each, for the last <see cref="Factor"/>.</summary>
    public void Leverage(Span<Vector256<double>> leverage)
    {
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            var first = _rows.Starts[s] + _rows.Order;
            var later = default(CurveSpread);
            later.Backwards(_rows, first, _rows.Starts[s + 1], _gains, leverage);
            var from = _rows.Beginning(first);
            for (var k = 0; k < from.Length; k++)
            {
                leverage[first - from.Length + k] = Vector256<double>.One - later.Seen(from[k]);
            }
        }
    }

    /// <summary>The fitted curve of each lane; both spans may be the same.</summary>
    public void Fit(ReadOnlySpan<Vector256<double>> y, Span<Vector256<double>> z)
    {
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            Fit(y, z, _rows.Starts[s] + _rows.Order, _rows.Starts[s + 1]);
        }
    }

    /// <summary>
    /// Squared residuals of four curves, the lanes of y, each fitted with the strength of every lane: the four chains of operations overlap.
    /// </summary>
    /// <param name="y">A curve a lane.</param>
    /// <param name="squared">Sum over the four curves at each sample, for the strength of each lane.</param>
    /// <param name="totals">Sum over the samples for each of the four curves, for the strength of each lane.</param>
    public void SquaredResiduals(ReadOnlySpan<Vector256<double>> y, Span<Vector256<double>> squared, Span<Vector256<double>> totals)
    {
        totals.Clear();
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            var first = _rows.Starts[s] + _rows.Order;
            Surprises(y, first, _rows.Starts[s + 1]);
            Squares(squared, totals, first, _rows.Starts[s + 1]);
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        ArrayPool<CurveSpread.Gain>.Shared.Return(_gains);
        ArrayPool<Vector256<double>>.Shared.Return(_surprises);
    }

    private void Fit(ReadOnlySpan<Vector256<double>> y, Span<Vector256<double>> z, int first, int end)
    {
        var steps = _rows.Steps;
        var from = _rows.Beginning(first);
        var state = default(State);
        for (var k = 0; k < from.Length; k++)
        {
            state.Begin(from[k], y[first - from.Length + k]);
        }

        for (var i = first; i < end; i++)
        {
            _surprises[i] = state.Forwards(_gains[i], steps[i], y[i]);
        }

        var back = default(State);
        for (var i = end - 1; i >= first; i--)
        {
            z[i] = y[i] - back.Backwards(_gains[i], steps[i], _surprises[i]);
        }

        for (var k = 0; k < from.Length; k++)
        {
            z[first - from.Length + k] = y[first - from.Length + k] + back.Seen(from[k]);
        }
    }

    private void Surprises(ReadOnlySpan<Vector256<double>> y, int first, int end)
    {
        var steps = _rows.Steps;
        var from = _rows.Beginning(first);
        State a = default, b = default, c = default, d = default;
        for (var k = 0; k < from.Length; k++)
        {
            var v = y[first - from.Length + k];
            a.Begin(from[k], Vector256.Create(v[0]));
            b.Begin(from[k], Vector256.Create(v[1]));
            c.Begin(from[k], Vector256.Create(v[2]));
            d.Begin(from[k], Vector256.Create(v[3]));
        }

        var surprises = _surprises.AsSpan(4 * first, 4 * (end - first));
        for (var i = first; i < end; i++)
        {
            var four = surprises.Slice(4 * (i - first), 4);
            ref readonly var gain = ref _gains[i];
            ref readonly var step = ref steps[i];
            four[0] = a.Forwards(gain, step, Vector256.Create(y[i][0]));
            four[1] = b.Forwards(gain, step, Vector256.Create(y[i][1]));
            four[2] = c.Forwards(gain, step, Vector256.Create(y[i][2]));
            four[3] = d.Forwards(gain, step, Vector256.Create(y[i][3]));
        }
    }

    private void Squares(Span<Vector256<double>> squared, Span<Vector256<double>> totals, int first, int end)
    {
        var steps = _rows.Steps;
        State a = default, b = default, c = default, d = default;
        var (ta, tb, tc, td) = (totals[0], totals[1], totals[2], totals[3]);
        var surprises = _surprises.AsSpan(4 * first, 4 * (end - first));
        for (var i = end - 1; i >= first; i--)
        {
            var four = surprises.Slice(4 * (i - first), 4);
            ref readonly var gain = ref _gains[i];
            ref readonly var step = ref steps[i];
            var (ra, rb) = (a.Backwards(gain, step, four[0]), b.Backwards(gain, step, four[1]));
            var (rc, rd) = (c.Backwards(gain, step, four[2]), d.Backwards(gain, step, four[3]));
            (ra, rb, rc, rd) = (ra * ra, rb * rb, rc * rc, rd * rd);
            squared[i] = ra + rb + (rc + rd);
            (ta, tb, tc, td) = (ta + ra, tb + rb, tc + rc, td + rd);
        }

        var from = _rows.Beginning(first);
        for (var k = 0; k < from.Length; k++)
        {
            var (ra, rb, rc, rd) = (a.Seen(from[k]), b.Seen(from[k]), c.Seen(from[k]), d.Seen(from[k]));
            (ra, rb, rc, rd) = (ra * ra, rb * rb, rc * rc, rd * rd);
            squared[first - from.Length + k] = ra + rb + (rc + rd);
            (ta, tb, tc, td) = (ta + ra, tb + rb, tc + rc, td + rd);
        }

        (totals[0], totals[1], totals[2], totals[3]) = (ta, tb, tc, td);
    }

    /// <summary>Value, slope and bend of a curve; on the way back, what later samples have to say about them.</summary>
    [StructLayout(LayoutKind.Auto)]
    private struct State
    {
        private Vector256<double> _value;
        private Vector256<double> _slope;
        private Vector256<double> _bend;

        public void Begin(PenaltyRows.Part share, Vector256<double> y)
        {
            _value += share.Value * y;
            _slope += share.Slope * y;
            _bend += share.Bend * y;
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public Vector256<double> Forwards(in CurveSpread.Gain gain, in PenaltyRows.Step step, Vector256<double> y)
        {
            _slope += step.Two * _bend;
            _value += step.One * _slope;
            var surprise = y - _value;
            _value += gain.Value * surprise;
            _slope += gain.Slope * surprise;
            _bend += gain.Bend * surprise;
            return surprise;
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public Vector256<double> Backwards(in CurveSpread.Gain gain, in PenaltyRows.Step step, Vector256<double> surprise)
        {
            var noise = (gain.Sureness * surprise) - ((gain.Value * _value) + (gain.Slope * _slope) + (gain.Bend * _bend));
            _value += noise;
            _slope += step.One * _value;
            _bend += step.Two * _slope;
            return noise;
        }

        public readonly Vector256<double> Seen(PenaltyRows.Part share) =>
            (share.Value * _value) + (share.Slope * _slope) + (share.Bend * _bend);
    }
}
