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
    private Vector256<double> pointA;
    private Vector256<double> pointB;

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

    /// <summary>Looks at one velocity: the centre of a frame's ball. The questions below are about it.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Look(double x, double y, double z)
    {
        var (vx, vy, vz) = (Vector256.Create(x), Vector256.Create(y), Vector256.Create(z));
        pointA = (vx * Vector256.Create(1, 0, 0, D)) + (vy * Vector256.Create(0, 1, 0, D)) + (vz * Vector256.Create(0, 0, 1, D));
        pointB = (vx * Vector256.Create(-D, D, D, 1)) + (vy * Vector256.Create(D, -D, D, 0)) + (vz * Vector256.Create(D, D, -D, 0));
    }

    /// <summary>Whether the velocity looked at is refuted by a frame so far.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public readonly bool Refutes() =>
        (Vector256.LessThan(pointA, lowA) | Vector256.GreaterThan(pointA, highA) |
         Vector256.LessThan(pointB, lowB) | Vector256.GreaterThan(pointB, highB)).ExtractMostSignificantBits() != 0;

    /// <summary>Whether the velocity looked at suits every frame so far, for sure.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public readonly bool Accepts() =>
        ((Vector256.LessThan(pointA, boxLow) | Vector256.GreaterThan(pointA, boxHigh)).ExtractMostSignificantBits() & 7) == 0;

    /// <summary>Puts in the ball about the velocity looked at.</summary>
    /// <param name="outer">Necessary radius.</param>
    /// <param name="inner">Half the side of the cube inside the sufficient ball; negative where there is none.</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Narrow(double outer, double inner)
    {
        var (radius, side) = (Vector256.Create(outer), Vector256.Create(inner));
        lowA = Vector256.MaxNative(lowA, pointA - radius);
        highA = Vector256.MinNative(highA, pointA + radius);
        lowB = Vector256.MaxNative(lowB, pointB - radius);
        highB = Vector256.MinNative(highB, pointB + radius);
        boxLow = Vector256.MaxNative(boxLow, pointA - side);
        boxHigh = Vector256.MinNative(boxHigh, pointA + side);
    }
}
