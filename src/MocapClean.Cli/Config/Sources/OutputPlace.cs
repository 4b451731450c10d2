namespace MocapClean.Cli.Config.Sources;

/// <summary>The output folder, as far as the search for takes must know it: what lies in it is never a take.</summary>
/// <param name="folder">The folder, absolute; it may not exist yet.</param>
internal sealed class OutputPlace(string folder)
{
    // The parts that a run writes files with a take's ending into; the log folder tells that a run was here.
    private static readonly string[] Written = ["takes", "keys", "reports", "log"];

    private readonly string folder = Path.TrimEndingDirectorySeparator(folder);
    private readonly string real = RealPath.Of(Path.TrimEndingDirectorySeparator(folder));

    /// <summary>Whether a path is the folder or lies in it, by its name or once links are followed.</summary>
    public bool Holds(string path) => RealPath.IsWithin(path, real) || RealPath.IsWithin(path, folder);

    /// <summary>Whether a file in the folder was written by an earlier run, and not delivered there.</summary>
    /// <param name="path">The file, absolute.</param>
    /// <param name="realPath">The file with links followed.</param>
    public bool IsOwn(string path, string realPath) =>
        Directory.Exists(Path.Combine(folder, "log")) && (IsWritten(path) || IsWritten(realPath));

    private bool IsWritten(string path)
    {
        var start = RealPath.IsWithin(path, real) ? real : folder;
        var parts = Path.GetRelativePath(start, path).Split(Path.DirectorySeparatorChar);
        return parts.Length == 1 ? parts[0] == "reshoot.csv" : Written.Contains(parts[0]);
    }
}
