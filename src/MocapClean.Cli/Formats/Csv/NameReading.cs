using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>One way to take the name of a w column apart, borne out by the columns of x, y and z.</summary>
/// <param name="Before">What stands before the component, with <c>{joint}</c> in place of the joint.</param>
/// <param name="Prefix">A q that belongs to the component.</param>
/// <param name="After">What stands after the component, with <c>{joint}</c> in place of the joint.</param>
/// <param name="Joint">Name of the joint; empty where nothing is left for it.</param>
internal sealed record NameReading(string Before, string Prefix, string After, string Joint)
{
    /// <summary>Words that say what a column holds and do not belong to the joint's name, longest first.</summary>
    private static readonly ImmutableArray<string> Words =
    [
        "orientation", "quaternion", "rotation", "attitude", "global", "orient", "local", "world", "quat", "ori", "rot", "of", "q",
    ];

    /// <summary>All ways to read a name with its w in any place.</summary>
    public static IEnumerable<NameReading> All(string name, string letters, HashSet<string> names)
    {
        for (var at = name.IndexOf(letters[0], StringComparison.Ordinal); at >= 0; at = name.IndexOf(letters[0], at + 1))
        {
            var (before, after) = (name[..at], name[(at + 1)..]);
            foreach (var reading in letters.All(c => names.Contains(before + c + after)) ? Read(before, after) : [])
            {
                yield return reading;
            }
        }
    }

    private static IEnumerable<NameReading> Read(string before, string after)
    {
        var (head, tail) = (EndOfJoint(before), StartOfJoint(after));
        if (head > 0)
        {
            yield return Part(ColumnPattern.JointMark + before[head..], after, before[..head]);
        }

        if (tail < after.Length)
        {
            yield return Part(before, after[..tail] + ColumnPattern.JointMark, after[tail..]);
        }

        if (head == 0 && tail == after.Length)
        {
            yield return Part(before, after, "");
        }
    }

    /// <summary>Gives a q that stands alone before the component to it.</summary>
    private static NameReading Part(string before, string after, string joint)
    {
        var alone = before is [.., 'q' or 'Q'] && (before.Length == 1 || !char.IsLetter(before[^2]) || before[^1] == 'Q');
        return new NameReading(alone ? before[..^1] : before, alone ? before[^1..] : "", after, joint);
    }

    /// <summary>Length of what is left of a text without the separators and known words at its end.</summary>
    private static int EndOfJoint(string text)
    {
        var end = text.Length;
        while (true)
        {
            var start = end;
            while (end > 0 && !char.IsLetterOrDigit(text[end - 1]))
            {
                end--;
            }

            end -= Words.FirstOrDefault(w => EndsWithWord(text.AsSpan(0, end), w))?.Length ?? 0;
            if (end == start)
            {
                return end;
            }
        }
    }

    /// <summary>Where a text goes on behind the separators and known words at its start.</summary>
    private static int StartOfJoint(string text)
    {
        var at = 0;
        while (true)
        {
            var start = at;
            while (at < text.Length && !char.IsLetterOrDigit(text[at]))
            {
                at++;
            }

            at += Words.FirstOrDefault(w => StartsWithWord(text.AsSpan(at), w))?.Length ?? 0;
            if (at == start)
            {
                return at;
            }
        }
    }

    private static bool EndsWithWord(ReadOnlySpan<char> text, string word)
    {
        if (!text.EndsWith(word, StringComparison.OrdinalIgnoreCase))
        {
            return false;
        }

        var at = text.Length - word.Length;
        return at == 0 || !char.IsLetter(text[at - 1]) || (char.IsUpper(text[at]) && char.IsLower(text[at - 1]));
    }

    private static bool StartsWithWord(ReadOnlySpan<char> text, string word) =>
        text.StartsWith(word, StringComparison.OrdinalIgnoreCase)
        && (text.Length == word.Length || !char.IsLower(text[word.Length]) || char.IsUpper(text[word.Length]));
}
