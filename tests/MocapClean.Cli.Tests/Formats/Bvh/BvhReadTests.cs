using System.Text;
using MocapClean.Cli.Formats;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Bvh;

public sealed class BvhReadTests
{
    /// <summary>Expected values: SciPy 1.10.1, Rotation.from_euler with capital letters, angles -75, 35, 160 degrees.</summary>
    [Theory]
    [InlineData("XYZ", 0.31166523551314296, 0.13412388047066237, 0.6131922290270517, 0.7133518458102316)]
    [InlineData("XZY", -0.048888821421556844, -0.3357593148074712, 0.7769272540517153, -0.5303391439180123)]
    [InlineData("YXZ", -0.048888821421556844, -0.5303391439180123, -0.3357593148074712, 0.7769272540517153)]
    [InlineData("YZX", 0.31166523551314296, 0.7133518458102316, 0.13412388047066237, 0.6131922290270517)]
    [InlineData("ZXY", 0.31166523551314296, 0.6131922290270517, 0.7133518458102316, 0.13412388047066237)]
    [InlineData("ZYX", -0.048888821421556844, 0.7769272540517153, -0.5303391439180123, -0.3357593148074712)]
    public void Channels_turn_in_the_order_listed_wherever_positions_stand(string order, double w, double x, double y, double z)
    {
        var expected = new Quat(w, x, y, z);
        var r = order.Select(a => $"{a}rotation").ToArray();
        var alone = BvhTakes.Read(BvhTakes.WithChannels(string.Join(' ', r), "-75 35 160"));
        var mixed = BvhTakes.Read(BvhTakes.WithChannels($"{r[0]} Zposition {r[1]} Xposition Yposition {r[2]}", "-75 1 35 2 3 160"));
        foreach (var file in new[] { alone, mixed })
        {
            Assert.InRange(Angle.ToDegrees(Angle.Between(expected, file.Take.Tracks[0].Samples[0])), 0, 1e-10);
        }

        Assert.Equal(["2"], mixed.Column("Hips Xposition"));
        Assert.Equal(["1"], mixed.Column("Hips Zposition"));
    }

    [Fact]
    public void A_joint_with_one_rotation_channel_turns_about_its_axis()
    {
        var q = BvhTakes.Read(BvhTakes.WithChannels("Yrotation", "90", "-90", "0")).Take.Tracks[0].Samples;
        // Half of 90 degrees: cos and sin are both 0.7071067811865476.
        Assert.Equal(0.7071067811865476, q[0].W, 1e-15);
        Assert.Equal(0.7071067811865476, q[0].Y, 1e-15);
        Assert.Equal(-0.7071067811865476, q[1].Y, 1e-15);
        Assert.Equal(0, Math.Abs(q[0].X) + Math.Abs(q[0].Z));
    }

    [Fact]
    public void Any_layout_in_use_is_read()
    {
        var plain = "HIERARCHY\nROOT Hips\n{\nOFFSET 0 0 0\nCHANNELS 3 Zrotation Yrotation Xrotation\nJOINT Left Arm\n{\nOFFSET .5 -0 1e-3\n"
            + "CHANNELS 3 Zrotation Yrotation Xrotation\nEnd Site\n{\nOFFSET 0 1 0\n}\n}\n}\nMOTION\nFrames: 2\nFrame Time: .0083333\n"
            + ".5 -0 1e1 0 5. +7\n1 2 3 4 5 6\n";
        var expected = BvhTakes.Read(plain).Take;
        Assert.Equal(["Hips", "Left Arm"], expected.Tracks.Select(t => t.Name));
        Assert.Equal(120, expected.Clock.Rate);
        Assert.Equal(new Vec3(0.5, 0, 0.001), expected.Skeleton!.Bones[1].Vector);
        string[] others =
        [
            plain.Replace("\n", "\r\n"),
            plain.Replace("\n", "\r"),
            plain.Replace("\n", " \t\n\n"),
            plain.Replace(" ", "\t").Replace("Left\tArm", "Left Arm").Replace("Frame\tTime", "Frame Time"),
            plain.Replace("\n{\n", " {").Replace("\n}\n", " }\n"),
            plain.ToUpperInvariant().Replace("HIPS", "Hips").Replace("LEFT ARM", "Left Arm"),
            plain.Replace("Frames: 2", "  Frames :2 ").TrimEnd(),
            "\uFEFF" + plain,
        ];
        foreach (var text in others)
        {
            var take = BvhTakes.Read(text).Take;
            Assert.Equal(expected.Tracks.Select(t => t.Name), take.Tracks.Select(t => t.Name));
            Assert.Equal(expected.Tracks[1].Samples.AsSpan(), take.Tracks[1].Samples.AsSpan());
            Assert.Equal(expected.Skeleton.Bones.AsSpan(), take.Skeleton!.Bones.AsSpan());
            Assert.Equal(text, BvhTakes.Unchanged(text));
        }
    }

