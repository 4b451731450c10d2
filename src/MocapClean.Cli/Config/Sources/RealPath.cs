namespace MocapClean.Cli.Config.Sources;

/// <summary>Paths as the file system has them once every link is followed.</summary>
internal static class RealPath
{
    /// <summary>The path with all links in it followed; parts that do not exist stay as they are.</summary>
    /// <exception cref="IOException">Links run in a circle.</exception>
    public static string Of(string path)
    {
        var full = Path.GetFullPath(path);
        var real = Path.GetPathRoot(full)!;
        foreach (var part in full[real.Length..].Split(Path.DirectorySeparatorChar, StringSplitOptions.RemoveEmptyEntries))
        {
            real = Path.Combine(real, part);
            FileSystemInfo here = Directory.Exists(real) ? new DirectoryInfo(real) : new FileInfo(real);
            if (here.LinkTarget is not null && here.ResolveLinkTarget(returnFinalTarget: true) is { } target)
            {
                // What a link leads to may itself lie behind links to folders.
                real = Of(target.FullName);
            }
        }

        return real;
    }

    /// <summary>Whether a path is a folder or lies in it; both real and absolute.</summary>
    public static bool IsWithin(string path, string folder)
    {
        var start = Path.EndsInDirectorySeparator(folder) ? folder : folder + Path.DirectorySeparatorChar;
        return path == folder || path.StartsWith(start, StringComparison.Ordinal);
    }
}
