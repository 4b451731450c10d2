using System.Collections.Immutable;

namespace MocapClean.Cli.Batch;

/// <summary>What lies in an output folder that this session did not put there, or did not finish.</summary>
public static class OutputFolderState
{
    /// <summary>Removes files that a killed run left half written.</summary>
    public static void RemoveUnfinished(FolderOutput output)
    {
        foreach (var file in Directory.EnumerateFiles(output.Root, "*" + FolderOutput.Unfinished, SearchOption.AllDirectories))
        {
            File.Delete(file);
        }
    }

    /// <summary>Outputs of takes that belong to no take of the plan, by path relative to the folder, in ordinal order.</summary>
    public static ImmutableArray<string> Leftovers(FolderOutput output, SessionPlan plan)
    {
        var known = plan.Takes.SelectMany(t => new[]
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
