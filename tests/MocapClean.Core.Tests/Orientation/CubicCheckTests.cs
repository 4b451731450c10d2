using System.Text.Json;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

/// <summary>Against the formulas of the glTF 2.0 specification, appendix C: Data/Orientation/interpolation.json.</summary>
public sealed class CubicCheckTests
{
    private static readonly JsonElement Checks = CheckJson.Read("interpolation.json");
    private static readonly JsonElement Gltf = Checks.GetProperty("gltf");
    private static readonly double[] Times = Gltf.GetProperty("times").Numbers();

    [Fact]
    public void Linear_is_slerp()
    {
        var keys = Quats("linear-and-step-keys");
        Assert.All(Gltf.GetProperty("linear-and-step").EnumerateArray(), row =>
        {
            var (n, t) = Span(row.Number("time"));
            var played = Slerp.At(keys[n], keys[n + 1], t);
            var expected = row.Quat("LINEAR");
            Near.Equal(Quat.Dot(played, expected) < 0 ? -expected : expected, played, 1e-13);
        });
    }

    [Fact]
    public void Cubic_spline()
    {
        var (keys, arriving, leaving) = (Quats("cubic-keys"), Quats("cubic-in-tangents"), Quats("cubic-out-tangents"));
        var rows = Gltf.GetProperty("cubic").EnumerateArray().ToArray();
        Assert.Equal(12, rows.Length);
        Assert.All(rows, row =>
        {
            var (n, t) = Span(row.Number("time"));
            var (a, b, seconds) = (keys[n], keys[n + 1], Times[n + 1] - Times[n]);
            Near.Equal(row.Quat("before-normalising"), HermiteCubic.Components(a, leaving[n], b, arriving[n + 1], seconds, t), 1e-13);
            Near.Equal(row.Quat("CUBICSPLINE"), HermiteCubic.At(a, leaving[n], b, arriving[n + 1], seconds, t), 1e-13);
        });
    }

    [Fact]
    public void With_tangents_of_constant_speed_it_stays_near_slerp_as_measured()
    {
        var rows = Checks.GetProperty("constant-speed-tangents-against-slerp").EnumerateArray().ToArray();
        Assert.Equal(8, rows.Length);
        Assert.All(rows, row =>
        {
            var half = new Quat(0, 0, Angle.FromDegrees(row.Number("span-deg")) / 2, 0);
            var (a, b) = (Quat.Identity, RotationVector.Exp(2 * half.Vector));
            var (leaving, arriving, t) = (a * half, b * half, row.Number("at-t"));

            var off = Angle.ToDegrees(Angle.Between(Slerp.At(a, b, t), HermiteCubic.At(a, leaving, b, arriving, 1, t)));

            Assert.Equal(1, off / row.Number("worst-deg-from-slerp"), 1e-4);
        });
    }

    [Fact]
    public void A_stored_key_is_returned_as_it_is()
    {
        var (a, b, tangent) = (new Quat(0.8, 0.6, 0, 0.001), new Quat(0, 0.6, 0.8, -0.001), new Quat(3, 1, 4, 1));

        Assert.Equal(a, HermiteCubic.At(a, tangent, b, tangent, 0.4, 0));
        Assert.Equal(b, HermiteCubic.At(a, tangent, b, tangent, 0.4, 1));
    }

    private static Quat[] Quats(string name) => [.. Gltf.GetProperty(name).EnumerateArray().Select(CheckJson.Quat)];

    private static (int Key, double Share) Span(double time)
    {
        var n = Math.Clamp(Array.FindLastIndex(Times, key => key <= time), 0, Times.Length - 2);
        return (n, (time - Times[n]) / (Times[n + 1] - Times[n]));
    }
}
