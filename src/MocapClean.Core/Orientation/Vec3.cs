namespace MocapClean.Core.Orientation;

/// <summary>A vector of three doubles: a rotation vector in radians, an axis, or a place in space.</summary>
public readonly record struct Vec3(double X, double Y, double Z)
{
    /// <summary>The vector of length 0.</summary>
    public static Vec3 Zero => default;

    /// <summary>Euclidean length.</summary>
    public double Norm => Math.Sqrt((X * X) + (Y * Y) + (Z * Z));

    /// <summary>Square of the length.</summary>
    public double NormSquared => (X * X) + (Y * Y) + (Z * Z);

    /// <summary>Sum.</summary>
    public static Vec3 operator +(Vec3 a, Vec3 b) => new(a.X + b.X, a.Y + b.Y, a.Z + b.Z);

    /// <summary>Difference.</summary>
    public static Vec3 operator -(Vec3 a, Vec3 b) => new(a.X - b.X, a.Y - b.Y, a.Z - b.Z);

    /// <summary>The opposite vector.</summary>
    public static Vec3 operator -(Vec3 a) => new(-a.X, -a.Y, -a.Z);

    /// <summary>Scaled by a number.</summary>
    public static Vec3 operator *(double s, Vec3 a) => new(s * a.X, s * a.Y, s * a.Z);

    /// <summary>Inner product.</summary>
    public static double Dot(Vec3 a, Vec3 b) => (a.X * b.X) + (a.Y * b.Y) + (a.Z * b.Z);

    /// <summary>Vector product, right-handed.</summary>
    public static Vec3 Cross(Vec3 a, Vec3 b) =>
        new((a.Y * b.Z) - (a.Z * b.Y), (a.Z * b.X) - (a.X * b.Z), (a.X * b.Y) - (a.Y * b.X));

    /// <summary>"(x, y, z)".</summary>
    public override string ToString() => $"({X}, {Y}, {Z})";
}
