using System.Collections.Immutable;
using CsvHelper;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>The line that names the columns, and how the table is written.</summary>
/// <param name="Names">Names of the columns without padding.</param>
/// <param name="Separator">Between fields.</param>
/// <param name="Start">Offset of the header line in the file.</param>
/// <param name="End">Offset behind its last byte; the line break and the rows follow.</param>
internal sealed record CsvHeader(ImmutableArray<string> Names, char Separator, int Start, int End)
{
    /// <summary>Lines looked at before a file counts as one without a header.</summary>
    private const int LinesSearched = 100;

    /// <summary>
    /// Ways of looking, strict ones first: quoted names may hold line breaks; then not, since text before the header may leave a quote
    /// open, and the header itself may stand behind a comment mark; last, spaces between the fields.
    /// </summary>
    private static readonly ImmutableArray<(string Separators, bool BreaksInQuotes, char? Comment)> Attempts =
    [
        (",;\t|", true, '#'),
        (",;\t|", false, null),
        (" ", false, null),
    ];

    /// <summary>The first line that scores above zero, read with the separator that scores highest.</summary>
    /// <param name="bytes">The file.</param>
    /// <param name="start">Where its text starts.</param>
    /// <param name="score">How well names fit; 0 where they do not.</param>
    public static CsvHeader? Search(byte[] bytes, int start, Func<ImmutableArray<string>, int> score)
    {
        foreach (var (separators, breaks, comment) in Attempts)
        {
            var options = new CsvReaderOptions { HasHeader = false, CommentPrefix = comment, AllowLineBreaksInQuotes = breaks };
            var (best, bestScore) = ((CsvHeader?)null, 0);
            foreach (var separator in separators)
            {
                var found = FirstFit(bytes, start, options with { Separator = separator }, score, best?.Start ?? bytes.Length);
                var points = found is null ? 0 : score(found.Names);
                (best, bestScore) = points > bestScore ? (found, points) : (best, bestScore);
            }

            if (best is not null)
            {
                return best;
            }
        }

        return null;
    }

    /// <summary>Index of the column with a name, exactly or else ignoring case; -1 where there is none.</summary>
    /// <exception cref="InputFormatException">Two columns have the name.</exception>
    public int Find(TakeSource source, string name)
    {
        foreach (var comparison in (ReadOnlySpan<StringComparison>)[StringComparison.Ordinal, StringComparison.OrdinalIgnoreCase])
        {
            var hits = Enumerable.Range(0, Names.Length).Where(i => name.Length > 0 && Names[i].Equals(name, comparison)).Take(2).ToList();
            if (hits.Count > 0)
            {
                return hits.Count == 1 ? hits[0] : throw Twice(source, hits[0], hits[1]);
            }
        }

        return -1;
    }

    /// <summary>Where the header stands, for messages.</summary>
    public string Place(TakeSource source) => $"header (line {CsvText.LineAt(source.Bytes, Start)})";

    /// <summary>The complaint that two columns mean the same.</summary>
    public InputFormatException Twice(TakeSource source, int first, int second) => new(
        source.Name,
        Place(source),
        $"columns {first + 1} and {second + 1} both named '{CsvText.Shown(Names[second])}'",
        "that name once");

    private static CsvHeader? FirstFit(
        byte[] bytes, int start, CsvReaderOptions options, Func<ImmutableArray<string>, int> score, int lastStart)
    {
        using var reader = CsvReader.Create(bytes.AsMemory(start), options);
        for (var line = 0; line < LinesSearched && reader.Read(); line++)
        {
            var offset = start + (int)reader.ByteOffset;
            if (offset > lastStart)
            {
                return null;
            }

            var names = NamesOf(reader);
            if (score(names) > 0)
            {
                return new CsvHeader(names, options.Separator!.Value, offset, offset + reader.RawRecord.Length);
            }
        }

        return null;
    }

    private static ImmutableArray<string> NamesOf(CsvReader reader)
    {
        var names = ImmutableArray.CreateBuilder<string>(reader.FieldCount);
        for (var i = 0; i < reader.FieldCount; i++)
        {
            var name = reader.GetString(i).Trim();
            names.Add(i == 0 ? name.TrimStart('#').TrimStart() : name);
        }

        return names.MoveToImmutable();
    }
}
