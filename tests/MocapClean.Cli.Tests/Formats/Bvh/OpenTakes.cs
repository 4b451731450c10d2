using System.Text.Json;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Bvh;

/// <summary>
/// Two captured takes that come with the Debian package assimp-testmodels, and what is known of them (Data/bvh.json). They are not part of
/// this project; where the package is not installed, the tests that need it are skipped.
/// </summary>
internal static class OpenTakes
{
    private const string Folder = "/usr/share/assimp/models/BVH";

    public static byte[] Bytes(string name)
    {
        var path = Path.Combine(Folder, name);
        Assert.SkipUnless(File.Exists(path), $"{path} is not there: install the Debian package assimp-testmodels");
        return File.ReadAllBytes(path);
    }

    public static JsonElement Known(string name)
    {
        var json = JsonElement.Parse(File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "Data", "bvh.json")));
        return json.GetProperty("files").EnumerateArray().Single(f => f.GetProperty("file").GetString() == name);
    }

    public static double[] Doubles(this JsonElement array) => [.. array.EnumerateArray().Select(v => v.GetDouble())];
}
