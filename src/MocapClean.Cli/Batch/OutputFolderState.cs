using System.Collections.Immutable;

namespace MocapClean.Cli.Batch;

/// <summary>What lies in an output folder that this session did not put there, or did not finish.</summary>
public static class OutputFolderState
{
    /// <summary>Removes files that a killed run left half written.</summary>
    public static void RemoveUnfinished(FolderOutput output)
    {
        var ours = OutputPaths.Folders.Append("log").Select(output.Place).Where(Directory.Exists)
            .SelectMany(f => Directory.EnumerateFiles(f, "*" + FolderOutput.Unfinished, SearchOption.AllDirectories))
            .Concat(Directory.EnumerateFiles(output.Root, "*" + FolderOutput.Unfinished));
        foreach (var file in ours)
        {
            File.Delete(file);
        }
    }

    /// <summary>Outputs that belong to no take of the plan, or to one that failed since they were written, by path relative to the folder, in ordinal order.</summary>
    public static ImmutableArray<string> Leftovers(FolderOutput output, SessionPlan plan, IReadOnlySet<string> failed)
    {
        var known = plan.Takes.Where(t => !failed.Contains(t.Name)).SelectMany(t => new[]
        {
            OutputPaths.Take(t.Name), OutputPaths.DiffCsv(t.Name), OutputPaths.DiffJson(t.Name), plan.WriteKeys ? OutputPaths.Keys(t.Name) : "",
        }).ToHashSet(StringComparer.Ordinal);
        return
        [
            .. OutputPaths.Folders.Select(f => Path.Combine(output.Root, f)).Where(Directory.Exists)
                .SelectMany(f => Directory.EnumerateFiles(f, "*", SearchOption.AllDirectories))
                .Select(f => Path.GetRelativePath(output.Root, f).Replace('\\', '/'))
                .Where(f => !known.Contains(f)).Order(StringComparer.Ordinal),
        ];
    }
}
