using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages;

/// <summary>What a stage needs to know beside the take.</summary>
/// <param name="PerJoint">Settings of each track, in the take's order.</param>
/// <param name="Workers">How many threads the stage may use within this take, at least 1.</param>
/// <param name="Cancel">Ends the run early.</param>
public sealed record StageContext(ImmutableArray<StageSettings> PerJoint, int Workers, CancellationToken Cancel)
{
    /// <summary>The same settings for every joint.</summary>
    public static StageContext Uniform(Take take, StageSettings settings, int workers = 1, CancellationToken cancel = default) =>
        new([.. Enumerable.Repeat(settings, take.Tracks.Length)], workers, cancel);
}
