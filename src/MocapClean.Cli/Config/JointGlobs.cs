using System.Collections.Immutable;
using System.IO.Enumeration;

namespace MocapClean.Cli.Config;

/// <summary>Globs on the names of joints; upper and lower case are told apart.</summary>
public static class JointGlobs
{
    /// <summary>Whether a joint's name matches one of the globs.</summary>
    public static bool MatchesAny(string joint, ImmutableArray<string> globs) =>
        globs.Any(g => FileSystemName.MatchesSimpleExpression(g, joint, ignoreCase: false));
}
