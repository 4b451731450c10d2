namespace MocapClean.Core.Orientation;

/// <summary>
/// Orientations as three angles about axes, in all twelve orders, both ways. Source: Diebel 2006, whose matrices are the transpose of ours.
/// The angles come from half sums and half differences of the quaternion's own components, so nothing is lost near the lock, where the
/// first and last axis fall together and only the sum or the difference of their angles means anything.
/// </summary>
public static class Euler
{
    // Sine or cosine of half the middle angle below which only rounding is left of the free one of sum and difference.
    private const double Locked = 1e-12;

    /// <summary>The unit quaternion of three angles.</summary>
    public static Quat ToQuat(EulerAngles angles, EulerOrder order)
    {
        var (first, second, third) = order.Axes();
        return About(first, angles.First) * About(second, angles.Second) * About(third, angles.Third);
    }

    /// <summary>
    /// The three angles of an orientation in their principal ranges: the middle one in [-pi/2, pi/2] for three axes, in [0, pi] where the
    /// first axis comes again, the others in [-pi, pi]. At the lock the third is 0.
    /// </summary>
    public static EulerAngles ToAngles(Quat q, EulerOrder order)
    {
        var found = Halves.Of(q, order);
        var (sum, difference) = (found.Sum ?? found.Difference!.Value, found.Difference ?? found.Sum!.Value);
        var angles = found.Angles(sum, difference, order);
        return new(Angle.Nearest(angles.First, 0), angles.Second, Angle.Nearest(angles.Third, 0));
    }

    /// <summary>
    /// The three angles of an orientation nearest to another triple: of both solutions, with whole turns added to each angle. At the lock,
    /// where the sum or the difference of the first and third angle is free, the free one stays as it was.
    /// </summary>
    public static EulerAngles ToAngles(Quat q, EulerOrder order, EulerAngles previous)
    {
        var found = Halves.Of(q, order);
        var third = order.RepeatsFirst() ? previous.Third : -previous.Third;
        var (halfSum, halfDifference) = ((previous.First + third) / 2, (previous.First - third) / 2);
        if (found.Sum is not { } sum)
        {
            return Near(halfSum, Angle.Nearest(found.Difference!.Value, halfDifference, Math.PI));
        }

        if (found.Difference is not { } difference)
        {
            return Near(Angle.Nearest(sum, halfSum, Math.PI), halfDifference);
        }

        var one = found.Angles(sum, difference, order).Nearest(previous);
        var mirrored = order.RepeatsFirst() ? -one.Second : Math.PI - one.Second;
        var other = new EulerAngles(one.First + Math.PI, mirrored, one.Third + Math.PI).Nearest(previous);
        return EulerAngles.Distance(other, previous) < EulerAngles.Distance(one, previous) ? other : one;

        EulerAngles Near(double s, double d)
        {
            var angles = found.Angles(s, d, order);
            return angles with { Second = Angle.Nearest(angles.Second, previous.Second) };
        }
    }

    private static Quat About(int axis, double angle)
    {
        var (sin, cos) = Math.SinCos(angle / 2);
        return new(cos, axis == 0 ? sin : 0, axis == 1 ? sin : 0, axis == 2 ? sin : 0);
    }

    private static double Component(Quat q, int axis) => axis == 0 ? q.X : axis == 1 ? q.Y : q.Z;

    /// <summary>
    /// An orientation as A(a) B(m) A(c) in a right-handed frame of axes A and B: the middle angle m in [0, pi], half the sum and half the
    /// difference of a and c. At the lock one of the two is null.
    /// </summary>
    private readonly record struct Halves(double Middle, double? Sum, double? Difference, double Handedness)
    {
        public static Halves Of(Quat q, EulerOrder order)
        {
            var (a, b, _) = order.Axes();
            var rightHanded = (b - a + 3) % 3 == 1 ? 1.0 : -1.0;
            var (w, x, y, z) = (q.W, Component(q, a), Component(q, b), Component(q, 3 - a - b));
            if (order.RepeatsFirst())
            {
                return new(w, x, y, rightHanded * z, rightHanded);
            }

            // C(c) is B(90) A(-c) B(-90), with B reversed in a left-handed order; so the orientation times B(90) repeats its first axis.
            y *= rightHanded;
            return new(w - y, x - z, y + w, z + x, rightHanded);
        }

        /// <summary>The three angles of the order for a half sum and a half difference.</summary>
        public EulerAngles Angles(double sum, double difference, EulerOrder order) => order.RepeatsFirst()
            ? new(sum + difference, Middle, sum - difference)
            : new(sum + difference, Handedness * (Middle - (Math.PI / 2)), difference - sum);

        private Halves(double w, double x, double y, double z, double handedness)
            : this(0, null, null, handedness)
        {
            var (cos, sin) = (Math.Sqrt((w * w) + (x * x)), Math.Sqrt((y * y) + (z * z)));
            Middle = 2 * Math.Atan2(sin, cos);
            Sum = cos > Locked ? Math.Atan2(x, w) : null;
            Difference = sin > Locked ? Math.Atan2(z, y) : null;
        }
    }
}
