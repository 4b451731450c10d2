using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Config.Sources;

/// <summary>What a row of slates says of a take; frames count from 0.</summary>
/// <param name="Take">The take's name, as in <see cref="FoundTake.Name"/>.</param>
/// <param name="Slate">The frame whose address is known.</param>
/// <param name="ActionFirst">The first frame that counts in verdicts, or null for the take's first.</param>
/// <param name="ActionLast">The last one, or null for the take's last.</param>
/// <param name="At">Where it stands in its file.</param>
public sealed record TakeSlate(string Take, Slate Slate, int? ActionFirst, int? ActionLast, TextPlace At);

/// <summary>The slates of a session.</summary>
/// <param name="ByTake">Slates by take.</param>
/// <param name="Notes">One line for each row whose take was not found.</param>
public sealed record SlateTable(ImmutableDictionary<string, TakeSlate> ByTake, ImmutableArray<string> Notes)
{
    /// <summary>No slates at all.</summary>
    public static SlateTable Empty { get; } = new(ImmutableDictionary<string, TakeSlate>.Empty, []);

    /// <summary>The slate of a take, or null.</summary>
    public TakeSlate? For(string take) => ByTake.GetValueOrDefault(take);
}
