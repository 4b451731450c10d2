using System.Collections.Immutable;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Ingest;

/// <summary>
/// Turns what a file holds into tracks that the other stages may trust: unit length everywhere, missing samples known as such, segments
/// ended where time is lost or stands still, a rest pose in front set apart.
/// </summary>
public sealed class IngestStage : IStage
{
    /// <inheritdoc/>
    public Take Run(Take take, StageContext context)
    {
        var lengths = PerJoint.Run(take, context, (joint, track, findings) =>
        {
            var (unit, rows) = UnitLength.Project(track, joint, context.PerJoint[joint].Ingest.OffUnit);
            return new JointResult(unit, [.. findings, .. rows]);
        });
        return RestPoseSearch.SetApart(EndSegments(lengths, ClockFaults.Find(take.Clock)), context);
    }

    private static Take EndSegments(Take take, ImmutableArray<Finding> faults)
    {
        if (faults.IsEmpty)
        {
            return take;
        }

        // Every frame whose time does not follow from the one before begins a segment of its own, and so does the frame after it.
        ImmutableArray<int> breaks = [.. faults
            .SelectMany(f => Enumerable.Range(f.First, f.Kind == FaultKind.LostFrames ? 1 : f.Count + 1))
            .Where(n => n > 0 && n < take.Length).Distinct().Order()];
        return take with
        {
            Tracks = [.. take.Tracks.Select(t => t with { Breaks = breaks })],
            Findings = [.. faults, .. take.Findings],
        };
    }
}
