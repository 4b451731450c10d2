namespace MocapClean.Cli.Tests.Support;

/// <summary>A folder of its own for a test, gone afterwards.</summary>
internal sealed class TempFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("mocapclean-test-").FullName;

    public string this[string relative] => System.IO.Path.Combine(Path, relative);

    /// <summary>Writes a text file and returns its path.</summary>
    public string Put(string relative, string text = "x") => Put(relative, System.Text.Encoding.UTF8.GetBytes(text));

    /// <summary>Writes a file and returns its path.</summary>
    public string Put(string relative, byte[] bytes)
    {
        var path = this[relative];
        Directory.CreateDirectory(System.IO.Path.GetDirectoryName(path)!);
        File.WriteAllBytes(path, bytes);
        return path;
    }

    /// <summary>Relative path and content of every file below a folder, but for those in <c>log</c>.</summary>
    public SortedDictionary<string, byte[]> Content(string folder)
    {
        var root = this[folder];
        var files = Directory.EnumerateFiles(root, "*", SearchOption.AllDirectories)
            .Select(f => (Name: System.IO.Path.GetRelativePath(root, f), File: f)).Where(f => !f.Name.StartsWith("log", StringComparison.Ordinal));
        return new(files.ToDictionary(f => f.Name, f => File.ReadAllBytes(f.File), StringComparer.Ordinal), StringComparer.Ordinal);
    }

    public void Dispose() => Directory.Delete(Path, recursive: true);
}
