using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Bvh;

public sealed class BvhLeapTests
{
    [Fact]
    public void A_leap_by_a_whole_turn_is_one_row_to_the_end_and_is_brought_back_with_its_digits()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("177.25 1 2", "178.5 1 2", "179.75 1 2", "-179.00 1 2", "-177.750 1 2"));
        var row = Assert.Single(file.Take.Findings);
        Assert.Equal((0, 3, 4, FaultKind.SignFlip, FaultAction.Flipped), (row.Joint, row.First, row.Last, row.Kind, row.Action));
        Assert.Equal("Zrotation leaps by whole turns: the same orientation", row.Note);
        Assert.Equal(
            ["177.25 1 2", "178.5 1 2", "179.75 1 2", "181.00 1 2", "182.250 1 2"], BvhTakes.Rows(BvhTakes.Written(file, file.Take)));
    }

    [Fact]
    public void A_leap_ends_where_it_leaps_back()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("0 0 179", "0 0 179.5", "0 0 -179.9", "0 0 -179.8", "0 0 179.6", "0 0 179"));
        var row = Assert.Single(file.Take.Findings);
        Assert.Equal((2, 3), (row.First, row.Last));
        Assert.Equal(
            ["0 0 179", "0 0 179.5", "0 0 180.1", "0 0 180.2", "0 0 179.6", "0 0 179"], BvhTakes.Rows(BvhTakes.Written(file, file.Take)));
    }

    [Fact]
    public void The_other_three_angles_of_an_orientation_are_a_leap()
    {
        // The joint passes through the lock at 90 degrees; the delivered middle angle turns round there, and the others leap.
        string[] smooth = ["10 84 20", "10 87 20", "10 89 20", "10 91 20", "10 93 20", "10 95 20"];
        var file = BvhTakes.Read(BvhTakes.Zyx([.. smooth[..3], "-170 89 -160", "-170 87 -160", "-170 85 -160"]));
        var row = Assert.Single(file.Take.Findings);
        Assert.Equal((3, 5), (row.First, row.Last));
        Assert.Equal("the angles leap to the other three that mean the same orientation", row.Note);
        Assert.Equal(smooth, BvhTakes.Rows(BvhTakes.Written(file, file.Take)));
    }

    [Fact]
    public void Turn_upon_turn_gives_one_row_each()
    {
        var angles = Enumerable.Range(0, 300).Select(n => n * 5.0).ToArray();
        var file = BvhTakes.Read(BvhTakes.Zyx([.. angles.Select(a => $"3 {(a + 180) % 360 - 180} 4").Select(Swap)]));
        Assert.Equal(4, file.Take.Findings.Length);
        Assert.Equal([(36, 107), (108, 179), (180, 251), (252, 299)], file.Take.Findings.Select(f => (f.First, f.Last)));
        Assert.Equal(angles, BvhTakes.Rows(BvhTakes.Written(file, file.Take)).Select(r => BvhTakes.Numbers(r)[0]));

        static string Swap(string row) => string.Join(' ', row.Split(' ')[1], row.Split(' ')[0], row.Split(' ')[2]);
    }

    [Fact]
    public void A_leap_is_seen_across_missing_frames()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("0 178 0", "0 179 0", "0 nan 0", "0 -179 0", "nan 0 0"));
        var row = Assert.Single(file.Take.Findings);
        Assert.Equal((3, 4), (row.First, row.Last));
        Assert.Equal(["0 178 0", "0 179 0", "0 nan 0", "0 181 0", "nan 0 0"], BvhTakes.Rows(BvhTakes.Written(file, file.Take)));
    }

    [Fact]
    public void A_changed_sample_behind_a_leap_is_written_on_the_branch_before_it()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("178 0 0", "179 0 0", "-179 0 0", "-178 0 0"));
        var moved = RotationVector.Exp(new Vec3(0, 0, 181.5 * Math.PI / 180));
        Assert.Equal(
            ["178 0 0", "179 0 0", "181.5000000000 0.0000000000 0.0000000000", "182 0 0"],
            BvhTakes.Rows(BvhTakes.Written(file, file.Take.With(2, moved))).Select(r => r.Replace("-0.0", "0.0")));
    }

    [Theory]
    // A fast turn, a jump of half a turn and back, a step.
    [InlineData("0 0 0", "60 0 0", "160 0 0", "270 0 0", "370 0 0")]
    [InlineData("0 0 0", "1 0 0", "181 0 0", "2 0 0", "3 0 0")]
    [InlineData("0 0 0", "1 0 0", "200 0 0", "201 0 0", "202 0 0")]
    // A pose in front of the motion, in another convention of whole turns.
    [InlineData("0 0 0", "350 4 5", "350.5 4 5", "351 4 5", "351.5 4 5")]
    // Past the lock on one side: two angles swing, the orientation goes on.
    [InlineData("0 70 0", "10 80 10", "60 86 60", "120 86 120", "170 80 170")]
    // A fault of the data that jumps by nearly a whole turn in one angle and turns the joint as well.
    [InlineData("0 0 0", "0 0 0", "320 40 0", "320 40 0", "320 40 0")]
    public void Motion_and_faults_of_the_data_are_no_leaps(params string[] rows)
    {
        var text = BvhTakes.Zyx(rows);
        Assert.Empty(BvhTakes.Read(text).Take.Findings);
        Assert.Equal(text, BvhTakes.Unchanged(text));
    }

    [Fact]
    public void Angles_beyond_any_sense_are_left_alone()
    {
        var text = BvhTakes.Zyx("0 0 0", "1e300 0 0", "0 -1e300 1e15", "1 0 0");
        Assert.Equal(text, BvhTakes.Unchanged(text));
        var file = BvhTakes.Read(text);
        var written = BvhTakes.Written(file, file.Take.With(0, _ => Quat.Identity));
        Assert.All(BvhTakes.Rows(written), r => Assert.InRange(BvhTakes.Numbers(r).Max(Math.Abs), 0, 360));
    }
}