    [Fact]
    public void Joints_that_never_turn_are_carried_and_hand_their_bone_vectors_on()
    {
        var text = """
            HIERARCHY
            ROOT Place { OFFSET 1 0 0 CHANNELS 3 Xposition Yposition Zposition
              JOINT Hips { OFFSET 0 2 0 CHANNELS 3 Zrotation Yrotation Xrotation
                JOINT Plate { OFFSET 0 0 3
                  JOINT Leg { OFFSET 4 0 0 CHANNELS 1 Xrotation
                    End Site { OFFSET 0 -5 0 } } } } }
            ROOT Prop { OFFSET 7 7 7 CHANNELS 3 Xrotation Yrotation Zrotation }
            """ + "\n" + BvhTakes.Motion("0 0 0 1 2 3 4 5 6 7");
        var take = BvhTakes.Read(text).Take;
        Assert.Equal(["Hips", "Leg", "Prop"], take.Tracks.Select(t => t.Name));
        Assert.Equal(
            [new Bone("Hips", -1, new Vec3(1, 2, 0)), new Bone("Leg", 0, new Vec3(4, 0, 3)), new Bone("Prop", -1, new Vec3(7, 7, 7))],
            take.Skeleton!.Bones);
        Assert.Equal([new EndSite(0, new Vec3(0, 0, 3)), new EndSite(1, new Vec3(0, -5, 0))], take.Skeleton.EndSites);
        Assert.Empty(take.Notes);
    }

    [Fact]
    public void A_joint_with_two_rotation_channels_is_carried_and_said_so()
    {
        var text = "HIERARCHY ROOT Hips\n{ OFFSET 0 0 0 CHANNELS 3 Zrotation Yrotation Xrotation JOINT Wrist\n"
            + "{ OFFSET 1 0 0 CHANNELS 2 Zrotation Yrotation } }\n" + BvhTakes.Motion("1 2 3 4 5", "1 2 3 4.5 5");
        var file = BvhTakes.Read(text);
        Assert.Equal("Hips", Assert.Single(file.Take.Tracks).Name);
        Assert.Null(file.Take.Skeleton);
        Assert.Contains("'Wrist'", Assert.Single(file.Take.Notes), StringComparison.Ordinal);
        Assert.Equal(["4", "4.5"], file.Column("Wrist Zrotation"));
        Assert.Null(file.Column("Hips Zrotation"));
        Assert.Null(file.Column("Wrist Xrotation"));
        Assert.Equal(text, BvhTakes.Unchanged(text));
    }

    [Theory]
    [InlineData("nan")]
    [InlineData("-NaN")]
    [InlineData("inf")]
    [InlineData("-Infinity")]
    [InlineData("1.#QNAN0")]
    [InlineData("-1.#IND")]
    [InlineData("nan(ind)")]
    [InlineData("1e999")]
    public void A_text_for_no_number_is_a_missing_sample_and_stays_as_it_is(string text)
    {
        var take = BvhTakes.Zyx("10 20 30", $"10 {text} 30", "190 20 30");
        var samples = BvhTakes.Read(take).Take.Tracks[0].Samples;
        Assert.True(double.IsNaN(samples[1].W));
        Assert.True(Quat.Dot(samples[0], samples[2]) >= 0);
        Assert.Equal(take, BvhTakes.Unchanged(take));
    }

    [Fact]
    public void Reading_brings_no_sign_flips()
    {
        var rows = Enumerable.Range(0, 400).Select(n => $"{n * 7} {40 * Math.Sin(n / 9.0)} {-n * 5}").ToArray();
        var samples = BvhTakes.Read(BvhTakes.Zyx(rows)).Take.Tracks[0].Samples;
        Assert.All(samples.Zip(samples.Skip(1)), p => Assert.True(Quat.Dot(p.First, p.Second) >= 0));
    }

    [Fact]
    public void Orientations_are_relative_to_the_parent_unless_the_settings_say_otherwise()
    {
        var text = BvhTakes.Zyx("1 2 3");
        Assert.Equal(OrientationSpace.Local, BvhTakes.Read(text).Take.Space);
        var settings = new ReadSettings { Space = OrientationSpace.World };
        Assert.Equal(OrientationSpace.World, BvhTakes.Read(text, settings).Take.Space);
    }

    [Fact]
    public void The_middle_number_of_decimals_tells_how_finely_angles_are_printed()
    {
        var degrees = BvhTakes.Read(BvhTakes.Zyx("0 0.25 1", "0 0.31 -1.5", "0 0.36 1.25")).Take.TextRounding * 180 / Math.PI;
        Assert.Equal(Math.Sqrt(3) * 0.005, degrees, 1e-12);
        Assert.Equal(1e-9, BvhTakes.Read(BvhTakes.Zyx("0 0 0")).Take.TextRounding);
    }

    [Fact]
    public void The_format_is_found_by_its_ending() =>
        Assert.Equal("bvh", FormatCatalog.For("day1/FIGHT.BVH")?.Name);

    [Fact]
    public void A_name_is_carried_in_its_own_letters()
    {
        var text = BvhTakes.Zyx("1 2 3").Replace("Hips", "Hüfte_左");
        Assert.Equal("Hüfte_左", BvhTakes.Read(Encoding.UTF8.GetBytes(text)).Take.Tracks[0].Name);
    }
}
