using MocapClean.Cli.Config.Sources;

namespace MocapClean.Cli.Batch;

/// <summary>
/// An output folder. A file is written to a temporary name beside its place, flushed to the disk, then renamed: a reader sees the old file,
/// the new one or none, never a part.
/// </summary>
public sealed class FolderOutput : IOutput
{
    /// <summary>Ending of files that are not whole yet; leftovers of a run that was killed are removed by the next.</summary>
    public const string Unfinished = ".unfinished";

    private readonly string root;
    private readonly string realRoot;

    /// <summary>An output folder; made if it is not there.</summary>
    /// <exception cref="IOException">The folder cannot be made.</exception>
    public FolderOutput(string root)
    {
        this.root = Path.TrimEndingDirectorySeparator(Path.GetFullPath(root));
        Directory.CreateDirectory(this.root);
        realRoot = RealPath.Of(this.root);
    }

    /// <summary>The folder.</summary>
    public string Root => root;

    /// <summary>The full path of an output, refused where it would leave the folder.</summary>
    /// <exception cref="IOException">The path leads out of the folder.</exception>
    public string Place(string path)
    {
        var full = Path.GetFullPath(Path.Combine(root, path));
        // A link inside the folder may lead to the delivered takes, so the real place counts.
        return full != root && RealPath.IsWithin(full, root) && RealPath.IsWithin(RealPath.Of(Path.GetDirectoryName(full)!), realRoot)
            ? full
            : throw new IOException($"{path}: this output would lie outside the output folder");
    }

    /// <inheritdoc/>
    public string Write(string path, Action<Stream> write)
    {
        var place = Place(path);
        Directory.CreateDirectory(Path.GetDirectoryName(place)!);
        var temporary = place + Unfinished;
        File.Delete(temporary);
        try
        {
            string hash;
            using (var file = new FileStream(temporary, FileMode.CreateNew, FileAccess.Write, FileShare.None, 1 << 16))
            using (var hashed = new HashedStream(file))
            {
                write(hashed);
                file.Flush(flushToDisk: true);
                hash = hashed.Sha256();
            }

            File.Move(temporary, place, overwrite: true);
            return hash;
        }
        catch
        {
            File.Delete(temporary);
            throw;
        }
    }
}
