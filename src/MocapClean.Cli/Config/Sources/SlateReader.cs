using System.Collections.Immutable;
using System.Globalization;
using CsvHelper;
using MocapClean.Cli.Config.Yaml;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Config.Sources;

/// <summary>
/// Reads the CSV of slates: <c>take,frame,timecode</c> and, where wanted, <c>action_first,action_last</c>, in any order.
/// Frames are numbered as in all that a person reads, from <c>output.first-frame</c>.
/// </summary>
public sealed class SlateReader
{
    private static readonly ImmutableArray<string> Needed = ["take", "frame", "timecode"];
    private static readonly ImmutableArray<string> Action = ["action_first", "action_last"];

    private readonly ProblemList problems;
    private readonly TimeCodeRate rate;
    private readonly int firstFrame;
    private readonly ILookup<string, string> takes;
    private readonly Dictionary<string, TakeSlate> slates = [];
    private readonly List<string> notes = [];

    private SlateReader(string path, TimeCodeRate rate, int firstFrame, IReadOnlyCollection<string> names)
    {
        problems = new ProblemList(path);
        this.rate = rate;
        this.firstFrame = firstFrame;
        takes = names.SelectMany(n => Aliases(n).Select(alias => (Alias: alias, Name: n))).ToLookup(p => p.Alias, p => p.Name);
    }

    /// <summary>Reads the slates that a config names; a config may do without.</summary>
    /// <param name="config">The config.</param>
    /// <param name="takes">
    /// Names of the session's takes; a slate names one by its whole name, its file name, or either without the ending.
    /// </param>
    /// <exception cref="ConfigException">The file cannot be read, or lines of it make no sense: all of them are told.</exception>
    public static SlateTable Read(SessionConfig config, IReadOnlyCollection<string> takes)
    {
        if (config.SlatesFile is not { } path || config.TimeCode.CountedAt is not { } rate)
        {
            return SlateTable.Empty;
        }

        var reader = new SlateReader(path, rate, config.Output.FirstFrame, takes);
        if (ConfigText.Read(path, reader.problems) is { } text)
        {
            reader.ReadRows(text);
        }

        reader.problems.ThrowIfAny();
        return new(reader.slates.ToImmutableDictionary(), [.. reader.notes]);
    }

    private static IEnumerable<string> Aliases(string name) => new[]
    {
        name, Path.ChangeExtension(name, null), Path.GetFileName(name), Path.GetFileNameWithoutExtension(name),
    }.Distinct();

    private void ReadRows(string text)
    {
        using var csv = CsvReader.FromText(text, new CsvReaderOptions
        {
            TrackLineNumbers = true,
            CommentPrefix = '#',
            TrimWhitespace = true,
            MalformedData = CsvMalformedDataHandling.Throw,
            FieldCountMismatch = CsvFieldCountHandling.Throw,
        });
        try
        {
            if (!HasColumns([.. csv.Headers]))
            {
                return;
            }

            while (csv.Read())
            {
                Take(csv);
            }
        }
        catch (CsvFormatException e)
        {
            problems.Add(new((int)Math.Max(1, e.LineNumber), 1), FirstLine(e.Message));
        }
    }

    private bool HasColumns(ImmutableArray<string> headers)
    {
        var missing = Needed.Where(n => !headers.Contains(n)).ToList();
        if (missing.Count > 0)
        {
            problems.Add(new(1, 1), $"no column {ShapeText.Either(missing)}; slates need {ShapeText.All(Needed)}");
        }

        foreach (var odd in headers.Where(h => !Needed.Contains(h) && !Action.Contains(h) && NearMiss.Of(h, Action) is not null))
        {
            problems.Add(new(1, 1), $"unknown column '{odd}'{NearMiss.Hint(NearMiss.Of(odd, Action))}");
        }

        return missing.Count == 0;
    }

    private void Take(CsvReader csv)
    {
        var at = new TextPlace((int)csv.LineNumber, 1);
        var name = csv.GetString("take");
        var found = takes[name].ToList();
        if (name.Length == 0)
        {
            problems.Add(at, "the take is missing");
        }
        else if (found.Count > 1)
        {
            problems.Add(at, $"'{name}' may be {ShapeText.Either(found)}; give more of the path");
        }
        else if (Frame(csv, "frame", at, isNeeded: true) is { } frame && Address(csv.GetString("timecode"), at) is { } address)
        {
            var slate = new TakeSlate(name, new Slate(frame, address), Frame(csv, "action_first", at), Frame(csv, "action_last", at), at);
            Add(found is [var only] ? only : null, slate);
        }
    }

    private void Add(string? take, TakeSlate slate)
    {
        if (slate.ActionLast < slate.ActionFirst)
        {
            problems.Add(slate.At, $"the action of '{slate.Take}' ends before it starts");
        }
        else if (take is null)
        {
            notes.Add($"{problems.File}:{slate.At.Line}: no take '{slate.Take}'");
        }
        else if (!slates.TryAdd(take, slate with { Take = take }))
        {
            problems.Add(slate.At, $"a second slate for '{take}'; the first is in line {slates[take].At.Line}");
        }
    }

    private int? Frame(CsvReader csv, string column, TextPlace at, bool isNeeded = false)
    {
        var text = csv.TryGetFieldIndex(column, out var index) ? csv.GetString(index) : "";
        if (text.Length == 0 && !isNeeded)
        {
            return null;
        }

        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var frame) && frame >= firstFrame)
        {
            return frame - firstFrame;
        }

        problems.Add(at, $"{column} takes a frame number from {firstFrame}, not '{text}'");
        return null;
    }

    private TimeCode? Address(string text, TextPlace at)
    {
        var address = TimeCode.TryParse(text, rate, out var problem);
        if (address is null)
        {
            problems.Add(at, text.Length == 0 ? "the timecode is missing" : problem);
        }

        return address;
    }

    private static string FirstLine(string text) => text.Split('\n')[0].TrimEnd('\r');
}
