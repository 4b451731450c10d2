namespace MocapClean.Core.Orientation;

/// <summary>Spherical linear interpolation at constant speed along the shorter arc. Source: Shoemake 1985.</summary>
public static class Slerp
{
    /// <summary>The orientation at t in [0, 1] between two unit quaternions; t = 0 gives a, t = 1 gives b on a's side.</summary>
    public static Quat At(Quat a, Quat b, double t)
    {
        var dot = Quat.Dot(a, b);
        var near = dot < 0 ? -b : b;
        // Half the angle by atan2 of chord lengths: exact for nearly equal and nearly opposite quaternions.
        var half = 2 * Math.Atan2((near + (-a)).Norm, (near + a).Norm);
        if (half < 1e-9)
        {
            return (((1 - t) * a) + (t * near)).Normalised();
        }

        var s = Math.Sin(half);
        return ((Math.Sin((1 - t) * half) / s) * a) + ((Math.Sin(t * half) / s) * near);
    }
}
