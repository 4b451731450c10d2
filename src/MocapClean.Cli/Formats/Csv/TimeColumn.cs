using System.Collections.Immutable;
using System.Text.RegularExpressions;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Finds the column that counts seconds in an unknown table.</summary>
internal static partial class TimeColumn
{
    /// <summary>Words in a time column's name, the surest first.</summary>
    private static readonly ImmutableArray<string> Words = ["time", "timestamp", "seconds", "sec", "elapsed", "t"];

    /// <summary>Motion is recorded faster than this, and slower than a hundred thousand frames a second.</summary>
    private const double LongestInterval = 1;

    private const double ShortestInterval = 1e-5;

    /// <summary>The column's name sounds like a time.</summary>
    public static bool IsLikely(string name) => Rank(name) < Words.Length;

    /// <summary>Index of the column that sounds most like a time; -1 where none does.</summary>
    public static int Likeliest(CsvHeader header) => Likely(header).FirstOrDefault(-1);

    /// <summary>Name of the column that counts seconds; null where there is none.</summary>
    /// <param name="header">Names of the columns.</param>
    /// <param name="rows">What stands in them.</param>
    /// <param name="isLong">Many rows may have the same time.</param>
    /// <param name="notes">Receives what was found about times and frames.</param>
    public static string? Find(CsvHeader header, FirstRows rows, bool isLong, ImmutableArray<string>.Builder notes)
    {
        foreach (var column in Likely(header))
        {
            if (Objection(rows.Numbers(column), isLong) is not { } objection)
            {
                return header.Names[column];
            }

            notes.Add($"Column '{header.Names[column]}' {objection}.");
        }

        var frame = header.Names.FirstOrDefault(n => Tokens(n).Any(t => t is "frame" or "sample" or "index"));
        notes.Add(frame is null
            ? "No column counts seconds: set ingest.rate."
            : $"No column counts seconds, but '{frame}' counts frames: set ingest.rate.");
        return null;
    }

    private static string? Objection(double[]? times, bool isLong)
    {
        if (times is null)
        {
            return "holds no plain numbers of seconds";
        }

        double[] steps = [.. times.Zip(times.Skip(1), (a, b) => b - a).Where(s => !isLong || s != 0).Order()];
        return steps switch
        {
            [] => "does not change in the first rows",
            _ when steps[steps.Length / 2] is <= ShortestInterval => "does not rise like seconds",
            _ when steps[steps.Length / 2] is >= LongestInterval => $"steps by {steps[steps.Length / 2]:R}, so it hardly counts seconds",
            _ => null,
        };
    }

    private static IEnumerable<int> Likely(CsvHeader header) => Enumerable.Range(0, header.Names.Length)
        .Where(i => IsLikely(header.Names[i])).OrderBy(i => Rank(header.Names[i]));

    private static int Rank(string name)
    {
        var tokens = Tokens(name);
        var word = Words.IndexOf(tokens.FirstOrDefault(Words.Contains) ?? "");
        return word < 0 ? int.MaxValue : word;
    }

    private static ImmutableArray<string> Tokens(string name) => [.. Token().Matches(name).Select(m => m.Value.ToLowerInvariant())];

    [GeneratedRegex("[A-Z]?[a-z]+|[A-Z]+(?![a-z])", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 1000)]
    private static partial Regex Token();
}
