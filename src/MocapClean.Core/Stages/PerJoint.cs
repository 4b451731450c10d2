using System.Collections.Immutable;
using System.Runtime.ExceptionServices;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages;

/// <summary>A track and the findings that a stage added to it.</summary>
/// <param name="Track">The track after the stage.</param>
/// <param name="Findings">In order of frames.</param>
public sealed record JointResult(JointTrack Track, ImmutableArray<Finding> Findings);

/// <summary>Runs a stage's work joint by joint, on as many threads as the context allows, into fixed slots.</summary>
public static class PerJoint
{
    /// <summary>
    /// The take with every track replaced, and with the findings of <paramref name="work"/> as its findings of that joint: work is given
    /// the joint's findings so far and returns all that shall stand. Findings of the whole take stay first, then joint by joint.
    /// </summary>
    public static Take Run(Take take, StageContext context, Func<int, JointTrack, ImmutableArray<Finding>, JointResult> work)
    {
        var before = take.Findings.ToLookup(f => f.Joint);
        var results = new JointResult[take.Tracks.Length];
        var options = new ParallelOptions { MaxDegreeOfParallelism = context.Workers, CancellationToken = context.Cancel };
        try
        {
            Parallel.For(0, results.Length, options, j => results[j] = work(j, take.Tracks[j], [.. before[j]]));
        }
        catch (AggregateException e)
        {
            // What went wrong in a joint is what the caller wants to hear, not that it happened on a thread.
            ExceptionDispatchInfo.Throw(e.InnerExceptions[0]);
        }

        return take with
        {
            Tracks = [.. results.Select(r => r.Track)],
            Findings = [.. before[-1], .. results.SelectMany(r => r.Findings)],
        };
    }
}
