namespace MocapClean.Cli.Batch;

/// <summary>Writes nothing: what a dry run uses. Everything before it runs as usual.</summary>
public sealed class DryOutput : IOutput
{
    /// <inheritdoc/>
    public string Write(string path, Action<Stream> write)
    {
        using var hashed = new HashedStream(Stream.Null);
        write(hashed);
        return hashed.Sha256();
    }
}
