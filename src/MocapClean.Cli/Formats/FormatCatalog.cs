using System.Collections.Immutable;

namespace MocapClean.Cli.Formats;

/// <summary>All formats. A new one is one folder and one line here.</summary>
public static class FormatCatalog
{
    /// <summary>In the order in which they are tried.</summary>
    public static ImmutableArray<ITakeFormat> All { get; } =
    [
        new Csv.CsvFormat(),
        new Bvh.BvhFormat(),
    ];

    /// <summary>The endings that are read, for messages.</summary>
    public static string Endings => string.Join(", ", All.SelectMany(f => f.Extensions));

    /// <summary>The format of a file by its ending, or null.</summary>
    public static ITakeFormat? For(string path) =>
        All.FirstOrDefault(f => f.Extensions.Any(e => path.EndsWith(e, StringComparison.OrdinalIgnoreCase)));
}
