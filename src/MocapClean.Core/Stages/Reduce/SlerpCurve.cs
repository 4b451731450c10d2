using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>Constant speed along the shorter arc: cos(h) a + sin(h) e with e a unit quaternion square to a. Source: Shoemake 1985.</summary>
internal readonly struct SlerpCurve : ICurve<SlerpCurve>
{
    private readonly FourQuats from;
    private readonly FourQuats square;
    private readonly Vector256<double> start;
    private readonly Vector256<double> speed;

    private SlerpCurve(Quat a, Quat e, double halfTurn, double start, double duration)
    {
        from = Spread(a);
        square = Spread(e);
        this.start = Vector256.Create(start);
        speed = Vector256.Create(halfTurn / duration);
    }

    /// <inheritdoc/>
    public static double Stray(double turn) => 0;

    /// <inheritdoc/>
    public static double CosHalfTurn(double dot) => Math.Abs(dot);

    /// <inheritdoc/>
    public static SlerpCurve Through(Quat a, Quat b, double start, double end)
    {
        var dot = Quat.Dot(a, b);
        (b, dot) = dot < 0 ? (-b, -dot) : (b, dot);
        var rest = b + (-dot * a);
        var sine = rest.Norm;
        var e = sine > 0 ? (1 / sine) * rest : default;
        return new(a, e, Math.Atan2(sine, dot), start, end - start);
    }

    /// <inheritdoc/>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Vector256<double> SquaredChords(Vector256<double> time, in FourQuats samples)
    {
        var angle = (time - start) * speed;
        var (s, c) = Sine.Of(angle);
        var played = new FourQuats(
            (c * from.W) + (s * square.W), (c * from.X) + (s * square.X), (c * from.Y) + (s * square.Y), (c * from.Z) + (s * square.Z));
        return FourQuats.SquaredChords(played, samples);
    }

    private static FourQuats Spread(Quat q) =>
        new(Vector256.Create(q.W), Vector256.Create(q.X), Vector256.Create(q.Y), Vector256.Create(q.Z));
}
