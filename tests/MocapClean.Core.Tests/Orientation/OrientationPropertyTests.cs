using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

public sealed class OrientationPropertyTests
{
    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property A_turn_and_its_rotation_vector_are_one(Quat q)
    {
        var v = RotationVector.Log(q);
        return (Angle.Between(q, RotationVector.Exp(v)) < 1e-14 && v.Norm <= Math.PI + 1e-15).Label($"{v}");
    }

    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Signs_and_lengths_never_change_an_angle(Quat a, Quat b)
    {
        var angle = Angle.Between(a, b);
        var worst = new[] { Angle.Between(-a, b), Angle.Between(a, 0.3 * b), Angle.Between(b, a) }.Max(other => Math.Abs(other - angle));
        return (worst < 1e-15 && angle is >= 0 and <= Math.PI).Label($"{worst}");
    }

    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property A_product_turns_by_one_after_the_other(Quat a, Quat b, int x, int y, int z)
    {
        var v = new Vec3(x, y, z);
        return ((a * b).Rotate(v) - a.Rotate(b.Rotate(v))).Norm.CompareTo(1e-14 * (1 + v.Norm)).Equals(-1).ToProperty();
    }

    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Slerp_turns_evenly_the_short_way(Quat a, Quat b, byte share)
    {
        var (t, angle) = (share / 255.0, Angle.Between(a, b));
        var at = Slerp.At(a, b, t);
        var off = Math.Max(Math.Abs(Angle.Between(a, at) - (t * angle)), Math.Abs(Angle.Between(at, b) - ((1 - t) * angle)));
        return (off < 1e-14 && Math.Abs(at.Norm - 1) < 1e-14).Label($"{off}");
    }

    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Component_linear_keeps_to_the_arc_of_slerp_and_to_length_one(Quat a, Quat b, byte share)
    {
        var at = ComponentLinear.At(a, b, share / 255.0);
        var detour = Angle.Between(a, at) + Angle.Between(at, b) - Angle.Between(a, b);
        return (Math.Abs(detour) < 1e-13 && Math.Abs(at.Norm - 1) < 1e-14).Label($"{detour}");
    }

    [Property(MaxTest = 300, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Squad_through_an_even_turn_is_that_turn(Quat start, byte share, sbyte speed)
    {
        var step = RotationVector.Exp(new(speed / 100.0, 0.1, -0.2));
        var (a, b, c, d) = (start, start * step, start * step * step, start * step * step * step);
        var at = Squad.At(b, Squad.Inner(a, b, c), Squad.Inner(b, c, d), c, share / 255.0);
        return (Angle.Between(at, Slerp.At(b, c, share / 255.0)) < 1e-13).Label($"{at}");
    }

    [Fact]
    public void Slerp_of_nearly_equal_and_of_opposite_orientations_is_sound()
    {
        var a = new Quat(0.5, -0.5, 0.5, 0.5);
        Assert.Equal(a, Slerp.At(a, a, 0.3));
        Assert.Equal(a, Slerp.At(a, -a, 0.3));
        var opposite = a * new Quat(0, 1, 0, 0);
        Assert.Equal(54, Angle.ToDegrees(Angle.Between(a, Slerp.At(a, opposite, 0.3))), 1e-12);
    }

    [Fact]
    public void Text_of_a_quaternion_ends() => Assert.Equal("(1, 0, -0.5, 0.25)", new Quat(1, 0, -0.5, 0.25).ToString());

    [Fact]
    public void Zero_has_no_direction_and_no_inverse()
    {
        Assert.Throws<ArithmeticException>(() => default(Quat).Normalised());
        Assert.Throws<ArithmeticException>(() => default(Quat).Inverse());
        Assert.Throws<ArithmeticException>(() => Quat.Missing.Normalised());
        Assert.False(Quat.Missing.IsOrientation);
        Assert.False(new Quat(double.PositiveInfinity, 0, 0, 0).IsOrientation);
    }
}
