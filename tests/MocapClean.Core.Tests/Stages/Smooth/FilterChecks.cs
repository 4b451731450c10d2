using System.Globalization;
using System.Text.Json;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Reads Data/Smooth.</summary>
internal static class FilterChecks
{
    public static JsonElement Read(string name)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(At(name)));
        return document.RootElement.Clone();
    }

    public static double[] Numbers(this JsonElement row, string name) => [.. row.GetProperty(name).EnumerateArray().Select(n => n.GetDouble())];

    public static double Number(this JsonElement row, string name) => row.GetProperty(name).GetDouble();

    public static int Whole(this JsonElement row, string name) => row.GetProperty(name).GetInt32();

    /// <summary>One of the tracks of real motion: 0 rests now and then, 1 hardly does.</summary>
    public static Quat[] TurnedByHand(int track) =>
        [.. File.ReadLines(At("turned-by-hand.csv")).Skip(1)
            .Select(line => line.Split(',').Skip(4 * track).Take(4).Select(c => double.Parse(c, CultureInfo.InvariantCulture)).ToArray())
            .Select(c => new Quat(c[0], c[1], c[2], c[3]).Normalised())];

    /// <summary>A series of numbers as a curve for a smoother: the series is w; x is large and still, so that no sign is in doubt.</summary>
    public static JointCurve Curve(double[] series, double rate = 120)
    {
        var take = Some.Take(rate, Some.Track("series", [.. series.Select(v => new Quat(v, 1000, 0, 0))]));
        return new JointCurve(take.Tracks[0], take.Clock, [new Segment(0, series.Length - 1)], 0);
    }

    public static double[] Series(this SmoothedCurve curve) => [.. curve.Samples.Select(q => q.W)];

    private static string At(string name) => Path.Combine(AppContext.BaseDirectory, "Data", "Smooth", name);
}
