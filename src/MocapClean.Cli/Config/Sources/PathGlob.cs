using System.Collections.Immutable;
using System.IO.Enumeration;

namespace MocapClean.Cli.Config.Sources;

/// <summary>
/// A pattern for paths with forward slashes: <c>*</c> and <c>?</c> within a name, <c>**</c> for any number of folders, upper and lower case
/// told apart. As in a shell, a name that starts with a dot is met only by a pattern that does.
/// </summary>
public sealed class PathGlob
{
    private readonly ImmutableArray<string> parts;

    /// <summary>From its text.</summary>
    public PathGlob(string text)
    {
        // Runs of ** mean what one means, and would make matching slow.
        var split = text.Replace('\\', '/').Split('/', StringSplitOptions.RemoveEmptyEntries).Where(p => p != ".").ToList();
        parts = [.. split.Where((p, n) => n == 0 || p != "**" || split[n - 1] != "**")];
    }

    /// <summary>Whether a part of a pattern stands for more than one name.</summary>
    public static bool IsWild(string text) => text.AsSpan().ContainsAny('*', '?');

    /// <summary>Whether a relative path with forward slashes meets the pattern.</summary>
    public bool Matches(string path) => Matches(parts.AsSpan(), path.Split('/'));

    private static bool Matches(ReadOnlySpan<string> pattern, ReadOnlySpan<string> path)
    {
        if (pattern.IsEmpty)
        {
            return path.IsEmpty;
        }

        if (pattern[0] != "**")
        {
            return !path.IsEmpty && MatchesName(pattern[0], path[0]) && Matches(pattern[1..], path[1..]);
        }

        for (var skipped = 0; skipped <= path.Length; skipped++)
        {
            // A ** at the end takes files, so something must be left to be one.
            if (pattern.Length == 1 ? !path.IsEmpty && !AnyHidden(path) : Matches(pattern[1..], path[skipped..]))
            {
                return true;
            }

            if (skipped < path.Length && IsHidden(path[skipped]))
            {
                return false;
            }
        }

        return false;
    }

    private static bool MatchesName(string pattern, string name) =>
        (!IsHidden(name) || IsHidden(pattern)) && FileSystemName.MatchesSimpleExpression(pattern, name, ignoreCase: false);

    private static bool IsHidden(string name) => name.StartsWith('.') && name is not ("." or "..");

    private static bool AnyHidden(ReadOnlySpan<string> path)
    {
        foreach (var name in path)
        {
            if (IsHidden(name))
            {
                return true;
            }
        }

        return false;
    }
}
