using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// Seen from one key, what each later frame demands of a constant angular velocity that starts there (radians a second, in the key's own
/// frame): to lie in a ball about u / t, with u the rotation vector to the frame and t the time to it. Within <c>Inner</c> is enough, as
/// the exponential never stretches; within <c>Outer</c> is necessary, as between two points at most 2 f from the key it shrinks by no more
/// than sin f / f. Both radii allow for the rounding and for the short series used here, so they refute and accept only what is sure.
/// </summary>
internal readonly struct VelocityBalls
{
    /// <summary>Largest error of a rotation vector here, radians, with room to spare.</summary>
    private const double LogError = 2e-8;

    /// <summary>
    /// Length of the longest vector that reaches no further than 1 along any of the corridor's directions: (1, sqrt 3 - 1, 0).
    /// </summary>
    private const double Corner = 1.2393136749274760;

    private readonly Vector256<double> w;
    private readonly Vector256<double> x;
    private readonly Vector256<double> y;
    private readonly Vector256<double> z;
    private readonly Vector256<double> start;
    private readonly Vector256<double> necessary;
    private readonly Vector256<double> enough;

    /// <summary>Balls seen from a frame.</summary>
    /// <param name="stretch">The samples.</param>
    /// <param name="key">The frame.</param>
    /// <param name="necessary">Tolerance of the outer balls, radians.</param>
    /// <param name="enough">Tolerance of the inner balls, radians; none is certain to be inside where this is negative.</param>
    public VelocityBalls(Stretch stretch, int key, double necessary, double enough)
    {
        var q = stretch[key];
        (w, x, y, z) = (Vector256.Create(q.W), Vector256.Create(q.X), Vector256.Create(q.Y), Vector256.Create(q.Z));
        start = Vector256.Create(stretch.Time[key]);
        this.necessary = Vector256.Create(necessary);
        this.enough = Vector256.Create((enough - (2 * LogError)) / Corner);
    }

    /// <summary>Inner products of the key and four frames.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Vector256<double> Facing(in FourQuats q) => (w * q.W) + (x * q.X) + (y * q.Y) + (z * q.Z);

    /// <summary>The balls of four frames.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Of(in FourQuats q, Vector256<double> times, ref FourBalls balls)
    {
        var dot = Facing(q);
        // The short way round: all components of key* q take the sign of its w.
        var sign = dot & Vector256.Create(-0.0);
        var facing = dot ^ sign;
        var half = Vector256<double>.One / (facing + Vector256<double>.One);
        var square = (Vector256<double>.One - facing) * half;
        var series = Arctangent(square);
        var scale = (4 * series * half) ^ sign;
        var perSecond = Vector256<double>.One / (times - start);
        var stretch = scale * perSecond;
        balls.Facing = dot;
        balls.X = ((w * q.X) - (x * q.W) - (y * q.Z) + (z * q.Y)) * stretch;
        balls.Y = ((w * q.Y) - (y * q.W) - (z * q.X) + (x * q.Z)) * stretch;
        balls.Z = ((w * q.Z) - (z * q.W) - (x * q.Y) + (y * q.X)) * stretch;
        balls.Inner = enough * perSecond;
        balls.Outer = ((necessary * Shrinkage(16 * series * series * square)) + Vector256.Create(2 * LogError)) * perSecond;
    }

    /// <summary>
    /// An upper bound of f / sin f with f = (|u| + tolerance) / 2, from |u| squared: (|u| + d)^2 is at most 1.1 |u|^2 + 11 d^2, and
    /// 1 + f^2 / 6 + 0.03 f^4 is above f / sin f up to f = pi/2. Beyond, the frame demands nothing.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Vector256<double> Shrinkage(Vector256<double> turnSquared)
    {
        var f2 = (0.275 * turnSquared) + (2.75 * necessary * necessary);
        var bound = Vector256<double>.One + (f2 * (Vector256.Create(1 / 6.0) + (0.03 * f2)));
        return Vector256.ConditionalSelect(
            Vector256.GreaterThan(f2, Vector256.Create(Math.PI * Math.PI / 4)), Vector256.Create(double.PositiveInfinity), bound);
    }

    /// <summary>
    /// atan(s) / s from s squared in [0, 1]: Chebyshev fit of degree 9, within 3e-9. Summed in pairs (Estrin), as the search waits for it.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> Arctangent(Vector256<double> z)
    {
        var z2 = z * z;
        var z4 = z2 * z2;
        var a = Line(0.9999999975460191, -0.3333328229550229, z) + (z2 * Line(0.1999823064022923, -0.1426157367926612, z));
        var b = Line(0.10940198961187342, -0.08372063938797225, z) + (z2 * Line(0.057463557715784645, -0.030717508790498865, z));
        return a + (z4 * (b + (z4 * Line(0.01068071939260335, -0.0017437011332367548, z))));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> Line(double at0, double slope, Vector256<double> z) => Vector256.Create(at0) + (slope * z);
}
