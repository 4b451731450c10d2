using System.Collections.Immutable;

namespace MocapClean.Cli.Batch;

/// <summary>Tells files that changed since they were last ready and whose size and time stand still since the look before.</summary>
public sealed class SettledFiles
{
    private readonly Dictionary<string, (long Size, DateTime Time)> last = new(StringComparer.Ordinal);
    private readonly Dictionary<string, (long Size, DateTime Time, string Slate)> done = new(StringComparer.Ordinal);

    /// <summary>The takes that are ready now; each is told once for every change of its file or of what its slate says.</summary>
    public ImmutableArray<PlannedTake> Ready(ImmutableArray<PlannedTake> takes, Func<string, string> slate)
    {
        var ready = ImmutableArray.CreateBuilder<PlannedTake>();
        foreach (var take in takes)
        {
            var info = new FileInfo(take.FullPath);
            var now = info.Exists ? (info.Length, info.LastWriteTimeUtc) : default;
            var settled = last.TryGetValue(take.Name, out var before) && before == now;
            last[take.Name] = now;
            var state = (now.Item1, now.Item2, slate(take.Name));
            if (settled && (!done.TryGetValue(take.Name, out var earlier) || earlier != state))
            {
                done[take.Name] = state;
                ready.Add(take);
            }
        }

        return ready.ToImmutable();
    }
}
