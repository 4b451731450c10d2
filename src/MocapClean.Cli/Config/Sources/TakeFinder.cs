using System.Collections.Immutable;
using MocapClean.Cli.Formats;

namespace MocapClean.Cli.Config.Sources;

/// <summary>Finds the takes that a config asks for.</summary>
public sealed class TakeFinder
{
    // In the line that says that there is no take at all.
    private const int MostNotes = 5;

    private readonly SessionConfig config;
    private readonly ImmutableArray<GlobSearch> searches;
    private readonly ImmutableArray<(PathGlob Whole, PathGlob Below)> except;
    private readonly OutputPlace output;
    private readonly string root;
    private readonly string realRoot;
    private readonly SortedSet<string> notes = new(StringComparer.Ordinal);

    private TakeFinder(SessionConfig config)
    {
        this.config = config;
        searches = [.. config.Source.Takes.Select(t => GlobSearch.From(t, config.Folder))];
        except = [.. config.Source.Except.Select(e => (new PathGlob(config.Absolute(e)), new PathGlob(e)))];
        root = config.Source.Root.Length > 0
            ? Path.TrimEndingDirectorySeparator(config.Absolute(config.Source.Root))
            : Common(searches.Select(s => s.Folder));
        realRoot = RealPath.Of(root);
        output = new OutputPlace(config.OutputFolder);
    }

    /// <summary>Finds them; the same files always give the same list.</summary>
    /// <exception cref="ConfigException">No take, takes that share an output, or an output folder that holds takes.</exception>
    public static TakeList Find(SessionConfig config)
    {
        try
        {
            return new TakeFinder(config).Find();
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new ConfigException($"takes cannot be looked for: {e.Message}");
        }
    }

    private TakeList Find()
    {
        if (output.Holds(realRoot))
        {
            throw Problem("output.folder", $"output folder '{config.Output.Folder}' holds the takes; give it a folder of its own");
        }

        var takes = new SortedDictionary<string, FoundTake>(StringComparer.Ordinal);
        var seen = new HashSet<string>();
        foreach (var (search, path) in searches.SelectMany(Matches).OrderBy(m => m.Path, StringComparer.Ordinal))
        {
            var real = RealPath.Of(path);
            if (Accept(search, path, real) && seen.Add(real))
            {
                var name = Relative(path);
                takes.Add(name, new(name, path));
            }
        }

        if (takes.Count == 0)
        {
            throw NoTake();
        }

        CheckOutputs(takes.Keys);
        return new(root, [.. takes.Values], [.. notes]);
    }

    private ConfigException NoTake()
    {
        var asked = string.Join(", ", config.Source.Takes);
        var more = notes.Count > MostNotes ? $"; and {notes.Count - MostNotes} more" : "";
        return Problem("ingest.takes", string.Join("; ", [$"no take found for {asked}", .. notes.Take(MostNotes)]) + more);
    }

    private List<(GlobSearch Search, string Path)> Matches(GlobSearch search)
    {
        var links = new List<string>();
        var files = search.Files(links).Select(path => (search, path)).ToList();
        foreach (var link in links)
        {
            notes.Add($"{Relative(link)}: a link to a folder is not followed");
        }

        if (files.Count == 0)
        {
            notes.Add($"{search.Text}: matches no file");
        }

        return files;
    }

    /// <summary>The folder between a file and the root that an earlier run wrote into, other than this run's own; null where there is none.</summary>
    private string? EarlierOutput(string folder)
    {
        while (RealPath.IsWithin(folder, root) && !output.Holds(folder))
        {
            if (File.Exists(Path.Combine(folder, "log", "journal.jsonl")) && File.Exists(Path.Combine(folder, "session.json")))
            {
                return folder;
            }

            folder = Path.GetDirectoryName(folder) ?? "";
        }

        return null;
    }

    private bool Accept(GlobSearch search, string path, string real)
    {
        if (IsExcepted(path) || real == Slates())
        {
            return false;
        }

        if (EarlierOutput(Path.GetDirectoryName(path)!) is { } earlier)
        {
            notes.Add($"{Relative(earlier)}: an output folder of another run is not searched");
            return false;
        }

        var isInOutput = output.Holds(path) || output.Holds(real);
        if (FormatCatalog.For(path) is null)
        {
            return search.IsAsked && !isInOutput && Note($"{Relative(path)}: no format reads '{Path.GetExtension(path)}' files");
        }

        if (isInOutput)
        {
            var holds = $"output folder '{config.Output.Folder}' already holds takes ({Relative(path)})";
            return output.IsOwn(path, real) ? false : throw Problem("output.folder", $"{holds}; give it a folder of its own");
        }

        if (!RealPath.IsWithin(path, root))
        {
            throw Problem("ingest.root", $"take '{path}' lies outside ingest.root '{root}'");
        }

        return RealPath.IsWithin(real, realRoot) || Note($"{Relative(path)}: a link that leads out of '{root}' is not followed");
    }

    // Relative to the config's folder as all globs are, or to the root, which is what a user sees in names of takes.
    private bool IsExcepted(string path)
    {
        var whole = path.Replace(Path.DirectorySeparatorChar, '/').TrimStart('/');
        var below = Relative(path);
        return except.Any(e => e.Whole.Matches(whole) || e.Below.Matches(below));
    }

    private bool Note(string line)
    {
        notes.Add(line);
        return false;
    }

    private string? Slates() => config.SlatesFile is { } slates ? RealPath.Of(slates) : null;

    private void CheckOutputs(IEnumerable<string> names)
    {
        var clashes = names.GroupBy(n => n, StringComparer.OrdinalIgnoreCase).Where(g => g.Count() > 1);
        var list = string.Join("; ", clashes.Select(g => string.Join(" and ", g)));
        if (list.Length > 0)
        {
            throw Problem("ingest.takes", $"takes that would write one file where upper and lower case are the same: {list}");
        }
    }

    private string Relative(string path) => Path.GetRelativePath(root, path).Replace(Path.DirectorySeparatorChar, '/');

    private ConfigException Problem(string key, string message) =>
        new([new(config.File, config.Given.TryGetValue(key, out var given) ? given.At : TextPlace.Whole, message)]);

    private static string Common(IEnumerable<string> folders) => folders.Aggregate((a, b) =>
    {
        while (!RealPath.IsWithin(b, a))
        {
            a = Path.GetDirectoryName(a) ?? throw new ConfigException("takes on different drives need ingest.root");
        }

        return a;
    });
}
