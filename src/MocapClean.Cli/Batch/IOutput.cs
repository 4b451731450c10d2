namespace MocapClean.Cli.Batch;

/// <summary>Where outputs go. Two real ones: a folder, and nowhere for a dry run.</summary>
public interface IOutput
{
    /// <summary>Writes a file whole or not at all.</summary>
    /// <param name="path">Relative to the output folder, forward slashes.</param>
    /// <param name="write">Fills the file.</param>
    /// <returns>SHA-256 of what was written, lower-case hexadecimal.</returns>
    /// <exception cref="IOException">It could not be written.</exception>
    /// <exception cref="UnauthorizedAccessException">It may not be written.</exception>
    string Write(string path, Action<Stream> write);
}
