using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>
/// BVH: a hierarchy with bone vectors and lines of Euler angles in degrees, in each joint's own channel order. <c>Zrotation Yrotation
/// Xrotation</c> is R = Z Y X on column vectors. Positions, and joints that are no tracks, are carried.
/// </summary>
internal sealed class BvhFormat : ITakeFormat
{
    /// <inheritdoc/>
    public string Name => "bvh";

    /// <inheritdoc/>
    public IReadOnlyList<string> Extensions { get; } = [".bvh"];

    /// <inheritdoc/>
    public ITakeFile Read(TakeSource source, ReadSettings settings)
    {
        var start = CheckText(source);
        var words = new BvhWords(source, start);
        var hierarchy = new BvhHierarchyReader(words).Read();
        if (!hierarchy.Joints.Any(BvhTrack.Suits))
        {
            throw new InputFormatException(
                source.Name, "HIERARCHY", "no joint with three rotation channels or one", "at least one joint that turns");
        }

        var motion = new BvhMotionReader(source, hierarchy.Columns).Read(words.Position, words.Line);
        return new BvhFile(source, hierarchy, motion, settings.Space ?? OrientationSpace.Local);
    }

    /// <summary>Offset behind the byte order mark, if there is one.</summary>
    private static int CheckText(TakeSource source)
    {
        if (source.Bytes.Length == 0)
        {
            throw new InputFormatException(source.Name, "", "an empty file", "HIERARCHY");
        }

        var zero = source.Bytes.AsSpan().IndexOf((byte)0);
        return zero < 0
            ? source.Bytes.AsSpan().StartsWith("\uFEFF"u8) ? 3 : 0
            : throw new InputFormatException(source.Name, "", $"a zero byte at byte {zero}", "text that begins with HIERARCHY");
    }
}
