using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>The invented shooting day: a play about a lantern maker's yard that nobody ever staged.</summary>
internal static class DemoTakes
{
    /// <summary>Joints of every take, a parent before its children.</summary>
    public static readonly string[] Joints =
        ["pelvis", "thorax", "head", "upper_arm_r", "forearm_r", "hand_r", "thigh_l", "shank_l", "foot_l"];

    /// <summary>Index of each joint's parent.</summary>
    public static readonly int[] Parents = [-1, 0, 1, 1, 3, 4, 0, 6, 7];

    /// <summary>Bone vectors from the parent, centimetres.</summary>
    public static readonly Vec3[] Bones =
    [
        new(0, 96, 0), new(0, 28, 0), new(0, 30, 2), new(-18, 20, 0), new(-29, 0, 0), new(-26, 0, 0), new(9, -4, 0), new(0, -42, 0), new(0, -41, 3),
    ];

    /// <summary>What is shot, in order of the day.</summary>
    public static readonly DemoTake[] All =
    [
        new("yard/lantern-walk_01.csv", 120, 720, 1, "14:02:10:00", Faults: new()
        {
            ["hand_r"] = ["spike", "gap", "sign-flip"],
            ["foot_l"] = ["off-unit", "freeze"],
            ["head"] = ["sign-flip", "zeros"],
        }),
        new("yard/ladder-duel_02.csv", 120, 720, 3, "14:09:41:12", Faults: new()
        {
            ["hand_r"] = ["spike", "spike", "spike"],
            ["forearm_r"] = ["offset", "spike"],
            ["shank_l"] = ["step"],
            ["thorax"] = ["gap", "spike"],
        }),
        new("yard/roof-drop_03.csv", 120, 600, 2, "14:21:05:00", Faults: new()
        {
            ["hand_r"] = ["long-gap"],
            ["forearm_r"] = ["long-gap"],
            ["pelvis"] = ["gap"],
            ["foot_l"] = ["freeze", "spike"],
        }),
        new("shed/oil-pour_01.csv", 60, 420, 0.5, "15:12:00:00", Faults: new() { ["hand_r"] = ["freeze", "spike"] }, LostAt: 212, LostFrames: 9),
        new("shed/quiet-hold_02.csv", 120, 480, 0.1, "15:20:30:00", Faults: []),
        new("shed/lid-swing_03.bvh", 120, 600, 1.2, "15:31:44:06", Faults: new()
        {
            ["hand_r"] = ["spike", "spike"],
            ["forearm_r"] = ["offset"],
            ["head"] = ["step"],
        }),
    ];
}

/// <summary>A take of the invented day.</summary>
/// <param name="Name">Relative path.</param>
/// <param name="Rate">Frames per second.</param>
/// <param name="Frames">Number of frames.</param>
/// <param name="Liveliness">How far and fast joints move.</param>
/// <param name="TimeCode">Address of frame 0 at 24 frames a second.</param>
/// <param name="Faults">Kinds by joint.</param>
/// <param name="LostAt">Frame before which time was lost; 0 for none.</param>
/// <param name="LostFrames">How many frames.</param>
internal sealed record DemoTake(
    string Name, double Rate, int Frames, double Liveliness, string TimeCode, Dictionary<string, string[]> Faults, int LostAt = 0, int LostFrames = 0);
