using System.Collections.Immutable;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>What the HIERARCHY section declares.</summary>
/// <param name="Joints">As declared, a parent before its children.</param>
/// <param name="Ends">End sites.</param>
/// <param name="Columns">Names of all channels in the order of a line of values, such as <c>LeftArm Zrotation</c>.</param>
internal sealed record BvhHierarchy(ImmutableArray<BvhJoint> Joints, ImmutableArray<BvhEnd> Ends, ImmutableArray<string> Columns);

/// <summary>One joint.</summary>
/// <param name="Name">As declared, unique.</param>
/// <param name="Parent">Index of the parent joint, -1 for a root.</param>
/// <param name="Vector">OFFSET: from the parent's origin to this joint's.</param>
/// <param name="Rotations">Its rotation channels, outermost turn first, with the column of each.</param>
internal sealed record BvhJoint(string Name, int Parent, Vec3 Vector, ImmutableArray<BvhRotation> Rotations);

/// <summary>A rotation channel.</summary>
/// <param name="Axis">X, Y or Z.</param>
/// <param name="Column">Index of its value in a line.</param>
internal readonly record struct BvhRotation(char Axis, int Column);

/// <summary>An end site.</summary>
/// <param name="Joint">Index of the joint it hangs from.</param>
/// <param name="Vector">OFFSET, from that joint's origin.</param>
internal sealed record BvhEnd(int Joint, Vec3 Vector);
