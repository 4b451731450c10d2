using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Finds the header that the settings ask for and gives its columns their meaning.</summary>
internal sealed class CsvLayout
{
    private readonly TakeSource source;
    private readonly ReadSettings settings;

    private CsvLayout(TakeSource source, ReadSettings settings)
    {
        this.source = source;
        this.settings = settings;
    }

    private bool MayBeLong => settings.CsvLayout != "wide";

    private bool MayBeWide => settings.CsvLayout != "long";

    /// <summary>The header and what its columns mean.</summary>
    /// <exception cref="InputFormatException">No line fits, or one that fits is at odds with itself.</exception>
    public static (CsvHeader Header, CsvColumns Columns) Find(TakeSource source, int start, ReadSettings settings)
    {
        var layout = new CsvLayout(source, settings);
        foreach (var comparison in (ReadOnlySpan<StringComparison>)[StringComparison.Ordinal, StringComparison.OrdinalIgnoreCase])
        {
            var pattern = new ColumnPattern(settings.CsvJointColumns, settings.CsvComponents, comparison);
            if (CsvHeader.Search(source.Bytes, start, names => layout.Score(names, pattern)) is { } header)
            {
                return (header, layout.IsLong(header.Names) ? layout.Long(header) : layout.Wide(header, pattern));
            }
        }

        throw CsvAdvice.NoHeader(source, start, settings);
    }

    private int Score(ImmutableArray<string> names, ColumnPattern pattern) =>
        IsLong(names) ? 4 : MayBeWide && names.Length >= 4 ? names.Count(n => pattern.TryMatch(n, out _, out _)) : 0;

    private bool IsLong(ImmutableArray<string> names) =>
        MayBeLong && Has(names, "joint") && (Has(names, "frame") || Has(names, settings.CsvTime))
        && settings.CsvComponents.All(c => Has(names, c));

    private static bool Has(ImmutableArray<string> names, string name) => names.Contains(name, StringComparer.OrdinalIgnoreCase);

    private CsvColumns Long(CsvHeader header) => new(
        [],
        [.. settings.CsvComponents.Select(c => header.Find(source, c))],
        header.Find(source, settings.CsvTime),
        header.Find(source, "joint"),
        header.Find(source, "frame"));

    private CsvColumns Wide(CsvHeader header, ColumnPattern pattern)
    {
        var joints = ImmutableArray.CreateBuilder<string>();
        var slots = new List<int>();
        var places = new Dictionary<string, int>(StringComparer.Ordinal);
        for (var column = 0; column < header.Names.Length; column++)
        {
            if (!pattern.TryMatch(header.Names[column], out var joint, out var component))
            {
                continue;
            }

            if (places.TryAdd(joint, joints.Count))
            {
                joints.Add(joint);
                slots.AddRange([-1, -1, -1, -1]);
            }

            var slot = (4 * places[joint]) + component;
            slots[slot] = slots[slot] < 0 ? column : throw header.Twice(source, slots[slot], column);
        }

        var missing = slots.IndexOf(-1);
        return missing < 0
            ? new CsvColumns(Named(joints), [.. slots], header.Find(source, settings.CsvTime))
            : throw Incomplete(header, pattern, joints[missing / 4], missing % 4);
    }

    /// <summary>A joint without a name takes the file's.</summary>
    private ImmutableArray<string> Named(ImmutableArray<string>.Builder joints) =>
        [.. joints.Select(j => j.Length > 0 ? j : Path.GetFileNameWithoutExtension(source.Name))];

    private InputFormatException Incomplete(CsvHeader header, ColumnPattern pattern, string joint, int component) => new(
        source.Name,
        header.Place(source),
        $"no column '{CsvText.Shown(pattern.ColumnOf(joint, component))}'",
        $"all four components of joint '{CsvText.Shown(joint)}' ({string.Join(", ", settings.CsvComponents)})");
}
