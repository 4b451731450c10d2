using System.Collections.Immutable;

namespace MocapClean.Core.Diff;

/// <summary>A joint's trouble across the takes of a session: a sensor that fails in most takes is a matter for the floor, not for each take.</summary>
/// <param name="Joint">The joint's name.</param>
/// <param name="Takes">Takes that have this joint.</param>
/// <param name="TakesWithBadFrames">Takes in which it has bad frames.</param>
/// <param name="BadFrames">Bad frames in all.</param>
/// <param name="MendedSamples">Samples filled or turned back in all.</param>
public sealed record JointTrouble(string Joint, int Takes, int TakesWithBadFrames, int BadFrames, int MendedSamples)
{
    /// <summary>Trouble by joint, the worst first; joints without any left out.</summary>
    /// <param name="joints">One for each joint of each take: its name, bad frames and mended samples.</param>
    public static ImmutableArray<JointTrouble> Across(IEnumerable<(string Joint, int BadFrames, int Mended)> joints) =>
    [
        .. joints.GroupBy(j => j.Joint, StringComparer.Ordinal)
            .Select(g => new JointTrouble(g.Key, g.Count(), g.Count(j => j.BadFrames > 0), g.Sum(j => j.BadFrames), g.Sum(j => j.Mended)))
            .Where(t => t.BadFrames + t.MendedSamples > 0)
            .OrderByDescending(t => t.TakesWithBadFrames).ThenByDescending(t => t.BadFrames).ThenByDescending(t => t.MendedSamples)
            .ThenBy(t => t.Joint, StringComparer.Ordinal),
    ];
}
