using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>
/// The chain of the joints that are tracks. A joint without rotation channels never turns, so what hangs from it hangs as well from the
/// track above it, by the sum of the bone vectors; its own origin stays as an end site.
/// </summary>
internal static class BvhSkeleton
{
    /// <summary>The skeleton; null where a joint turns that is not a track, since then no chain through it is known.</summary>
    public static Skeleton? Of(BvhHierarchy hierarchy)
    {
        var anchors = new EndSite[hierarchy.Joints.Length];
        var bones = ImmutableArray.CreateBuilder<Bone>();
        var ends = ImmutableArray.CreateBuilder<EndSite>();
        for (var j = 0; j < anchors.Length; j++)
        {
            var joint = hierarchy.Joints[j];
            var origin = Below(joint.Parent, joint.Vector);
            if (BvhTrack.Suits(joint))
            {
                anchors[j] = new EndSite(bones.Count, Vec3.Zero);
                bones.Add(new Bone(joint.Name, origin.Parent, origin.Vector));
            }
            else if (joint.Rotations.IsEmpty)
            {
                anchors[j] = origin;
                AddEnd(origin);
            }
            else
            {
                return null;
            }
        }

        foreach (var end in hierarchy.Ends)
        {
            AddEnd(Below(end.Joint, end.Vector));
        }

        return new Skeleton(bones.ToImmutable(), ends.ToImmutable());

        EndSite Below(int parent, Vec3 vector) =>
            parent < 0 ? new EndSite(-1, vector) : anchors[parent] with { Vector = anchors[parent].Vector + vector };

        void AddEnd(EndSite end)
        {
            if (end.Parent >= 0)
            {
                ends.Add(end);
            }
        }
    }
}
