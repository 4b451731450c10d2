namespace MocapClean.Core.Orientation;

/// <summary>Rotation vectors: the axis times the angle in radians. Source: Diebel 2006.</summary>
public static class RotationVector
{
    /// <summary>
    /// The shortest rotation vector of a unit quaternion, length in [0, pi] radians; q and -q give the same, except at exactly pi,
    /// where the two opposite vectors are one turn. Accurate near 0 and near pi.
    /// </summary>
    public static Vec3 Log(Quat q)
    {
        var s = q.Vector.Norm;
        var (w, sign) = q.W < 0 ? (-q.W, -1.0) : (q.W, 1.0);
        // 2 atan2(s, w) / s tends to 2 / w as s tends to 0.
        var scale = s < 1e-12 ? 2 / Math.Max(w, 1e-300) : 2 * Math.Atan2(s, w) / s;
        return sign * scale * q.Vector;
    }

    /// <summary>The unit quaternion of a rotation vector in radians, of any length; a turn beyond pi keeps its sign of w.</summary>
    public static Quat Exp(Vec3 v)
    {
        var half = v.Norm / 2;
        // sin(h) / (2 h), by its series where the quotient loses digits.
        var scale = half < 1e-4 ? 0.5 * (1 - (half * half / 6)) : Math.Sin(half) / (2 * half);
        return new(Math.Cos(half), scale * v.X, scale * v.Y, scale * v.Z);
    }

    /// <summary>The turn that leads from a to b, seen in a's own frame: log(a* b), shortest.</summary>
    public static Vec3 From(Quat a, Quat b) => Log(a.Conjugate * b);
}
