using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// What an unknown table seems to hold, from how its columns are named and what stands in them: four columns whose names differ in one
/// letter (w, x, y, z and the like) and whose numbers have length 1 are the orientation of a joint.
/// </summary>
public sealed record CsvGuess
{
    /// <summary><c>wide</c> or <c>long</c>.</summary>
    public required string Layout { get; init; }

    /// <summary>For <c>ingest.csv.joint-columns</c>.</summary>
    public required string JointColumns { get; init; }

    /// <summary>For <c>ingest.csv.components</c>, in the order w, x, y, z.</summary>
    public required ImmutableArray<string> Components { get; init; }

    /// <summary>For <c>ingest.csv.time</c>; null where no column counts seconds, so that <c>ingest.rate</c> is needed.</summary>
    public required string? Time { get; init; }

    /// <summary>Names of a wide table's joints.</summary>
    public required ImmutableArray<string> Joints { get; init; }

    /// <summary>Between fields.</summary>
    public required char Separator { get; init; }

    /// <summary>Number of the line with the names of the columns, from 1.</summary>
    public required int HeaderLine { get; init; }

    /// <summary>Numbers are written with a comma.</summary>
    public required bool DecimalComma { get; init; }

    /// <summary>What a person should check, in whole sentences.</summary>
    public ImmutableArray<string> Notes { get; init; } = [];

    /// <summary>The take cannot be read without <c>ingest.rate</c>.</summary>
    public bool NeedsRate => Time is null;

    /// <summary>The settings in one line, as they stand in a config.</summary>
    public string Settings =>
        $"layout: {Layout}, {(Layout == "wide" ? $"joint-columns: \"{JointColumns}\", " : "")}components: [{string.Join(", ", Components)}]"
        + (Time is null or "time" ? "" : $", time: \"{Time}\"");

    /// <summary>Looks at a file. Null where nothing in it looks like orientations.</summary>
    /// <exception cref="InputFormatException">The file is empty or is no UTF-8 text.</exception>
    public static CsvGuess? From(TakeSource source) => From(source, CsvText.Start(source));

    /// <summary>The settings with this guess in place of theirs.</summary>
    public ReadSettings ApplyTo(ReadSettings settings) => settings with
    {
        CsvLayout = Layout,
        CsvJointColumns = JointColumns,
        CsvComponents = Components,
        CsvTime = Time ?? settings.CsvTime,
    };

    internal static CsvGuess? From(TakeSource source, int start)
    {
        var header = CsvHeader.Search(source.Bytes, start, names => NamingGuess.All(names).Any() ? names.Length : 0);
        foreach (var naming in header is null ? [] : NamingGuess.All(header.Names))
        {
            var columns = new CsvColumns(naming.Joints, naming.Slots, TimeColumn.Likeliest(header!));
            if (FirstRows.Read(source, header!, columns) is { HasOrientations: true } rows)
            {
                return Build(source, header!, naming, rows);
            }
        }

        return null;
    }

    private static CsvGuess Build(TakeSource source, CsvHeader header, NamingGuess naming, FirstRows rows)
    {
        var notes = ImmutableArray.CreateBuilder<string>();
        if (naming.IsNumbered)
        {
            notes.Add("The components are numbered; the first is taken for w. Where it is x, list the names in the order w, x, y, z.");
        }

        var isLong = LooksLong(header, naming, notes);
        var time = TimeColumn.Find(header, rows, isLong, notes);
        return new CsvGuess
        {
            Layout = isLong ? "long" : "wide",
            JointColumns = naming.Pattern,
            Components = naming.Components,
            Time = time,
            Joints = isLong ? [] : naming.Joints,
            Separator = header.Separator,
            HeaderLine = CsvText.LineAt(source.Bytes, header.Start),
            DecimalComma = rows.DecimalComma,
            Notes = notes.ToImmutable(),
        };
    }

    /// <summary>Columns without a joint's name: each row names its joint.</summary>
    private static bool LooksLong(CsvHeader header, NamingGuess naming, ImmutableArray<string>.Builder notes)
    {
        if (naming.Pattern.Contains(ColumnPattern.JointMark, StringComparison.Ordinal))
        {
            return false;
        }

        string[] likely = ["joint", "bone", "segment", "body", "sensor", "name"];
        var column = likely.FirstOrDefault(n => header.Names.Contains(n, StringComparer.OrdinalIgnoreCase));
        if (column is not (null or "joint"))
        {
            notes.Add($"Column '{column}' seems to name the joint of each row; it is read when its header is 'joint'.");
        }

        return column is not null;
    }
}
