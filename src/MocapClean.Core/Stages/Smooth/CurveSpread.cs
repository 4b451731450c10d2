using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Symmetric 3 x 3 matrix over value, slope and bend of a curve, four side by side: how unsure they are; on the way back, how much the later
/// samples know about them. Its two loops are kept whole, with the six entries in registers: they take most of the time of a fit.
/// </summary>
[StructLayout(LayoutKind.Auto)]
internal struct CurveSpread
{
    private static readonly Vector256<double> Two = Vector256.Create(2.0);
    private Vector256<double> _vv;
    private Vector256<double> _vs;
    private Vector256<double> _vb;
    private Vector256<double> _ss;
    private Vector256<double> _sb;
    private Vector256<double> _bb;

    /// <summary>How much of a sample's surprise goes to value, slope and bend; and the certainty, one over the variance of the surprise.</summary>
    [StructLayout(LayoutKind.Auto)]
    public readonly record struct Gain(
        Vector256<double> Value, Vector256<double> Slope, Vector256<double> Bend, Vector256<double> Sureness);

    /// <summary>The spread at the last of the first samples of a stretch, whose noise has variance 1.</summary>
    public static CurveSpread Of(ReadOnlySpan<PenaltyRows.Part> from)
    {
        var p = default(CurveSpread);
        foreach (var f in from)
        {
            p._vv += Vector256.Create(f.Value * f.Value);
            p._vs += Vector256.Create(f.Value * f.Slope);
            p._vb += Vector256.Create(f.Value * f.Bend);
            p._ss += Vector256.Create(f.Slope * f.Slope);
            p._sb += Vector256.Create(f.Slope * f.Bend);
            p._bb += Vector256.Create(f.Bend * f.Bend);
        }

        return p;
    }

    /// <summary>From sample to sample: the spread grows by the step and its push, and shrinks by what the sample says.</summary>
    public readonly void Forwards(
        PenaltyRows rows, int first, int end, Vector256<double> looseness, ReadOnlySpan<double> local, Span<Gain> gains)
    {
        var (vv, vs, vb, ss, sb, bb) = (_vv, _vs, _vb, _ss, _sb, _bb);
        var steps = rows.Steps;
        var order = rows.Order;
        for (var i = first; i < end; i++)
        {
            var (one, two) = (Vector256.Create(steps[i].One), Vector256.Create(steps[i].Two));
            var push = Vector256.Create(local.IsEmpty ? steps[i].Push : steps[i].Push * local[i]) * looseness;
            bb += order == 3 ? push : default;
            ss += two * ((Two * sb) + (two * bb));
            sb += two * bb;
            vs += two * vb;
            ss += order == 2 ? push : default;
            vv += one * ((Two * vs) + (one * ss));
            vs += one * ss;
            vb += one * sb;
            vv += order == 1 ? push : default;

            var sure = Vector256<double>.One / (vv + Vector256<double>.One);
            var (value, slope, bend) = (vv * sure, vs * sure, vb * sure);
            gains[i] = new Gain(value, slope, bend, sure);
            ss -= slope * vs;
            sb -= slope * vb;
            bb -= bend * vb;
            (vv, vs, vb) = (value, slope, bend);
        }
    }

    /// <summary>Back again: what the later samples know, and from it the leverage of each sample.</summary>
    public void Backwards(PenaltyRows rows, int first, int end, ReadOnlySpan<Gain> gains, Span<Vector256<double>> leverage)
    {
        var (vv, vs, vb, ss, sb, bb) = (_vv, _vs, _vb, _ss, _sb, _bb);
        var steps = rows.Steps;
        for (var i = end - 1; i >= first; i--)
        {
            var (value, slope, bend) = (gains[i].Value, gains[i].Slope, gains[i].Bend);
            var (one, two) = (Vector256.Create(steps[i].One), Vector256.Create(steps[i].Two));
            var v = (vv * value) + (vs * slope) + (vb * bend);
            var s = (vs * value) + (ss * slope) + (sb * bend);
            var b = (vb * value) + (sb * slope) + (bb * bend);
            var own = gains[i].Sureness + (value * v) + (slope * s) + (bend * b);
            leverage[i] = Vector256<double>.One - own;
            vv += own - (Two * v);
            vs -= s;
            vb -= b;
            ss += one * ((Two * vs) + (one * vv));
            vs += one * vv;
            sb += one * vb;
            bb += two * ((Two * sb) + (two * ss));
            sb += two * ss;
            vb += two * vs;
        }

        (_vv, _vs, _vb, _ss, _sb, _bb) = (vv, vs, vb, ss, sb, bb);
    }

    /// <summary>What is known of a sum of value, slope and bend.</summary>
    public readonly Vector256<double> Seen(PenaltyRows.Part f) =>
        (f.Value * f.Value * _vv) + (f.Slope * f.Slope * _ss) + (f.Bend * f.Bend * _bb)
        + (2 * ((f.Value * f.Slope * _vs) + (f.Value * f.Bend * _vb) + (f.Slope * f.Bend * _sb)));
}
