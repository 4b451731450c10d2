namespace MocapClean.Core.Orientation;

/// <summary>
/// A quaternion of doubles in the order (w, x, y, z), Hamilton product, active: a unit quaternion q turns a vector v to q v q*.
/// Four adjacent doubles in memory, so an array of them is also an array of numbers. q and -q are the same orientation.
/// </summary>
public readonly record struct Quat(double W, double X, double Y, double Z)
{
    /// <summary>Below this squared length a quaternion has no direction worth keeping: it is a missing sample.</summary>
    public const double ZeroNormSquared = 1e-12;

    /// <summary>No turn.</summary>
    public static Quat Identity => new(1, 0, 0, 0);

    /// <summary>A sample that is not there: all components NaN.</summary>
    public static Quat Missing => new(double.NaN, double.NaN, double.NaN, double.NaN);

    /// <summary>Length; 1 for an orientation.</summary>
    public double Norm => Math.Sqrt(NormSquared);

    /// <summary>Square of the length.</summary>
    public double NormSquared => (W * W) + (X * X) + (Y * Y) + (Z * Z);

    /// <summary>The vector part (x, y, z).</summary>
    public Vec3 Vector => new(X, Y, Z);

    /// <summary>(w, -x, -y, -z): the inverse of a unit quaternion.</summary>
    public Quat Conjugate => new(W, -X, -Y, -Z);

    /// <summary>Finite and long enough to be projected to the unit sphere.</summary>
    public bool IsOrientation => double.IsFinite(NormSquared) && NormSquared > ZeroNormSquared;

    /// <summary>Hamilton product: the turn b followed by the turn a, both in the outer frame.</summary>
    public static Quat operator *(Quat a, Quat b) => new(
        (a.W * b.W) - (a.X * b.X) - (a.Y * b.Y) - (a.Z * b.Z),
        (a.W * b.X) + (a.X * b.W) + (a.Y * b.Z) - (a.Z * b.Y),
        (a.W * b.Y) + (a.Y * b.W) + (a.Z * b.X) - (a.X * b.Z),
        (a.W * b.Z) + (a.Z * b.W) + (a.X * b.Y) - (a.Y * b.X));

    /// <summary>The same orientation written with the other sign.</summary>
    public static Quat operator -(Quat q) => new(-q.W, -q.X, -q.Y, -q.Z);

    /// <summary>Component-wise sum; not an orientation until projected.</summary>
    public static Quat operator +(Quat a, Quat b) => new(a.W + b.W, a.X + b.X, a.Y + b.Y, a.Z + b.Z);

    /// <summary>Component-wise multiple; not an orientation until projected.</summary>
    public static Quat operator *(double s, Quat q) => new(s * q.W, s * q.X, s * q.Y, s * q.Z);

    /// <summary>Inner product of the four components: cos of half the angle between two orientations, up to sign.</summary>
    public static double Dot(Quat a, Quat b) => (a.W * b.W) + (a.X * b.X) + (a.Y * b.Y) + (a.Z * b.Z);

    /// <summary>The inverse of any quaternion but zero: conjugate over squared length.</summary>
    /// <exception cref="ArithmeticException">The quaternion is zero or not finite.</exception>
    public Quat Inverse()
    {
        var n = NormSquared;
        return double.IsFinite(n) && n > 0 ? (1 / n) * Conjugate : throw NoDirection(this);
    }

    /// <summary>Projection to the unit sphere: the same direction with length 1.</summary>
    /// <exception cref="ArithmeticException">The quaternion is shorter than 1e-6 or not finite, so it has no direction.</exception>
    public Quat Normalised() => IsOrientation ? (1 / Norm) * this : throw NoDirection(this);

    /// <summary>The vector turned by this unit quaternion: q v q*.</summary>
    public Vec3 Rotate(Vec3 v)
    {
        var t = 2 * Vec3.Cross(Vector, v);
        return v + (W * t) + Vec3.Cross(Vector, t);
    }

    /// <summary>"(w, x, y, z)". Spelled out, since a record would print its conjugate, and that one its own, without end.</summary>
    public override string ToString() => $"({W}, {X}, {Y}, {Z})";

    private static ArithmeticException NoDirection(Quat q) => new($"{q} is no orientation: its length is 0 or not finite");
}
