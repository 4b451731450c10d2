using System.Collections.Immutable;
using System.Security.Cryptography;
using System.Text;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Report;

namespace MocapClean.Cli.Batch;

/// <summary>
/// Runs the takes of a session on a few workers. A take that fails is named and the others go on; a take that was finished by an earlier
/// run, with the same source, settings and program and with its outputs untouched, is kept.
/// </summary>
public sealed class SessionRunner(SessionPlan plan, IOutput output, Journal? journal, StageTimes times, Action<TakeSummary, bool> ended)
{
    /// <summary>Processes takes; those not begun when <paramref name="stop"/> is set are not begun any more.</summary>
    /// <returns>What came of each, in the order given; null for a take that was not begun.</returns>
    public IReadOnlyList<TakeSummary?> Run(ImmutableArray<PlannedTake> takes, CancellationToken stop)
    {
        var results = new TakeSummary?[takes.Length];
        // One long take uses all workers too: they work within a take when there are fewer takes than workers.
        var within = Math.Max(1, plan.Workers / Math.Max(1, takes.Length));
        var options = new ParallelOptions { MaxDegreeOfParallelism = Math.Max(1, Math.Min(plan.Workers, takes.Length)) };
        // One index at a time in rising order: results and memory do not depend on how a range would be cut.
        Parallel.ForEach(System.Collections.Concurrent.Partitioner.Create(Indices(takes.Length, stop), System.Collections.Concurrent.EnumerablePartitionerOptions.NoBuffering), options, i =>
        {
            var (summary, kept) = Process(takes[i], within);
            results[i] = summary;
            ended(summary, kept);
        });
        return results;
    }

    /// <summary>What an earlier run left of a take that this run does not process: its summary, and whether it is still true.</summary>
    public (TakeSummary? Summary, bool Stale) Earlier(PlannedTake take)
    {
        if (journal?.Find(take.Name) is not { } entry)
        {
            return (null, false);
        }

        try
        {
            var (_, sha256) = SourceFile.Read(take, plan.LargestTake);
            return IsStill(entry, take, sha256) ? (entry.Summary, false) : (null, true);
        }
        catch (InputFormatException e)
        {
            return (TakeSummary.Failed(take.Name, "", e.Message), false);
        }
    }

    private static IEnumerable<int> Indices(int count, CancellationToken stop)
    {
        for (var i = 0; i < count && !stop.IsCancellationRequested; i++)
        {
            yield return i;
        }
    }

    private (TakeSummary Summary, bool Kept) Process(PlannedTake take, int workers)
    {
        var sha256 = "";
        try
        {
            TakeSource source;
            (source, sha256) = times.Measure("source", () => SourceFile.Read(take, plan.LargestTake));
            if (journal?.Find(take.Name) is { Summary.Failure: null } entry && IsStill(entry, take, sha256))
            {
                return (entry.Summary, true);
            }

            // A second signal ends the process at once, so a take that was begun is always finished or not written.
            var outcome = new TakeJob(plan, output, times).Run(source, sha256, workers, CancellationToken.None);
            journal?.Append(new JournalEntry(Key(take, sha256), outcome.Files, outcome.Summary));
            return (outcome.Summary, false);
        }
        catch (Exception e)
        {
            return (Failed(take, sha256, e), false);
        }
    }

    /// <summary>One bad take never stops a session, whatever is wrong with it or with this program.</summary>
    private TakeSummary Failed(PlannedTake take, string sha256, Exception e)
    {
        var root = output is FolderOutput folder ? folder.Root + Path.DirectorySeparatorChar : "\0";
        var message = e is InputFormatException ? e.Message : $"{take.Name}: not processed: {e.Message.Replace(root, "", StringComparison.Ordinal)}";
        var failed = TakeSummary.Failed(take.Name, sha256, message);
        try
        {
            journal?.Append(new JournalEntry(Key(take, sha256), [], failed));
        }
        catch (IOException)
        {
            // A full disk: the next run finds no line and does the take again.
        }

        return failed;
    }

    private string Key(PlannedTake take, string sha256) => Fingerprint($"{plan.Fingerprint}\n{plan.SlateTextFor(take.Name)}\n{sha256}");

    private bool IsStill(JournalEntry entry, PlannedTake take, string sha256) => entry.Key == Key(take, sha256)
        && output is FolderOutput folder && entry.Files.All(f => IsWhole(folder, f));

    private static bool IsWhole(FolderOutput folder, WrittenFile file)
    {
        var place = folder.Place(file.Path);
        if (!File.Exists(place))
        {
            return false;
        }

        using var stream = File.OpenRead(place);
        return Convert.ToHexStringLower(SHA256.HashData(stream)) == file.Sha256;
    }

    /// <summary>SHA-256 of a text, lower-case hexadecimal.</summary>
    public static string Fingerprint(string text) => Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text)));
}
