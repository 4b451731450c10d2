using System.Text;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Tells text from what is not: a table starts where this says.</summary>
internal static class CsvText
{
    private const string Expected = "CSV text in UTF-8";

    /// <summary>Offset of the first byte after a byte order mark.</summary>
    /// <exception cref="InputFormatException">The file is empty or is no UTF-8 text.</exception>
    public static int Start(TakeSource source)
    {
        ReadOnlySpan<byte> bytes = source.Bytes;
        var start = bytes.StartsWith(Encoding.UTF8.Preamble) ? Encoding.UTF8.Preamble.Length : 0;
        var found = bytes[start..].IsEmpty ? "an empty file" : Foreign(bytes);
        return found is null ? start : throw new InputFormatException(source.Name, "", found, Expected);
    }

    /// <summary>Number from 1 of the line that starts at an offset; CR, LF and CRLF each end one.</summary>
    public static int LineAt(ReadOnlySpan<byte> bytes, int offset)
    {
        var before = bytes[..offset];
        var pairs = before.Count("\r\n"u8);
        return 1 + before.Count((byte)'\n') + before.Count((byte)'\r') - pairs;
    }

    /// <summary>Delivered text as it may stand in a message: on one line and not long.</summary>
    public static string Shown(string text)
    {
        const int Longest = 60;
        var line = string.Concat(text.Take(Longest).Select(c => char.IsControl(c) ? ' ' : c));
        return text.Length > Longest ? line + "..." : line;
    }

    private static string? Foreign(ReadOnlySpan<byte> bytes)
    {
        if (bytes.StartsWith((ReadOnlySpan<byte>)[0x1f, 0x8b]))
        {
            return "gzip-compressed data";
        }

        if (bytes.StartsWith("PK\u0003\u0004"u8))
        {
            return "a zip archive (a spreadsheet workbook is one, too)";
        }

        if (bytes.StartsWith((ReadOnlySpan<byte>)[0xff, 0xfe]) || bytes.StartsWith((ReadOnlySpan<byte>)[0xfe, 0xff]))
        {
            return "UTF-16 text";
        }

        var nul = bytes.IndexOf((byte)0);
        return nul < 0 ? null : LooksLikeUtf16(bytes) ? "UTF-16 text" : $"binary data (a NUL byte at offset {nul})";
    }

    /// <summary>Every second byte of the beginning is NUL.</summary>
    private static bool LooksLikeUtf16(ReadOnlySpan<byte> bytes)
    {
        var head = bytes[..Math.Min(bytes.Length, 64)];
        Span<int> nuls = stackalloc int[2];
        for (var i = 0; i < head.Length; i++)
        {
            nuls[i & 1] += head[i] == 0 ? 1 : 0;
        }

        return head.Length >= 4 && nuls[0] + nuls[1] == head.Length / 2 && (nuls[0] == 0 || nuls[1] == 0);
    }
}
