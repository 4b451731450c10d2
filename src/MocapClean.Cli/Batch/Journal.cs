using System.Collections.Immutable;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using MocapClean.Cli.Report;

namespace MocapClean.Cli.Batch;

/// <summary>
/// What was finished, one line a take, appended and flushed, each with a checksum: a line torn by a crash is known as such and passed over.
/// The last good line of a take counts.
/// </summary>
public sealed class Journal : IDisposable
{
    private readonly FileStream file;
    private readonly Lock gate = new();
    private readonly Dictionary<string, JournalEntry> entries;

    private Journal(FileStream file, Dictionary<string, JournalEntry> entries)
    {
        this.file = file;
        this.entries = entries;
    }

    /// <summary>Opens a journal for appending; made if it is not there.</summary>
    /// <param name="path">Its file.</param>
    /// <param name="fresh">Forget what it holds.</param>
    /// <exception cref="IOException">It cannot be opened.</exception>
    public static Journal Open(string path, bool fresh)
    {
        var stream = new FileStream(path, fresh ? FileMode.Create : FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.Read);
        var found = new Dictionary<string, JournalEntry>(StringComparer.Ordinal);
        using (var reader = new StreamReader(stream, new UTF8Encoding(false, false), leaveOpen: true))
        {
            while (reader.ReadLine() is { } line)
            {
                if (Parse(line) is { } entry)
                {
                    found[entry.Summary.Take] = entry;
                }
            }
        }

        stream.Seek(0, SeekOrigin.End);
        EndTornLine(stream);
        return new Journal(stream, found);
    }

    /// <summary>The last entry of a take, or null.</summary>
    public JournalEntry? Find(string take)
    {
        lock (gate)
        {
            return entries.GetValueOrDefault(take);
        }
    }

    /// <summary>Appends an entry and flushes it to the disk.</summary>
    public void Append(JournalEntry entry)
    {
        var json = JsonSerializer.Serialize(entry, JournalJson.OneLine.JournalEntry);
        var line = Encoding.UTF8.GetBytes($"{Checksum(json)} {json}\n");
        lock (gate)
        {
            entries[entry.Summary.Take] = entry;
            file.Write(line);
            file.Flush(flushToDisk: true);
        }
    }

    /// <inheritdoc/>
    public void Dispose() => file.Dispose();

    private static JournalEntry? Parse(string line)
    {
        var cut = line.IndexOf(' ', StringComparison.Ordinal);
        if (cut < 0 || line[..cut] != Checksum(line[(cut + 1)..]))
        {
            return null;
        }

        try
        {
            return JsonSerializer.Deserialize(line.AsSpan(cut + 1), JournalJson.OneLine.JournalEntry);
        }
        catch (JsonException)
        {
            // A whole line of another version of this program.
            return null;
        }
    }

    private static void EndTornLine(FileStream stream)
    {
        if (stream.Length == 0)
        {
            return;
        }

        stream.Seek(-1, SeekOrigin.End);
        if (stream.ReadByte() != '\n')
        {
            stream.Write("\n"u8);
        }
    }

    private static string Checksum(string text) => Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text)).AsSpan(0, 8));
}

/// <summary>A finished take.</summary>
/// <param name="Key">Fingerprint of the source, the settings and the program; another one means that the take must be done again.</param>
/// <param name="Files">What was written.</param>
/// <param name="Summary">For the session's reports.</param>
public sealed record JournalEntry(string Key, ImmutableArray<WrittenFile> Files, TakeSummary Summary);
