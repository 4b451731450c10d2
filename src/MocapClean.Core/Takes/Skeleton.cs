using System.Collections.Immutable;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Takes;

/// <summary>The hierarchy of joints with their bone vectors, where the format has one. Joints stand in the order of the take's tracks.</summary>
/// <param name="Bones">One for each track, a parent before its children.</param>
/// <param name="EndSites">Points without orientation at the ends of chains.</param>
public sealed record Skeleton(ImmutableArray<Bone> Bones, ImmutableArray<EndSite> EndSites);

/// <summary>Where a joint hangs.</summary>
/// <param name="Name">Name of the joint.</param>
/// <param name="Parent">Index of the parent track, -1 for a root.</param>
/// <param name="Vector">From the parent's origin to this joint's, in the parent's frame, in the file's unit of length.</param>
public sealed record Bone(string Name, int Parent, Vec3 Vector);

/// <summary>The end of a chain.</summary>
/// <param name="Parent">Index of the track it hangs from.</param>
/// <param name="Vector">From the parent's origin, in the parent's frame, in the file's unit of length.</param>
public sealed record EndSite(int Parent, Vec3 Vector);
