using System.Text.Json;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Orientation;

/// <summary>Against integers by hand, 50-digit arithmetic and SciPy's Rotation: Data/Orientation/orientation.json.</summary>
public sealed class OrientationCheckTests
{
    private static readonly JsonElement Checks = CheckJson.Read("orientation.json");

    [Fact]
    public void Products()
    {
        var rows = Rows("product", 18);
        Assert.All(rows, row =>
        {
            var tolerance = row.GetProperty("exact").GetBoolean() ? 0 : 1e-14;
            Near.Equal(row.Quat("ab"), row.Quat("a") * row.Quat("b"), tolerance);
            Near.Equal(row.Quat("ba"), row.Quat("b") * row.Quat("a"), tolerance);
        });
    }

    [Fact]
    public void Inverses() =>
        Assert.All(Rows("inverse", 4), row => Near.Equal(row.Quat("inverse"), row.Quat("q").Inverse(), 1e-14));

    [Fact]
    public void Turned_vectors() => Assert.All(Rows("rotate", 8), row =>
    {
        var (q, v) = (row.Quat("q"), row.Vec3("v"));
        Near.Equal(row.Vec3("rotated"), q.Rotate(v), 1e-14);
        Near.Equal(row.Vec3("q-inverse-rotated"), q.Conjugate.Rotate(v), 1e-14);
    });

    [Fact]
    public void Angles_between() => Assert.All(Rows("angular-distance", 64), row => Assert.Equal(
        row.Number("expected-deg"), Angle.ToDegrees(Angle.Between(row.Quat("a"), row.Quat("b"))), 1e-12));

    [Fact]
    public void Half_angles() => Assert.All(Rows("half-angle", 23), row =>
    {
        var q = RotationVector.Exp(new(0, 0, Angle.FromDegrees(row.Number("deg-about-z"))));
        Near.Equal(new Quat(row.Number("w"), 0, 0, row.Number("z")), q, 1e-15);
    });

    [Fact]
    public void Rotation_vectors_to_quaternions_and_matrices() => Assert.All(Rows("rotation-vector-quaternion-matrix", 26), row =>
    {
        var v = row.Vec3("rotation-vector");
        var q = RotationVector.Exp(v);

        // The random rows began with a quaternion of either sign; only a turn beyond 180 degrees has a sign of its own.
        Near.Equal(row.Quat(v.Norm >= Math.PI ? "quaternion-as-is" : "quaternion-w-not-negative"), q, 1e-14);
        Near.Matrix(MatrixOf(row), q, 1e-14);
    });

    [Fact]
    public void Quaternions_to_rotation_vectors() => Assert.All(Rows("rotation-vector-quaternion-matrix", 26), row =>
    {
        var (shortest, degrees) = (row.Vec3("shortest-rotation-vector"), row.Number("angle-deg"));
        foreach (var name in new[] { "quaternion-as-is", "quaternion-w-not-negative" })
        {
            var found = RotationVector.Log(row.Quat(name));
            Near.Equal(180 - degrees < 1e-12 && Vec3.Dot(shortest, found) < 0 ? -shortest : shortest, found, 1e-14);
        }

        Assert.Equal(degrees, Angle.ToDegrees(Angle.Between(Quat.Identity, row.Quat("quaternion-as-is"))), 1e-12);
    });

    [Fact]
    public void Both_signs_are_one_orientation() => Assert.All(Rows("double-cover", 3), row =>
    {
        Near.Matrix(MatrixOf(row), row.Quat("q"), 1e-14);
        foreach (var v in new Vec3[] { new(1, 0, 0), new(0, 1, 0), new(0, 0, 1) })
        {
            Assert.Equal(row.Quat("q").Rotate(v), row.Quat("minus-q").Rotate(v));
        }
    });

    private static JsonElement[] Rows(string name, int count)
    {
        JsonElement[] rows = [.. Checks.GetProperty(name).EnumerateArray()];
        Assert.Equal(count, rows.Length);
        return rows;
    }

    private static double[][] MatrixOf(JsonElement row) => [.. row.GetProperty("matrix-rows").EnumerateArray().Select(r => r.Numbers())];
}
