namespace MocapClean.Cli.Batch;

/// <summary>
/// Keeps a second run out of an output folder. The operating system lets go of it when the process ends, however it ends, so a crash
/// leaves no lock behind.
/// </summary>
public sealed class FolderLock : IDisposable
{
    private readonly FileStream file;

    private FolderLock(FileStream file) => this.file = file;

    /// <summary>Takes the lock, or returns null where another run holds it.</summary>
    /// <exception cref="UnauthorizedAccessException">The folder may not be written.</exception>
    public static FolderLock? TryTake(string path)
    {
        try
        {
            return new FolderLock(new FileStream(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None));
        }
        catch (IOException)
        {
            return null;
        }
    }

    /// <inheritdoc/>
    public void Dispose() => file.Dispose();
}
