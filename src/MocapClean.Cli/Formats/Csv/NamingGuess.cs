using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>A way in which columns of orientations may be named: four columns a joint that differ in the component only.</summary>
/// <param name="Pattern">With <c>{component}</c> and, unless the joint has no name, <c>{joint}</c>.</param>
/// <param name="Components">Names in the order w, x, y, z.</param>
/// <param name="Joints">Joints that are named so; a single empty name where the pattern has no joint.</param>
/// <param name="Slots">Four columns for each joint.</param>
internal sealed record NamingGuess(
    string Pattern, ImmutableArray<string> Components, ImmutableArray<string> Joints, ImmutableArray<int> Slots)
{
    /// <summary>Letters for w, x, y, z, the usual ones first.</summary>
    private static readonly ImmutableArray<string> Alphabets = ["wxyz", "WXYZ", "sxyz", "SXYZ", "rijk", "RIJK", "0123"];

    /// <summary>The components are numbers, of which one cannot see whether the first or the last is w.</summary>
    public bool IsNumbered => Components[0][^1] == '0';

    /// <summary>All ways that fit, the usual letters first, and of those the ones with most names first. Found as they are asked for.</summary>
    public static IEnumerable<NamingGuess> All(ImmutableArray<string> names)
    {
        if (names.Length < 4)
        {
            return [];
        }

        // A name that starts like a number is no name but a row.
        var words = names.Where(n => n.Length > 0 && !char.IsAsciiDigit(n[0]) && n[0] is not ('-' or '+' or '.'))
            .ToHashSet(StringComparer.Ordinal);
        return Alphabets.SelectMany(letters => Of(names, words, letters));
    }

    private static IEnumerable<NamingGuess> Of(ImmutableArray<string> names, HashSet<string> words, string letters) => words
        .SelectMany(name => NameReading.All(name, letters, words))
        .GroupBy(r => (r.Before, r.After, r.Prefix))
        .OrderByDescending(g => g.Count())
        .Select(g => Build(names, [.. g], letters));

    private static NamingGuess Build(ImmutableArray<string> names, ImmutableArray<NameReading> readings, string letters)
    {
        // "handqw, footqw": no boundary parts the q from the joint, but all joints would end in it.
        var first = readings[0];
        var joins = first.Before == ColumnPattern.JointMark && first.Prefix.Length == 0 && readings.All(r => r.Joint.Length > 1
            && char.ToLowerInvariant(r.Joint[^1]) == 'q' && r.Joint[^1] == first.Joint[^1]);
        var prefix = joins ? first.Joint[^1..] : first.Prefix;
        var pattern = first.Before + ColumnPattern.ComponentMark + first.After;
        ImmutableArray<string> components = [.. letters.Select(c => prefix + c)];
        var (joints, slots) = Collect(names, new ColumnPattern(pattern, components, StringComparison.Ordinal));
        return new NamingGuess(pattern, components, joints, slots);
    }

    /// <summary>All joints whose four columns fit a pattern.</summary>
    private static (ImmutableArray<string> Joints, ImmutableArray<int> Slots) Collect(ImmutableArray<string> names, ColumnPattern pattern)
    {
        var columns = new OrderedDictionary<string, int[]>(StringComparer.Ordinal);
        for (var column = 0; column < names.Length; column++)
        {
            if (pattern.TryMatch(names[column], out var joint, out var component))
            {
                columns.TryAdd(joint, [-1, -1, -1, -1]);
                columns[joint][component] = column;
            }
        }

        var whole = columns.Where(c => !c.Value.Contains(-1)).ToList();
        return ([.. whole.Select(c => c.Key)], [.. whole.SelectMany(c => c.Value)]);
    }
}
