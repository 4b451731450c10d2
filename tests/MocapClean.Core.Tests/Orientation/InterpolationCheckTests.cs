using System.Text.Json;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

/// <summary>Against 50-digit arithmetic and SciPy's Slerp and Rotation: Data/Orientation/interpolation.json.</summary>
public sealed class InterpolationCheckTests
{
    private static readonly JsonElement Checks = CheckJson.Read("interpolation.json");

    [Fact]
    public void Slerp_and_component_linear() => Assert.All(Rows(Checks.GetProperty("slerp"), 88), row =>
    {
        var (a, b, t) = (row.Quat("a"), row.Quat("b"), row.Number("t"));
        Near.Equal(row.Quat("slerp"), Slerp.At(a, b, t), 1e-14);
        Near.Equal(row.Quat("component-linear"), ComponentLinear.At(a, b, t), 1e-14);
    });

    [Fact]
    public void Component_linear_is_furthest_from_slerp_where_and_as_far_as_derived()
    {
        var rows = Rows(Checks.GetProperty("component-linear-against-slerp").GetProperty("rows"), 19);
        Assert.All(rows, row =>
        {
            var (span, worst) = (row.Number("span-deg"), row.Number("worst-deg"));
            foreach (var t in row.GetProperty("at-t").Numbers())
            {
                Assert.Equal(worst, Deviation(span, t), 1e-9);
                Assert.True(Deviation(span, t - 0.01) < worst);
                Assert.True(Deviation(span, t + 0.01) < worst);
            }

            Assert.All(Enumerable.Range(0, 101), n => Assert.True(Deviation(span, n / 100.0) <= worst + 1e-9));
        });
    }

    [Fact]
    public void The_widest_spans_of_component_linear_within_a_tolerance()
    {
        var rows = Rows(Checks.GetProperty("component-linear-against-slerp").GetProperty("widest-span-within-tolerance"), 9);
        Assert.All(rows, row =>
        {
            var (tolerance, span) = (row.Number("tolerance-deg"), row.Number("widest-span-deg"));
            var worst = Enumerable.Range(1, 999).Max(n => Deviation(span, n / 2000.0));
            Assert.Equal(tolerance, worst, 1e-5 * Math.Max(1, tolerance));
        });
    }

    [Fact]
    public void Squad_passes_its_keys_and_inner_points()
    {
        var squad = Checks.GetProperty("squad");
        Quat[] keys = [.. squad.GetProperty("keys").EnumerateArray().Select(CheckJson.Quat)];
        Quat[] inner = [.. squad.GetProperty("inner-points").EnumerateArray().Select(CheckJson.Quat)];
        for (var n = 1; n <= 3; n++)
        {
            Near.Equal(inner[n - 1], Squad.Inner(keys[n - 1], keys[n], keys[n + 1]), 1e-13);
            Near.Equal(inner[n - 1], Squad.Inner(-keys[n - 1], keys[n], -keys[n + 1]), 1e-13);
        }

        Assert.All(Rows(squad.GetProperty("rows"), 12), row =>
        {
            var n = row.GetProperty("segment").GetInt32();
            Near.Equal(row.Quat("squad"), Squad.At(keys[n], inner[n - 1], inner[n], keys[n + 1], row.Number("t")), 1e-13);
        });
    }

    [Fact]
    public void Euler_linear() => Assert.All(Rows(Checks.GetProperty("euler-linear"), 20), row =>
    {
        Assert.True(EulerOrders.TryParse(row.GetProperty("order").GetString()!, out var order));
        var played = EulerLinear.At(row.Degrees("from-deg"), row.Degrees("to-deg"), row.Number("t"), order);
        Near.Equal(row.Quat("quaternion"), played, 1e-14);
    });

    private static double Deviation(double spanDegrees, double t)
    {
        var b = RotationVector.Exp(new(0, 0, Angle.FromDegrees(spanDegrees)));
        return Angle.ToDegrees(Angle.Between(Slerp.At(Quat.Identity, b, t), ComponentLinear.At(Quat.Identity, b, t)));
    }

    private static JsonElement[] Rows(JsonElement list, int count)
    {
        JsonElement[] rows = [.. list.EnumerateArray()];
        Assert.Equal(count, rows.Length);
        return rows;
    }
}
