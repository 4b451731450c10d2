using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// What is left of all angular velocities once each frame has put its ball in: bounds of the intersection along seven directions (three
/// axes, four diagonals of the cube; the eighth lane repeats the first), and a box that lies inside every sufficient ball.
/// </summary>
internal struct Corridor
{
    private const double D = 0.57735026918962576;

    private Vector256<double> lowA;
    private Vector256<double> lowB;
    private Vector256<double> highA;
    private Vector256<double> highB;
    private Vector256<double> boxLow;
    private Vector256<double> boxHigh;

    /// <summary>A corridor that allows everything.</summary>
    public static Corridor Open
    {
        get
        {
            var (low, high) = (Vector256.Create(double.NegativeInfinity), Vector256.Create(double.PositiveInfinity));
            return new Corridor { lowA = low, lowB = low, highA = high, highB = high, boxLow = low, boxHigh = high };
        }
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
        ((Vector256.LessThan(velocity.A, boxLow) | Vector256.GreaterThan(velocity.A, boxHigh)).ExtractMostSignificantBits() & 7) == 0;

    /// <summary>Puts in the ball of a frame.</summary>
    /// <param name="centre">Its centre.</param>
    /// <param name="outer">Necessary radius.</param>
    /// <param name="inner">Half the side of the cube inside the sufficient ball; negative where there is none.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Narrow(in Reading centre, double outer, double inner)
    {
        var (radius, side) = (Vector256.Create(outer), Vector256.Create(inner));
        lowA = Vector256.MaxNative(lowA, centre.A - radius);
        highA = Vector256.MinNative(highA, centre.A + radius);
        lowB = Vector256.MaxNative(lowB, centre.B - radius);
        highB = Vector256.MinNative(highB, centre.B + radius);
        boxLow = Vector256.MaxNative(boxLow, centre.A - side);
        boxHigh = Vector256.MinNative(boxHigh, centre.A + side);
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
