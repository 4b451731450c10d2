using System.Collections.Immutable;
using System.Text.Json;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Reduce;

namespace MocapClean.Core.Tests.Stages.Reduce;

/// <summary>A case of the fixtures in Data/Reduce: fewest keys found outside this project by trying all subsets or all pairs.</summary>
internal sealed record KeyCheck(
    Playback Playback,
    double Tolerance,
    double Widest,
    ImmutableArray<int> Pinned,
    int Fewest,
    int? Greedy,
    ImmutableArray<int>? OnlySet,
    double? ItsError);

internal sealed record CheckedTrack(string Name, Quat[] Samples, double[] Times, ImmutableArray<KeyCheck> Cases);

internal static class KeyChecks
{
    public static IEnumerable<CheckedTrack> All => new[] { "keys-small", "keys-long-1", "keys-long-2", "keys-long-3" }.SelectMany(Read);

    private static List<CheckedTrack> Read(string file)
    {
        using var json = JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "Data", "Reduce", file + ".json")));
        return [.. json.RootElement.GetProperty("tracks").EnumerateArray().Select(Track)];
    }

    private static CheckedTrack Track(JsonElement e) => new(
        e.GetProperty("track").GetString()!,
        Continuous([.. e.GetProperty("quaternions").EnumerateArray().Select(Sample)]),
        [.. e.GetProperty("times").EnumerateArray().Select(t => t.GetDouble())],
        [.. e.GetProperty("cases").EnumerateArray().Select(Case)]);

    private static Quat Sample(JsonElement q) => new(q[0].GetDouble(), q[1].GetDouble(), q[2].GetDouble(), q[3].GetDouble());

    private static KeyCheck Case(JsonElement e)
    {
        var unique = e.TryGetProperty("one-optimal-set", out var set) && e.GetProperty("optimal-sets").GetInt32() == 1;
        return new(
            e.GetProperty("playback").GetString() == "slerp" ? Playback.Slerp : Playback.ComponentLinear,
            Angle.FromDegrees(e.GetProperty("tolerance-deg").GetDouble()),
            e.GetProperty("widest-deg").ValueKind == JsonValueKind.Null ? Math.PI : Angle.FromDegrees(e.GetProperty("widest-deg").GetDouble()),
            e.TryGetProperty("pinned", out var pinned) ? [.. pinned.EnumerateArray().Select(p => p.GetInt32())] : [],
            e.GetProperty("fewest-keys").GetInt32(),
            e.TryGetProperty("keys-by-always-taking-the-longest-good-span", out var greedy) ? greedy.GetInt32() : null,
            unique ? [.. set.EnumerateArray().Select(n => n.GetInt32())] : null,
            unique ? Angle.FromDegrees(e.GetProperty("its-largest-error-deg").GetDouble()) : null);
    }

    private static Quat[] Continuous(Quat[] samples)
    {
        for (var n = 1; n < samples.Length; n++)
        {
            samples[n] = Quat.Dot(samples[n - 1], samples[n]) < 0 ? -samples[n] : samples[n];
        }

        return samples;
    }
}
