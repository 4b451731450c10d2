using System.Text.Json;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Tests.Orientation;

/// <summary>Reads the check values of Data/Orientation.</summary>
internal static class CheckJson
{
    public static JsonElement Read(string name)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Data", "Orientation", name)));
        return document.RootElement.Clone();
    }

    public static double[] Numbers(this JsonElement element) => [.. element.EnumerateArray().Select(n => n.GetDouble())];

    public static double Number(this JsonElement row, string name) => row.GetProperty(name).GetDouble();

    public static Quat Quat(this JsonElement row, string name) => Quat(row.GetProperty(name));

    public static Quat Quat(JsonElement element) => element.Numbers() is [var w, var x, var y, var z] ? new(w, x, y, z) : throw new JsonException();

    public static Vec3 Vec3(this JsonElement row, string name) => Vec3(row.GetProperty(name));

    public static Vec3 Vec3(JsonElement element) => element.Numbers() is [var x, var y, var z] ? new(x, y, z) : throw new JsonException();

    public static EulerAngles Degrees(this JsonElement row, string name) =>
        row.GetProperty(name).Numbers() is [var a, var b, var c] ? EulerAngles.FromDegrees(a, b, c) : throw new JsonException();
}
