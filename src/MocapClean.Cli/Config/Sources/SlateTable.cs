using System.Collections.Immutable;

namespace MocapClean.Cli.Config.Sources;

/// <summary>What a slate says of a take.</summary>
/// <param name="Take">The take's name, as in <see cref="FoundTake.Name"/>.</param>
/// <param name="Frame">A frame of the take.</param>
/// <param name="TimeCode">Its address, as written.</param>
/// <param name="ActionFirst">The first frame that counts in verdicts, or null for the take's first.</param>
/// <param name="ActionLast">The last one, or null for the take's last.</param>
/// <param name="At">Where it stands in its file.</param>
public sealed record Slate(string Take, int Frame, string TimeCode, int? ActionFirst, int? ActionLast, Place At);

/// <summary>The slates of a session.</summary>
/// <param name="File">The file, as a message names it.</param>
/// <param name="ByTake">Slates by take.</param>
/// <param name="Notes">One line for each slate whose take was not found.</param>
public sealed record SlateTable(string File, ImmutableDictionary<string, Slate> ByTake, ImmutableArray<string> Notes)
{
    /// <summary>No slates at all.</summary>
    public static SlateTable Empty { get; } = new("", ImmutableDictionary<string, Slate>.Empty, []);

    /// <summary>The slate of a take, or null.</summary>
    public Slate? For(string take) => ByTake.GetValueOrDefault(take);
}
