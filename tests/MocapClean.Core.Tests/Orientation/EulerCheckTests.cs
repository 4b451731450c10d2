using System.Text.Json;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

/// <summary>Against SciPy's Rotation and products of axis matrices: Data/Orientation/euler.json.</summary>
public sealed class EulerCheckTests
{
    private static readonly JsonElement[] Rows = [.. CheckJson.Read("euler.json").GetProperty("rows").EnumerateArray()];

    public static IEnumerable<TheoryDataRow<int>> Indices => Enumerable.Range(0, Rows.Length).Select(n => new TheoryDataRow<int>(n));

    [Theory]
    [MemberData(nameof(Indices))]
    public void Angles_build_the_orientation(int index)
    {
        var row = Rows[index];

        var built = Euler.ToQuat(row.Degrees("angles-deg"), Order(row));

        var expected = row.Quat("quaternion");
        Near.Equal(Quat.Dot(expected, built) < 0 ? -expected : expected, built, 1e-14);
        Near.Matrix([.. row.GetProperty("matrix-rows").EnumerateArray().Select(r => r.Numbers())], built, 1e-14);
    }

    [Theory]
    [MemberData(nameof(Indices))]
    public void The_orientation_gives_angles_that_build_it_again_in_their_principal_ranges(int index)
    {
        var row = Rows[index];
        var (q, order) = (row.Quat("quaternion"), Order(row));

        var angles = Euler.ToAngles(q, order);

        Near.SameOrientation(q, Euler.ToQuat(angles, order), row.GetProperty("locked").GetBoolean() ? 1e-6 : 1e-9);
        var (low, high) = order.RepeatsFirst() ? (0, Math.PI) : (-Math.PI / 2, Math.PI / 2);
        Assert.InRange(angles.Second, low, high);
        Assert.InRange(angles.First, -Math.PI, Math.PI);
        Assert.InRange(angles.Third, -Math.PI, Math.PI);
    }

    [Theory]
    [MemberData(nameof(Indices))]
    public void The_angles_are_the_known_ones_where_they_are_unique(int index)
    {
        var row = Rows[index];
        var (q, order) = (row.Quat("quaternion"), Order(row));
        if (row.GetProperty("locked").GetBoolean())
        {
            var (first, third) = (Angle.ToDegrees(Euler.ToAngles(q, order).First), Angle.ToDegrees(Euler.ToAngles(q, order).Third));
            var known = row.GetProperty("what-is-fixed-when-locked").EnumerateObject().Single();
            var combined = known.NameEquals("first-plus-third-deg") ? first + third : first - third;
            Assert.Equal(0, Math.IEEERemainder(combined - known.Value.GetDouble(), 360), 1e-6);
        }
        else
        {
            Assert.Equal(0, EulerAngles.Distance(row.Degrees("one-decomposition-deg"), Euler.ToAngles(q, order)), 1e-9);
        }
    }

    [Theory]
    [MemberData(nameof(Indices))]
    public void The_angles_that_built_it_come_back_when_they_are_the_ones_before(int index)
    {
        var row = Rows[index];
        var before = row.Degrees("angles-deg");

        var angles = Euler.ToAngles(row.Quat("quaternion"), Order(row), before);

        Assert.Equal(0, EulerAngles.Distance(before, angles), 1e-7);
    }

    private static EulerOrder Order(JsonElement row)
    {
        Assert.True(EulerOrders.TryParse(row.GetProperty("order").GetString()!, out var order));
        return order;
    }
}
