using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Four quaternions, component by component.</summary>
internal readonly struct FourQuats
{
    /// <summary>Components w, x, y and z of the four.</summary>
    public readonly Vector256<double> W, X, Y, Z;

    /// <summary>From their components.</summary>
    public FourQuats(Vector256<double> w, Vector256<double> x, Vector256<double> y, Vector256<double> z) => (W, X, Y, Z) = (w, x, y, z);

    /// <summary>Squared chords from unit quaternions to unit quaternions of either sign: whichever of q and -q is nearer.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Vector256<double> SquaredChords(in FourQuats a, in FourQuats b)
    {
        var (w, x, y, z) = (a.W - b.W, a.X - b.X, a.Y - b.Y, a.Z - b.Z);
        var near = (w * w) + (x * x) + (y * y) + (z * z);
        // |p + q|^2 = 4 - |p - q|^2; the hair keeps its rounding from ever making a chord look shorter than it is.
        return Vector256.MinNative(near, Vector256.Create(4 + 4e-15) - near);
    }
}
