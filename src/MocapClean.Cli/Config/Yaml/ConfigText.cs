using System.Text;

namespace MocapClean.Cli.Config.Yaml;

/// <summary>Reads the text of a small file that a person wrote.</summary>
internal static class ConfigText
{
    private const int LargestBytes = 1_000_000;

    /// <summary>The text, or null with the reason in the list.</summary>
    /// <param name="path">The file.</param>
    /// <param name="problems">Receives what is wrong.</param>
    public static string? Read(string path, ProblemList problems)
    {
        var (text, wrong) = Try(path);
        if (wrong.Length > 0)
        {
            problems.Add(TextPlace.Whole, wrong);
        }

        return text;
    }

    private static (string? Text, string Wrong) Try(string path)
    {
        try
        {
            if (Directory.Exists(path))
            {
                return (null, "is a folder; a config file is needed here");
            }

            if (!File.Exists(path))
            {
                return (null, "no such file");
            }

            var bytes = Bytes(path);
            return bytes is null ? (null, "larger than 1 MB; this is no config") : (Decode(bytes), "");
        }
        catch (DecoderFallbackException)
        {
            return (null, "not UTF-8 text");
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return (null, $"cannot be read: {e.Message}");
        }
    }

    private static byte[]? Bytes(string path)
    {
        // Not by length: a pipe or a device tells none.
        using var file = File.OpenRead(path);
        var bytes = new byte[LargestBytes + 1];
        var count = file.ReadAtLeast(bytes, bytes.Length, throwOnEndOfStream: false);
        return count > LargestBytes ? null : bytes[..count];
    }

    private static string Decode(byte[] bytes)
    {
        var strict = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);
        using var reader = new StreamReader(new MemoryStream(bytes), strict, detectEncodingFromByteOrderMarks: true);
        return reader.ReadToEnd();
    }
}
