using System.IO.Enumeration;

namespace MocapClean.Cli.Config.Sources;

/// <summary>A glob of the config with its fixed part: the folder that all it can match lies in.</summary>
internal sealed class GlobSearch
{
    private GlobSearch(string text, string folder, string rest, bool isAsked)
    {
        Text = text;
        Folder = folder;
        Rest = rest;
        IsAsked = isAsked;
        glob = new PathGlob(rest);
    }

    private readonly PathGlob glob;

    /// <summary>As the user wrote it.</summary>
    public string Text { get; }

    /// <summary>The fixed part, absolute.</summary>
    public string Folder { get; }

    /// <summary>What follows, relative to it.</summary>
    public string Rest { get; }

    /// <summary>It asks for these very files, so that one of another format is worth a word; a folder only asks for its takes.</summary>
    public bool IsAsked { get; }

    /// <summary>A path that exists stands for itself, a folder for all below it, anything else is a glob.</summary>
    public static GlobSearch From(string text, string baseFolder)
    {
        var full = Path.GetFullPath(text, baseFolder);
        if (Directory.Exists(full))
        {
            return new(text, Path.TrimEndingDirectorySeparator(full), "**", isAsked: false);
        }

        if (File.Exists(full))
        {
            return new(text, Path.GetDirectoryName(full)!, Path.GetFileName(full), isAsked: true);
        }

        var folder = Path.GetPathRoot(full)!;
        var rest = full[folder.Length..].Split(Path.DirectorySeparatorChar, Path.AltDirectorySeparatorChar);
        var fix = rest.SkipLast(1).TakeWhile(part => !PathGlob.IsWild(part)).Count();
        return new(text, Path.Combine([folder, .. rest[..fix]]), string.Join('/', rest[fix..]), isAsked: true);
    }

    /// <summary>The files that meet the pattern, absolute; links to folders are not entered but named.</summary>
    /// <param name="linkedFolders">Receives the links to folders met, absolute.</param>
    public IEnumerable<string> Files(ICollection<string> linkedFolders)
    {
        if (!Directory.Exists(Folder))
        {
            return [];
        }

        var exact = Path.Combine(Folder, Rest);
        if (File.Exists(exact))
        {
            return [exact];
        }

        var search = new FileSystemEnumerable<string>(
            Folder,
            (ref FileSystemEntry entry) => entry.ToFullPath(),
            new EnumerationOptions
            {
                RecurseSubdirectories = Rest.Contains('/') || Rest.Contains("**"),
                AttributesToSkip = FileAttributes.None,
                IgnoreInaccessible = false,
            })
        {
            ShouldIncludePredicate = (ref FileSystemEntry entry) => !entry.IsDirectory,
            ShouldRecursePredicate = (ref FileSystemEntry entry) => !IsLink(ref entry, linkedFolders),
        };
        return search.Where(file => glob.Matches(Path.GetRelativePath(Folder, file).Replace(Path.DirectorySeparatorChar, '/')));
    }

    private static bool IsLink(ref FileSystemEntry entry, ICollection<string> linkedFolders)
    {
        if (!entry.Attributes.HasFlag(FileAttributes.ReparsePoint))
        {
            return false;
        }

        linkedFolders.Add(entry.ToFullPath());
        return true;
    }
}
