using System.Buffers;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

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
    private static readonly Vector256<double> Two = Vector256.Create(2.0);
    private readonly PenaltyRows _rows;
    private readonly Gain[] _gains;
    private readonly Vector256<double>[] _surprises;

    /// <summary>Makes room for fits with these rows.</summary>
    public PenalisedFit(PenaltyRows rows)
    {
        _rows = rows;
        _gains = ArrayPool<Gain>.Shared.Rent(rows.Length);
        _surprises = ArrayPool<Vector256<double>>.Shared.Rent(4 * rows.Length);
    }

    /// <summary>Forwards: how much of each surprise goes to value, slope and bend. The penalty of lane and row is 1 / (looseness x local).</summary>
    /// <param name="looseness">One over the strength, a lane each.</param>
    /// <param name="local">One over the local strength, at the last sample of each difference; empty where it is 1 throughout.</param>
    public void Factor(Vector256<double> looseness, ReadOnlySpan<double> local)
    {
        var steps = _rows.Steps;
        var order = _rows.Order;
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            var first = _rows.Starts[s] + order;
            var p = Spread.Of(Beginning(first), order);
            for (var i = first; i < _rows.Starts[s + 1]; i++)
            {
                var push = (local.IsEmpty ? steps[i].Push : steps[i].Push * local[i]) * looseness;
                p.Advance(steps[i], push, order);
                _gains[i] = p.Correct();
            }
        }
    }

    /// <summary>Leverage of each sample, a lane each, for the last <see cref="Factor"/>.</summary>
    public void Leverage(Span<Vector256<double>> leverage)
    {
        var steps = _rows.Steps;
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            var first = _rows.Starts[s] + _rows.Order;
            var later = default(Spread);
            for (var i = _rows.Starts[s + 1] - 1; i >= first; i--)
            {
                leverage[i] = Vector256<double>.One - later.Retreat(_gains[i], steps[i]);
            }

            var from = Beginning(first);
            for (var k = 0; k < _rows.Order; k++)
            {
                leverage[first - _rows.Order + k] = Vector256<double>.One - later.Seen(from[k]);
            }
        }
    }

    /// <summary>The fitted curve of each lane; both spans may be the same.</summary>
    public void Fit(ReadOnlySpan<Vector256<double>> y, Span<Vector256<double>> z)
    {
        var steps = _rows.Steps;
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            var first = _rows.Starts[s] + _rows.Order;
            var from = Beginning(first);
            var state = default(State);
            for (var k = 0; k < _rows.Order; k++)
            {
                state.Begin(from[k], y[first - _rows.Order + k]);
            }

            for (var i = first; i < _rows.Starts[s + 1]; i++)
            {
                _surprises[i] = state.Forwards(_gains[i], steps[i], y[i]);
            }

            var back = default(State);
            for (var i = _rows.Starts[s + 1] - 1; i >= first; i--)
            {
                z[i] = y[i] - back.Backwards(_gains[i], steps[i], _surprises[i]);
            }

            for (var k = 0; k < _rows.Order; k++)
            {
                z[first - _rows.Order + k] = y[first - _rows.Order + k] + back.Seen(from[k]);
            }
        }
    }

    /// <summary>
    /// Squared length of y - z over the four components of a quaternion curve, for the strength of each lane: the four curves are fitted
    /// together, so their chains of operations overlap.
    /// </summary>
    public void SquaredResiduals(ReadOnlySpan<Quat> y, Span<Vector256<double>> squared)
    {
        for (var s = 0; s + 1 < _rows.Starts.Length; s++)
        {
            SquaredResiduals(y, squared, _rows.Starts[s], _rows.Starts[s + 1]);
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        ArrayPool<Gain>.Shared.Return(_gains);
        ArrayPool<Vector256<double>>.Shared.Return(_surprises);
    }

    private void SquaredResiduals(ReadOnlySpan<Quat> y, Span<Vector256<double>> squared, int start, int end)
    {
        var steps = _rows.Steps;
        var first = start + _rows.Order;
        var from = Beginning(first);
        State w = default, x = default, yy = default, zz = default;
        for (var k = 0; k < _rows.Order; k++)
        {
            var q = y[start + k];
            w.Begin(from[k], Vector256.Create(q.W));
            x.Begin(from[k], Vector256.Create(q.X));
            yy.Begin(from[k], Vector256.Create(q.Y));
            zz.Begin(from[k], Vector256.Create(q.Z));
        }

        for (var i = first; i < end; i++)
        {
            var q = y[i];
            _surprises[4 * i] = w.Forwards(_gains[i], steps[i], Vector256.Create(q.W));
            _surprises[(4 * i) + 1] = x.Forwards(_gains[i], steps[i], Vector256.Create(q.X));
            _surprises[(4 * i) + 2] = yy.Forwards(_gains[i], steps[i], Vector256.Create(q.Y));
            _surprises[(4 * i) + 3] = zz.Forwards(_gains[i], steps[i], Vector256.Create(q.Z));
        }

        w = x = yy = zz = default;
        for (var i = end - 1; i >= first; i--)
        {
            var a = w.Backwards(_gains[i], steps[i], _surprises[4 * i]);
            var b = x.Backwards(_gains[i], steps[i], _surprises[(4 * i) + 1]);
            var c = yy.Backwards(_gains[i], steps[i], _surprises[(4 * i) + 2]);
            var d = zz.Backwards(_gains[i], steps[i], _surprises[(4 * i) + 3]);
            squared[i] = (a * a) + (b * b) + (c * c) + (d * d);
        }

        for (var k = 0; k < _rows.Order; k++)
        {
            var (a, b, c, d) = (w.Seen(from[k]), x.Seen(from[k]), yy.Seen(from[k]), zz.Seen(from[k]));
            squared[start + k] = (a * a) + (b * b) + (c * c) + (d * d);
        }
    }

    // What each of the first samples of a stretch adds to value, slope and bend (divided differences) at the last of them.
    private Share[] Beginning(int first)
    {
        var order = _rows.Order;
        var steps = _rows.Steps;
        var shares = new Share[order];
        shares[order - 1].Value = 1;
        if (order >= 2)
        {
            var (one, two) = (steps[first - 1].One, steps[first - 1].Two);
            shares[order - 1].Slope = 1 / one;
            shares[order - 2].Slope = -1 / one;
            if (order == 3)
            {
                var before = steps[first - 2].One;
                shares[2].Bend = 1 / (one * two);
                shares[1].Bend = -((1 / one) + (1 / before)) / two;
                shares[0].Bend = 1 / (before * two);
            }
        }

        return shares;
    }

    [StructLayout(LayoutKind.Auto)]
    private struct Share
    {
        public double Value;
        public double Slope;
        public double Bend;
    }

    [StructLayout(LayoutKind.Auto)]
    private readonly record struct Gain(
        Vector256<double> Value, Vector256<double> Slope, Vector256<double> Bend, Vector256<double> Sureness);

    /// <summary>Value, slope and bend of a curve; on the way back, what later samples have to say about them.</summary>
    [StructLayout(LayoutKind.Auto)]
    private struct State
    {
        private Vector256<double> _value;
        private Vector256<double> _slope;
        private Vector256<double> _bend;

        public void Begin(Share share, Vector256<double> y)
        {
            _value += share.Value * y;
            _slope += share.Slope * y;
            _bend += share.Bend * y;
        }

        public Vector256<double> Forwards(in Gain gain, in PenaltyRows.Step step, Vector256<double> y)
        {
            _slope += step.Two * _bend;
            _value += step.One * _slope;
            var surprise = y - _value;
            _value += gain.Value * surprise;
            _slope += gain.Slope * surprise;
            _bend += gain.Bend * surprise;
            return surprise;
        }

        public Vector256<double> Backwards(in Gain gain, in PenaltyRows.Step step, Vector256<double> surprise)
        {
            var noise = (gain.Sureness * surprise) - ((gain.Value * _value) + (gain.Slope * _slope) + (gain.Bend * _bend));
            _value += noise;
            _slope += step.One * _value;
            _bend += step.Two * _slope;
            return noise;
        }

        public readonly Vector256<double> Seen(Share share) => (share.Value * _value) + (share.Slope * _slope) + (share.Bend * _bend);
    }

    /// <summary>Symmetric 3 x 3 matrix over value, slope and bend: how unsure they are, or on the way back what is known of them.</summary>
    [StructLayout(LayoutKind.Auto)]
    private struct Spread
    {
        private Vector256<double> _vv;
        private Vector256<double> _vs;
        private Vector256<double> _vb;
        private Vector256<double> _ss;
        private Vector256<double> _sb;
        private Vector256<double> _bb;

        public static Spread Of(Share[] from, int order)
        {
            var p = default(Spread);
            for (var k = 0; k < order; k++)
            {
                var f = from[k];
                p._vv += Vector256.Create(f.Value * f.Value);
                p._vs += Vector256.Create(f.Value * f.Slope);
                p._vb += Vector256.Create(f.Value * f.Bend);
                p._ss += Vector256.Create(f.Slope * f.Slope);
                p._sb += Vector256.Create(f.Slope * f.Bend);
                p._bb += Vector256.Create(f.Bend * f.Bend);
            }

            return p;
        }

        public void Advance(in PenaltyRows.Step step, Vector256<double> push, int order)
        {
            _bb += order == 3 ? push : default;
            _ss += step.Two * ((Two * _sb) + (step.Two * _bb));
            _sb += step.Two * _bb;
            _vs += step.Two * _vb;
            _ss += order == 2 ? push : default;
            _vv += step.One * ((Two * _vs) + (step.One * _ss));
            _vs += step.One * _ss;
            _vb += step.One * _sb;
            _vv += order == 1 ? push : default;
        }

        public Gain Correct()
        {
            var sureness = Vector256<double>.One / (_vv + Vector256<double>.One);
            var gain = new Gain(_vv * sureness, _vs * sureness, _vb * sureness, sureness);
            _ss -= gain.Slope * _vs;
            _sb -= gain.Slope * _vb;
            _bb -= gain.Bend * _vb;
            _vv = gain.Value;
            _vs = gain.Slope;
            _vb = gain.Bend;
            return gain;
        }

        public Vector256<double> Retreat(in Gain gain, in PenaltyRows.Step step)
        {
            var v = (_vv * gain.Value) + (_vs * gain.Slope) + (_vb * gain.Bend);
            var s = (_vs * gain.Value) + (_ss * gain.Slope) + (_sb * gain.Bend);
            var b = (_vb * gain.Value) + (_sb * gain.Slope) + (_bb * gain.Bend);
            var own = gain.Sureness + (gain.Value * v) + (gain.Slope * s) + (gain.Bend * b);
            _vv += own - (Two * v);
            _vs -= s;
            _vb -= b;
            _ss += step.One * ((Two * _vs) + (step.One * _vv));
            _vs += step.One * _vv;
            _sb += step.One * _vb;
            _bb += step.Two * ((Two * _sb) + (step.Two * _ss));
            _sb += step.Two * _ss;
            _vb += step.Two * _vs;
            return own;
        }

        public readonly Vector256<double> Seen(Share f) =>
            (f.Value * f.Value * _vv) + (f.Slope * f.Slope * _ss) + (f.Bend * f.Bend * _bb)
            + (2 * ((f.Value * f.Slope * _vs) + (f.Value * f.Bend * _vb) + (f.Slope * f.Bend * _sb)));
    }
}
