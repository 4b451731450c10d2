using System.Security.Cryptography;
using MocapClean.Cli.Formats;

namespace MocapClean.Cli.Batch;

/// <summary>Reads a source into memory once, whole, and never opens it for writing.</summary>
internal static class SourceFile
{
    /// <summary>The bytes of a take with their SHA-256.</summary>
    /// <exception cref="InputFormatException">It cannot be read, is too large, or changed while it was read.</exception>
    public static (TakeSource Source, string Sha256) Read(PlannedTake take, long largest)
    {
        try
        {
            using var file = new FileStream(take.FullPath, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, bufferSize: 0);
            var length = file.Length;
            if (length > Math.Min(largest, Array.MaxLength))
            {
                throw new InputFormatException(take.Name, "", $"{length} bytes", $"at most {Math.Min(largest, Array.MaxLength)} bytes");
            }

            var bytes = new byte[length];
            file.ReadExactly(bytes);
            if (file.Length != length)
            {
                throw new InputFormatException(take.Name, "", "a file that grows while it is read", "a file that is complete");
            }

            return (new TakeSource(take.Name, bytes), Convert.ToHexStringLower(SHA256.HashData(bytes)));
        }
        catch (EndOfStreamException)
        {
            throw new InputFormatException(take.Name, "", "a file that shrinks while it is read", "a file that is complete");
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new InputFormatException(take.Name, "", Reason(e, take), "a readable file");
        }
    }

    private static string Reason(Exception e, PlannedTake take) => e switch
    {
        FileNotFoundException or DirectoryNotFoundException => "nothing at its place any more",
        UnauthorizedAccessException => "no permission to read it",
        _ => e.Message.Replace(take.FullPath, take.Name, StringComparison.Ordinal),
    };
}
