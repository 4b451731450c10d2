namespace MocapClean.Cli.Tests.Config;

/// <summary>A folder of a test's own that goes with it.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    /// <summary>The folder, absolute.</summary>
    public string Path { get; } = Directory.CreateTempSubdirectory("mocapclean-").FullName;

    /// <summary>Writes a file, with the folders it needs, and returns its path.</summary>
    public string Write(string name, string text = "x")
    {
        var path = System.IO.Path.Combine(Path, name);
        Directory.CreateDirectory(System.IO.Path.GetDirectoryName(path)!);
        File.WriteAllText(path, text);
        return path;
    }

    public void Dispose() => Directory.Delete(Path, recursive: true);
}
