using System.Collections.Immutable;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>The rotation channels of a joint that is a track: all three, or one (a hinge; the other two angles are 0).</summary>
internal sealed class BvhTrack
{
    private readonly BvhMotion motion;

    private BvhTrack(BvhJoint joint, BvhMotion motion)
    {
        this.motion = motion;
        Name = joint.Name;
        Columns = [.. joint.Rotations.Select(r => r.Column)];
        // A hinge turns first about its own axis; the two others are there to show what it cannot hold.
        var axes = string.Concat(joint.Rotations.Select(r => r.Axis));
        Order = EulerOrders.TryParse(axes + string.Concat("XYZ".Except(axes)), out var order)
            ? order
            : throw new ArgumentException($"{axes} are no axes of a track", nameof(joint));
        var angles = new EulerAngles[motion.Frames];
        var samples = new Quat[motion.Frames];
        Convert(angles, samples);
        Delivered = ImmutableCollectionsMarshal.AsImmutableArray(samples);
        Runs = BvhLeaps.Find(angles, Delivered);
    }

    /// <summary>The joint's name.</summary>
    public string Name { get; }

    /// <summary>Columns of its angles: three or one.</summary>
    public ImmutableArray<int> Columns { get; }

    /// <summary>Axes of its angles.</summary>
    public EulerOrder Order { get; }

    /// <summary>One of its three angles is all it can hold.</summary>
    public bool IsHinge => Columns.Length == 1;

    /// <summary>
    /// The delivered orientations, NaN where a value is not finite; each with the sign nearest to the one before, since angles have none.
    /// </summary>
    public ImmutableArray<Quat> Delivered { get; }

    /// <summary>Runs behind leaps to another branch.</summary>
    public ImmutableArray<BvhRun> Runs { get; }

    /// <summary>Whether a joint can be a track: with two channels most orientations cannot be written, with none there are none.</summary>
    public static bool Suits(BvhJoint joint) => joint.Rotations.Length is 1 or 3;

    /// <summary>Reads all samples of a joint.</summary>
    public static BvhTrack Read(BvhJoint joint, BvhMotion motion) => new(joint, motion);

    /// <summary>The delivered angles of a frame, radians; not finite where missing.</summary>
    public EulerAngles Angles(int frame) => IsHinge
        ? EulerAngles.FromDegrees(motion[frame, Columns[0]], 0, 0)
        : EulerAngles.FromDegrees(motion[frame, Columns[0]], motion[frame, Columns[1]], motion[frame, Columns[2]]);

    /// <summary>As the stages want it.</summary>
    public JointTrack ToJointTrack() => new()
    {
        Name = Name,
        Delivered = Delivered,
        Samples = Delivered,
        HasSigns = false,
        States = ImmutableCollectionsMarshal.AsImmutableArray(new SampleState[Delivered.Length]),
    };

    /// <summary>One finding a run.</summary>
    public IEnumerable<Finding> Findings(int joint, ImmutableArray<string> names) => Runs.Select(run => new Finding
    {
        Joint = joint,
        First = run.First,
        Last = run.Last,
        Kind = FaultKind.SignFlip,
        Action = FaultAction.Flipped,
        Note = run.Leap.Mirrored ? "the angles leap to the other three that mean the same orientation" : Turned(run.Leap, names),
    });

    private string Turned(BvhBranch leap, ImmutableArray<string> names)
    {
        double[] turns = [leap.First, leap.Second, leap.Third];
        string[] leaping = [.. Columns.Where((_, k) => turns[k] != 0).Select(c => names[c][(Name.Length + 1)..])];
        return $"{string.Join(" and ", leaping)} {(leaping.Length > 1 ? "leap" : "leaps")} by whole turns: the same orientation";
    }

    private void Convert(Span<EulerAngles> angles, Span<Quat> samples)
    {
        var last = Quat.Identity;
        for (var n = 0; n < samples.Length; n++)
        {
            angles[n] = Angles(n);
            var q = Euler.ToQuat(angles[n], Order);
            if (!q.IsOrientation)
            {
                samples[n] = Quat.Missing;
                continue;
            }

            // The first sample is turned to the side of no turn, like any other to the one before it.
            last = samples[n] = Quat.Dot(last, q) < 0 ? -q : q;
        }
    }
}
