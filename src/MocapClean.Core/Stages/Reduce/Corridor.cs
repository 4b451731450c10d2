using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// What is left of all angular velocities once each frame has put its ball in: bounds of the intersection along seven directions (three
/// axes, four diagonals of the cube; the eighth lane repeats the first), and bounds that keep a velocity inside every sufficient ball.
/// </summary>
internal struct Corridor
{
    private const double D = 0.57735026918962576;

    private Vector256<double> lowA;
    private Vector256<double> lowB;
    private Vector256<double> highA;
    private Vector256<double> highB;
    private Vector256<double> innerLowA;
    private Vector256<double> innerLowB;
    private Vector256<double> innerHighA;
    private Vector256<double> innerHighB;

    /// <summary>Allows everything.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Open()
    {
        lowA = lowB = innerLowA = innerLowB = Vector256.Create(double.NegativeInfinity);
        highA = highB = innerHighA = innerHighB = Vector256.Create(double.PositiveInfinity);
    }

    /// <summary>Whether nothing is left, for sure.</summary>
    public readonly bool IsEmpty
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        get => (Vector256.GreaterThan(lowA, highA) | Vector256.GreaterThan(lowB, highB)).ExtractMostSignificantBits() != 0;
    }

    /// <summary>Whether a velocity is refuted by a frame so far.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public readonly bool Refutes(in Reading velocity) =>
        (Vector256.LessThan(velocity.A, lowA) | Vector256.GreaterThan(velocity.A, highA) |
         Vector256.LessThan(velocity.B, lowB) | Vector256.GreaterThan(velocity.B, highB)).ExtractMostSignificantBits() != 0;

    /// <summary>Whether a velocity suits every frame so far, for sure.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public readonly bool Accepts(in Reading velocity) =>
        (Vector256.LessThan(velocity.A, innerLowA) | Vector256.GreaterThan(velocity.A, innerHighA) |
         Vector256.LessThan(velocity.B, innerLowB) | Vector256.GreaterThan(velocity.B, innerHighB)).ExtractMostSignificantBits() == 0;

    /// <summary>Puts in the ball of a frame.</summary>
    /// <param name="centre">Its centre.</param>
    /// <param name="outer">Necessary radius.</param>
    /// <param name="inner">Half-width, along all directions, that stays inside the sufficient ball; negative where there is none.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Narrow(in Reading centre, double outer, double inner)
    {
        var (radius, side) = (Vector256.Create(outer), Vector256.Create(inner));
        lowA = Vector256.MaxNative(lowA, centre.A - radius);
        highA = Vector256.MinNative(highA, centre.A + radius);
        lowB = Vector256.MaxNative(lowB, centre.B - radius);
        highB = Vector256.MinNative(highB, centre.B + radius);
        innerLowA = Vector256.MaxNative(innerLowA, centre.A - side);
        innerHighA = Vector256.MinNative(innerHighA, centre.A + side);
        innerLowB = Vector256.MaxNative(innerLowB, centre.B - side);
        innerHighB = Vector256.MinNative(innerHighB, centre.B + side);
    }

    /// <summary>Puts in the balls of four frames.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void Narrow(ref FourBalls four)
    {
        // The bounds stay in registers meanwhile.
        var (la, lb, ha, hb) = (lowA, lowB, highA, highB);
        var (ila, ilb, iha, ihb) = (innerLowA, innerLowB, innerHighA, innerHighB);
        for (var k = 0; k < 4; k++)
        {
            var centre = four.Centre(k);
            var radius = Vector256.Create(FourBalls.At(ref four.Outer, k));
            var side = Vector256.Create(FourBalls.At(ref four.Inner, k));
            la = Vector256.MaxNative(la, centre.A - radius);
            ha = Vector256.MinNative(ha, centre.A + radius);
            lb = Vector256.MaxNative(lb, centre.B - radius);
            hb = Vector256.MinNative(hb, centre.B + radius);
            ila = Vector256.MaxNative(ila, centre.A - side);
            iha = Vector256.MinNative(iha, centre.A + side);
            ilb = Vector256.MaxNative(ilb, centre.B - side);
            ihb = Vector256.MinNative(ihb, centre.B + side);
        }

        (lowA, lowB, highA, highB) = (la, lb, ha, hb);
        (innerLowA, innerLowB, innerHighA, innerHighB) = (ila, ilb, iha, ihb);
    }

    /// <summary>Leaves nothing.</summary>
    public void Close() =>
        (lowA, highA) = (Vector256.Create(double.PositiveInfinity), Vector256.Create(double.NegativeInfinity));

    /// <summary>A velocity read along the seven directions.</summary>
    public readonly struct Reading
    {
        /// <summary>Along three axes and the first diagonal; along the other diagonals and the first axis again.</summary>
        public readonly Vector256<double> A, B;

        /// <summary>Reads a velocity, radians a second.</summary>
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public Reading(double x, double y, double z)
        {
            var (vx, vy, vz) = (Vector256.Create(x), Vector256.Create(y), Vector256.Create(z));
            A = (vx * Vector256.Create(1, 0, 0, D)) + (vy * Vector256.Create(0, 1, 0, D)) + (vz * Vector256.Create(0, 0, 1, D));
            B = (vx * Vector256.Create(-D, D, D, 1)) + (vy * Vector256.Create(D, -D, D, 0)) + (vz * Vector256.Create(D, D, -D, 0));
        }
    }
}
