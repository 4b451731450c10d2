using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>
/// Reads the HIERARCHY section up to and with the word MOTION. There is no standard; the grammar is the one in common use:
/// <c>ROOT name { OFFSET x y z CHANNELS n ... JOINT name {...} End Site { OFFSET x y z } }</c>, one root or more.
/// </summary>
internal sealed class BvhHierarchyReader(BvhWords words)
{
    /// <summary>Bodies have some twenty joints in a row, ropes perhaps a hundred.</summary>
    private const int DeepestNesting = 256;

    private readonly List<BvhJoint> joints = [];
    private readonly List<BvhEnd> ends = [];
    private readonly List<string> columns = [];
    private readonly HashSet<string> names = [];
    private readonly Stack<OpenJoint> open = [];

    /// <summary>Reads the section.</summary>
    public BvhHierarchy Read()
    {
        words.Expect("HIERARCHY");
        while (true)
        {
            var word = words.Next();
            if (open.Count > 0)
            {
                ReadInside(word);
            }
            else if (BvhText.Is(word, "ROOT"))
            {
                Begin(-1);
            }
            else if (joints.Count > 0 && BvhText.Is(word, "MOTION"))
            {
                return new BvhHierarchy([.. joints], [.. ends], [.. columns]);
            }
            else
            {
                throw words.Unexpected(joints.Count > 0 ? "ROOT or MOTION" : "ROOT");
            }
        }
    }

    private void ReadInside(ReadOnlySpan<byte> word)
    {
        var joint = open.Peek();
        if (BvhText.Is(word, "OFFSET") && !joint.HasVector)
        {
            joint.HasVector = true;
            joints[joint.Index] = joints[joint.Index] with { Vector = ReadVector(Name(joint)) };
        }
        else if (BvhText.Is(word, "CHANNELS") && !joint.HasChannels)
        {
            joint.HasChannels = true;
            joints[joint.Index] = joints[joint.Index] with { Rotations = ReadChannels(Name(joint)) };
        }
        else if (BvhText.Is(word, "JOINT"))
        {
            Begin(joint.Index);
        }
        else if (BvhText.Is(word, "End"))
        {
            ReadEnd(joint.Index);
        }
        else if (BvhText.Is(word, "}") && joint.HasVector)
        {
            open.Pop();
        }
        else
        {
            throw words.Unexpected(Expected(joint), Name(joint));
        }
    }

    private static string Expected(OpenJoint joint) =>
        $"{(joint.HasVector ? "" : "OFFSET, ")}{(joint.HasChannels ? "" : "CHANNELS, ")}JOINT, End Site or }}";

    private string Name(OpenJoint joint) => joints[joint.Index].Name;

    private void Begin(int parent)
    {
        if (words.NextName().IsEmpty)
        {
            throw words.Fault("no name", "the name of a joint");
        }

        var name = Encoding.UTF8.GetString(words.Word);
        var shown = BvhText.Quote(words.Word);
        if (!names.Add(name))
        {
            throw words.Fault($"a second joint {shown}", "a name for each joint that no other has");
        }

        if (open.Count == DeepestNesting)
        {
            throw words.Fault($"joint {shown} below {DeepestNesting} others", $"at most {DeepestNesting} joints in a row");
        }

        words.Expect("{");
        open.Push(new OpenJoint(joints.Count));
        joints.Add(new BvhJoint(name, parent, Vec3.Zero, []));
    }

    private void ReadEnd(int joint)
    {
        words.NextName();
        words.Expect("{");
        words.Expect("OFFSET");
        ends.Add(new BvhEnd(joint, ReadVector(joints[joint].Name)));
        words.Expect("}");
    }

    private Vec3 ReadVector(string joint) => new(ReadLength(joint), ReadLength(joint), ReadLength(joint));

    private double ReadLength(string joint) =>
        BvhText.TryNumber(words.Next(), out var value) && double.IsFinite(value)
            ? value
            : throw words.Unexpected("a number (OFFSET x y z)", joint);

    private ImmutableArray<BvhRotation> ReadChannels(string joint)
    {
        if (!int.TryParse(words.Next(), NumberStyles.None, CultureInfo.InvariantCulture, out var count) || count > 6)
        {
            throw words.Unexpected("a number of channels from 0 to 6", joint);
        }

        var rotations = ImmutableArray.CreateBuilder<BvhRotation>();
        var first = columns.Count;
        for (var n = 0; n < count; n++)
        {
            var (axis, turns) = Channel(words.Next())
                ?? throw words.Unexpected("a channel (Xposition, Yposition, Zposition, Xrotation, Yrotation, Zrotation)", joint);
            var column = $"{joint} {axis}{(turns ? "rotation" : "position")}";
            if (columns.IndexOf(column, first) >= 0)
            {
                throw words.Fault($"{BvhText.Quote(words.Word)} a second time", "each channel once", joint);
            }

            if (turns)
            {
                rotations.Add(new BvhRotation(axis, columns.Count));
            }

            columns.Add(column);
        }

        return rotations.ToImmutable();
    }

    private static (char Axis, bool Turns)? Channel(ReadOnlySpan<byte> word)
    {
        if (word.Length != 9 || (word[0] | 0x20) is not (>= 'x' and <= 'z'))
        {
            return null;
        }

        var axis = (char)(word[0] & ~0x20);
        return BvhText.Is(word[1..], "rotation") ? (axis, true) : BvhText.Is(word[1..], "position") ? (axis, false) : null;
    }

    /// <summary>A joint whose closing brace has not come yet.</summary>
    private sealed class OpenJoint(int index)
    {
        public int Index { get; } = index;

        public bool HasVector { get; set; }

        public bool HasChannels { get; set; }
    }
}
