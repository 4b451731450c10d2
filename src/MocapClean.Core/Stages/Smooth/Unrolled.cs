using System.Runtime.Intrinsics;
using MathNet.Numerics.LinearAlgebra;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// A curve of orientations unrolled into space: the turns from sample to sample of a rough curve, each seen in the joint's own frame, laid end
/// to end, and the samples as small turns beside it. Turning about one axis becomes a straight line however far it goes, and the axes about
/// which a joint hardly turns (a knee has one that matters) can be told from the others. Axes are the principal ones of the motion, so a
/// constant rotation of the input on either side changes nothing.
/// </summary>
internal sealed class Unrolled
{
    private readonly Quat[] _rough;
    private readonly Vec3[] _path;
    private Matrix<double> _axes = Matrix<double>.Build.DenseIdentity(3);

    /// <summary>Unrolls the samples along a rough curve of unit quaternions.</summary>
    public Unrolled(JointCurve curve, Quat[] rough)
    {
        _rough = rough;
        _path = new Vec3[rough.Length];
        Values = new Vector256<double>[rough.Length];
        for (var s = 0; s + 1 < curve.Starts.Length; s++)
        {
            for (var i = curve.Starts[s]; i < curve.Starts[s + 1]; i++)
            {
                _path[i] = i > curve.Starts[s] ? _path[i - 1] + RotationVector.From(rough[i - 1], rough[i]) : Vec3.Zero;
                var v = _path[i] + RotationVector.From(rough[i], curve.Samples[i]);
                Values[i] = Vector256.Create(v.X, v.Y, v.Z, 0);
            }
        }
    }

    /// <summary>The samples unrolled, radians, an axis a lane; the fourth is 0.</summary>
    public Vector256<double>[] Values { get; }

    /// <summary>Turns the lanes to the principal axes of what the penalty sees in a smoothed copy.</summary>
    /// <param name="smoothed">The values smoothed alike on all axes.</param>
    /// <param name="rows">Rows of the penalty.</param>
    /// <param name="local">Looseness of each row.</param>
    public void AlignAxes(ReadOnlySpan<Vector256<double>> smoothed, PenaltyRows rows, ReadOnlySpan<double> local)
    {
        Vector256<double> byX = default, byY = default, byZ = default;
        for (var s = 0; s + 1 < rows.Starts.Length; s++)
        {
            for (var i = rows.Starts[s] + 3; i < rows.Starts[s + 1]; i++)
            {
                var d = rows.ThirdDifference(smoothed, i);
                var seen = d / local[i];
                byX += seen * d[0];
                byY += seen * d[1];
                byZ += seen * d[2];
            }
        }

        var spread = Matrix<double>.Build.DenseOfArray(new[,] { { byX[0], byX[1], byX[2] }, { byY[0], byY[1], byY[2] }, { byZ[0], byZ[1], byZ[2] } });
        _axes = spread.Evd(Symmetricity.Symmetric).EigenVectors;
        var (x, y, z) = (Axis(0), Axis(1), Axis(2));
        for (var i = 0; i < Values.Length; i++)
        {
            var v = Values[i];
            Values[i] = Vector256.Create(Vector256.Dot(v, x), Vector256.Dot(v, y), Vector256.Dot(v, z), 0);
        }
    }

    /// <summary>Rolls a curve up again.</summary>
    public Quat Orientation(int i, Vector256<double> value)
    {
        var turn = (value[0] * Axis(0)) + (value[1] * Axis(1)) + (value[2] * Axis(2));
        return _rough[i] * RotationVector.Exp(new Vec3(turn[0], turn[1], turn[2]) - _path[i]);
    }

    private Vector256<double> Axis(int k) => Vector256.Create(_axes[0, k], _axes[1, k], _axes[2, k], 0);
}
