using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>The balls of four frames, number by number.</summary>
internal struct FourBalls
{
    /// <summary>Centres, radians a second.</summary>
    public Vector256<double> X, Y, Z;

    /// <summary>Necessary radii, and half-widths along all directions that stay inside the sufficient balls, radians a second.</summary>
    public Vector256<double> Outer, Inner;

    /// <summary>Inner products of the key and the frames: the cosine of half the turn, with the sign as written.</summary>
    public Vector256<double> Facing;

    /// <summary>One of the four numbers, read where it lies; k from 0 to 3.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static double At(ref Vector256<double> numbers, int k) =>
        Unsafe.Add(ref Unsafe.As<Vector256<double>, double>(ref numbers), k);

    /// <summary>The centre of one of the four, read along the directions of a corridor.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Corridor.Reading Centre(int k) => new(At(ref X, k), At(ref Y, k), At(ref Z, k));
}
