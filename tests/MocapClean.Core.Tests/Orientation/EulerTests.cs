using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

public sealed class EulerTests
{
    [Fact]
    public void There_are_twelve_orders_and_each_is_its_letters()
    {
        Assert.Equal(12, EulerOrders.All.Length);
        Assert.All(EulerOrders.All, order =>
        {
            var (a, b, c) = order.Axes();
            Assert.Equal(order.ToString(), $"{"XYZ"[a]}{"XYZ"[b]}{"XYZ"[c]}");
            Assert.Equal(a == c, order.RepeatsFirst());
            Assert.NotEqual(a, b);
            Assert.NotEqual(b, c);
        });
    }

    [Theory]
    [InlineData("")]
    [InlineData("XXY")]
    [InlineData("XY")]
    [InlineData("5")]
    [InlineData("011")]
    [InlineData("XYZ,XZY")]
    public void Letters_that_are_no_order_are_not_read(string letters) => Assert.False(EulerOrders.TryParse(letters, out _));

    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Every_order_builds_every_orientation_again(Quat q)
    {
        var worst = EulerOrders.All.Max(order => Angle.Between(q, Euler.ToQuat(Euler.ToAngles(q, order), order)));
        return (Angle.ToDegrees(worst) < 1e-9).Label($"{Angle.ToDegrees(worst)} deg");
    }

    [Property(MaxTest = 500, Replay = "(123,457)", Arbitrary = [typeof(AnyOrientation)])]
    public Property Every_order_builds_it_again_from_whatever_was_before(Quat q, int a, int b, int c)
    {
        var before = EulerAngles.FromDegrees(a * 13, b * 7, c * 11);
        var worst = EulerOrders.All.Max(order => Angle.Between(q, Euler.ToQuat(Euler.ToAngles(q, order, before), order)));
        return (Angle.ToDegrees(worst) < 1e-9).Label($"{Angle.ToDegrees(worst)} deg");
    }

    [Property(MaxTest = 300, Replay = "(123,457)")]
    public Property Small_moves_keep_to_the_branch_through_many_turns_and_the_second_solution(int a, int b, int c)
    {
        var angles = EulerAngles.FromDegrees((a * 37) % 2000, (b * 23) % 2000, (c * 41) % 2000);
        var before = EulerAngles.FromDegrees(((a * 37) % 2000) + 1, ((b * 23) % 2000) - 1, ((c * 41) % 2000) + 0.5);
        var worst = EulerOrders.All.Max(order => EulerAngles.Distance(Euler.ToAngles(Euler.ToQuat(before, order), order, angles), angles));
        return (worst <= EulerAngles.Distance(before, angles) + 1e-9).Label($"{worst}");
    }

    [Fact]
    public void At_the_lock_the_free_angle_stays_where_it_was()
    {
        var locked = Euler.ToQuat(EulerAngles.FromDegrees(370, 90, 15), EulerOrder.ZYX);

        // First minus third is 355, as before but for 5 degrees that both share.
        var (first, second, third) = Euler.ToAngles(locked, EulerOrder.ZYX, EulerAngles.FromDegrees(375, 88, 15)).ToDegrees();

        Assert.Equal((372.5, 90, 17.5), (Math.Round(first, 9), Math.Round(second, 9), Math.Round(third, 9)));
    }

    [Fact]
    public void A_turn_through_the_lock_runs_on_smoothly()
    {
        var before = EulerAngles.FromDegrees(20, 60, -30);
        for (var middle = 61.0; middle <= 120; middle++)
        {
            before = Euler.ToAngles(Euler.ToQuat(EulerAngles.FromDegrees(20, middle, -30), EulerOrder.ZXY), EulerOrder.ZXY, before);

            Assert.Equal(0, EulerAngles.Distance(EulerAngles.FromDegrees(20, middle, -30), before), 1e-9);
        }
    }
}
