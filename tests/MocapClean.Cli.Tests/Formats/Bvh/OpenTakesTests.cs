using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Bvh;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Bvh;

/// <summary>Expected values: Data/bvh.json, made outside this program.</summary>
public sealed class OpenTakesTests
{
    public static TheoryData<string> Names => ["01_01.bvh", "01_03.bvh"];

    [Theory]
    [MemberData(nameof(Names))]
    public void Hierarchy_and_motion_hold_what_is_known_of_them(string name)
    {
        var (bytes, known) = (OpenTakes.Bytes(name), OpenTakes.Known(name));
        Assert.Equal(known.GetProperty("sha256").GetString(), Convert.ToHexStringLower(SHA256.HashData(bytes)));
        var words = new BvhWords(new TakeSource(name, bytes), 0);
        var hierarchy = new BvhHierarchyReader(words).Read();
        var motion = new BvhMotionReader(new TakeSource(name, bytes), hierarchy.Columns).Read(words.Position, words.Line);
        Assert.Equal(known.GetProperty("names").EnumerateArray().Select(n => n.GetString()), hierarchy.Joints.Select(j => j.Name));
        Assert.Equal(known.GetProperty("parents").EnumerateArray().Select(n => n.GetInt32()), hierarchy.Joints.Select(j => j.Parent));
        Assert.Equal(known.GetProperty("end-sites").GetInt32(), hierarchy.Ends.Length);
        Assert.Equal(known.GetProperty("channels").GetInt32(), motion.Columns);
        Assert.Equal(known.GetProperty("frames").GetInt32(), motion.Frames);
        Assert.Equal(double.Parse(known.GetProperty("frame-time-text").GetString()!), motion.FrameTime);
        Assert.Equal(known.GetProperty("sum-of-all-motion-values").GetDouble(), motion.Values.Sum(), 1e-6);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void The_take_runs_at_120_frames_a_second_in_parent_space(string name)
    {
        var take = BvhTakes.Read(OpenTakes.Bytes(name)).Take;
        Assert.Equal(120, take.Clock.Rate);
        Assert.Equal(31, take.Tracks.Length);
        Assert.Equal(OrientationSpace.Local, take.Space);
        Assert.Empty(take.Notes);
        // Four decimals; three angles of half a unit each.
        Assert.Equal(Math.Sqrt(3) * 0.00005 * Math.PI / 180, take.TextRounding, 1e-15);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Joints_and_end_sites_stand_where_they_should(string name)
    {
        var file = BvhTakes.Read(OpenTakes.Bytes(name));
        foreach (var pose in OpenTakes.Known(name).GetProperty("poses").EnumerateArray())
        {
            var frame = pose.GetProperty("frame").GetInt32();
            double[] root = [.. "XYZ".Select(a => double.Parse(file.Column($"Hips {a}position")![frame]))];
            var (joints, ends) = Chain.Positions(file.Take, frame, root);
            AssertPositions(pose.GetProperty("world-positions"), joints);
            AssertPositions(pose.GetProperty("end-sites"), ends);
        }
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Samples_are_the_known_local_orientations(string name)
    {
        var take = BvhTakes.Read(OpenTakes.Bytes(name)).Take;
        foreach (var pose in OpenTakes.Known(name).GetProperty("poses").EnumerateArray())
        {
            foreach (var joint in pose.GetProperty("local-quaternions").EnumerateObject())
            {
                var q = joint.Value.Doubles();
                var sample = take.Tracks.Single(t => t.Name == joint.Name).Samples[pose.GetProperty("frame").GetInt32()];
                Assert.InRange(Angle.ToDegrees(Angle.Between(new Quat(q[0], q[1], q[2], q[3]), sample)), 0, 1e-10);
            }
        }
    }

    [Fact]
    public void A_take_without_leaps_comes_back_to_the_byte()
    {
        var bytes = OpenTakes.Bytes("01_01.bvh");
        var file = BvhTakes.Read(bytes);
        Assert.Empty(file.Take.Findings);
        Assert.Equal(Encoding.UTF8.GetString(bytes), BvhTakes.Written(file, file.Take));
    }

    [Fact]
    public void A_take_with_leaps_changes_in_their_runs_alone_and_keeps_every_orientation()
    {
        var bytes = OpenTakes.Bytes("01_03.bvh");
        var file = BvhTakes.Read(bytes);
        var leaping = file.Take.Findings.Select(f => file.Take.Tracks[f.Joint].Name).Distinct().Order(StringComparer.Ordinal);
        // By eye: angles of these joints pass 180 degrees and go on at -180, or back.
        Assert.Equal(["LeftArm", "RThumb", "RightArm", "RightFingerBase"], leaping);
        // The first at frame 2183, where 151.2 -77.7 -176.4 is followed by 165.9 -77.1 167.0.
        Assert.Equal(2183, file.Take.Findings.First(f => file.Take.Tracks[f.Joint].Name == "LeftArm").First);
        var again = BvhTakes.Read(BvhTakes.Written(file, file.Take)).Take;
        Assert.Empty(again.Findings);
        for (var j = 0; j < again.Tracks.Length; j++)
        {
            var (was, now) = (file.Take.Tracks[j].Samples, again.Tracks[j].Samples);
            var inside = file.Take.Findings.Where(f => f.Joint == j).ToList();
            Assert.InRange(Angle.ToDegrees(was.Zip(now, Angle.Between).Max()), 0, 1e-9);
            var changed = Enumerable.Range(0, was.Length).Where(n => !was[n].Equals(now[n]));
            Assert.DoesNotContain(changed, n => !inside.Exists(f => f.First <= n && n <= f.Last));
        }
    }

    private static void AssertPositions(JsonElement expected, Dictionary<string, double[]> found)
    {
        Assert.Equal(expected.EnumerateObject().Count(), found.Count);
        foreach (var joint in expected.EnumerateObject())
        {
            var (e, f) = (joint.Value.Doubles(), found[joint.Name]);
            Assert.InRange(Enumerable.Range(0, 3).Max(k => Math.Abs(e[k] - f[k])), 0, 1e-9);
        }
    }
}
