using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Bvh;

public sealed class BvhWriteTests
{
    [Fact]
    public void Only_the_rotation_values_of_changed_samples_differ()
    {
        var text = (BvhTakes.OneJoint + "\n" + BvhTakes.Motion(
            "1.50 -0 3e0\t10 20 30  ", "  1.51 -0\t3e0 11 21.0 +31 ", "1.52 -0 3e0 12 22 32")).Replace("\n", "\r\n");
        var file = BvhTakes.Read(text);
        var moved = Euler.ToQuat(EulerAngles.FromDegrees(11.5, 21.25, 31.125), EulerOrder.ZYX);
        var written = BvhTakes.Written(file, file.Take.With(1, moved));
        Assert.Equal(text.Replace("11 21.0 +31", "11.5000000000 21.2500000000 31.1250000000"), written);
    }

    [Theory]
    [InlineData("XYZ")]
    [InlineData("XZY")]
    [InlineData("YXZ")]
    [InlineData("YZX")]
    [InlineData("ZXY")]
    [InlineData("ZYX")]
    public void Changed_samples_are_written_within_1e_9_degrees_in_any_order(string order)
    {
        var rows = Enumerable.Range(0, 200).Select(n => $"{n * 1.7} {(n - 100) * 0.99} {-n * 2.3}").ToArray();
        var file = BvhTakes.Read(BvhTakes.WithChannels(string.Join(' ', order.Select(a => $"{a}rotation")), rows));
        var nudge = RotationVector.Exp(new Vec3(0.01, -0.02, 0.015));
        var cleaned = file.Take.With(0, n => nudge * file.Take.Tracks[0].Samples[n]);
        var again = BvhTakes.Read(BvhTakes.Written(file, cleaned)).Take.Tracks[0].Samples;
        for (var n = 0; n < rows.Length; n++)
        {
            Assert.InRange(Angle.ToDegrees(Angle.Between(cleaned.Tracks[0].Samples[n], again[n])), 0, 1e-9);
        }
    }

    [Fact]
    public void A_sample_that_moves_little_keeps_its_branch_and_whole_turns()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("740 100 -365", "741 100 -365", "742 100 -365"));
        var nudged = RotationVector.Exp(new Vec3(0, 0, 0.001)) * file.Take.Tracks[0].Samples[1];
        var row = BvhTakes.Numbers(BvhTakes.Rows(BvhTakes.Written(file, file.Take.With(1, nudged)))[1]);
        Assert.Equal(741 + (0.001 * 180 / Math.PI), row[0], 1e-9);
        Assert.Equal(100, row[1], 1e-9);
        Assert.Equal(-365, row[2], 1e-9);
    }

    [Fact]
    public void A_mended_spike_and_a_filled_gap_follow_the_angles_before_them()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("nan 0 0", "720 1 2", "900 45 -90", "nan 3 4", "723 1 2"));
        var mend = Euler.ToQuat(EulerAngles.FromDegrees(1, 1, 2), EulerOrder.ZYX);
        var cleaned = file.Take.With(0, n => n is 0 or 2 or 3 ? mend : null);
        var rows = BvhTakes.Rows(BvhTakes.Written(file, cleaned));
        Assert.Equal("720 1 2", rows[1]);
        foreach (var n in new[] { 0, 2, 3 })
        {
            Assert.Equal("721.0000000000 1.0000000000 2.0000000000", rows[n]);
        }
    }

    [Fact]
    public void Smoothed_samples_that_pass_the_lock_make_no_leap_where_the_delivered_ones_jump_over_it()
    {
        // Delivered: from 87 degrees to 94.5, written as the other three angles, a turn too wide to be called a leap. Cleaned: steps of 2.
        double[] delivered = [81, 83, 85, 87, 85.5, 84, 82, 81];
        double[] cleaned = [81, 83, 85, 87, 89, 91, 93, 95];
        var file = BvhTakes.Read(BvhTakes.Zyx([.. delivered.Select((b, n) => n < 4 ? $"10 {b} 20" : $"-170 {b} -160")]));
        var through = cleaned.Select(b => Euler.ToQuat(EulerAngles.FromDegrees(10.1, b, 20), EulerOrder.ZYX)).ToArray();
        var rows = BvhTakes.Rows(BvhTakes.Written(file, file.Take.With(0, n => through[n]))).Select(BvhTakes.Numbers).ToArray();
        for (var n = 0; n < rows.Length; n++)
        {
            Assert.Equal([10.1, cleaned[n], 20], rows[n].Select(a => Math.Round(a, 8)));
        }
    }

    [Fact]
    public void The_other_sign_of_a_sample_is_the_same_text()
    {
        var text = BvhTakes.Zyx("1 2 3", "4 5 6");
        var file = BvhTakes.Read(text);
        Assert.Equal(text, BvhTakes.Written(file, file.Take.With(0, n => -file.Take.Tracks[0].Samples[n])));
    }

    [Fact]
    public void A_delivered_value_is_never_deleted()
    {
        var text = BvhTakes.Zyx("1 2 3", "4 5 6");
        var file = BvhTakes.Read(text);
        Assert.Equal(text, BvhTakes.Written(file, file.Take.With(1, Quat.Missing)));
    }

    [Fact]
    public void A_hinge_is_written_by_its_one_angle_and_refuses_any_other_turn()
    {
        var file = BvhTakes.Read(BvhTakes.WithChannels("Yposition Xrotation", "9 170", "9 190", "9 nan"));
        var turned = Euler.ToQuat(EulerAngles.FromDegrees(191, 0, 0), EulerOrder.XYZ);
        Assert.Equal(["9 170", "9 191.0000000000", "9 191.0000000000"], BvhTakes.Rows(BvhTakes.Written(file, file.Take.With(0, n => n > 0 ? turned : null))));
        var aside = RotationVector.Exp(new Vec3(0, 0.1, 0));
        var error = Assert.Throws<ArgumentException>(() => BvhTakes.Written(file, file.Take.With(1, aside)));
        Assert.Contains("'Hips'", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_take_of_other_joints_or_frames_is_refused()
    {
        var file = BvhTakes.Read(BvhTakes.Zyx("1 2 3", "4 5 6"));
        var shorter = BvhTakes.Read(BvhTakes.Zyx("1 2 3")).Take;
        Assert.Throws<ArgumentException>(() => BvhTakes.Written(file, shorter));
        Assert.Throws<ArgumentException>(() => BvhTakes.Written(file, file.Take with { Tracks = [] }));
    }

    [Fact]
    public void Lines_beyond_the_stated_frames_are_carried_with_a_note()
    {
        var text = BvhTakes.Zyx("0 0 0", "1 0 0", "2 0 0").Replace("Frames: 3", "Frames: 2", StringComparison.Ordinal);
        var file = BvhTakes.Read(text);
        Assert.Equal(2, file.Take.Length);
        Assert.Contains("1 line of values more", Assert.Single(file.Take.Notes), StringComparison.Ordinal);
        Assert.Equal(text, BvhTakes.Written(file, file.Take));
    }

    [Fact]
    public void A_leap_that_was_left_stays_as_delivered()
    {
        var text = BvhTakes.Zyx("178 0 0", "179 0 0", "-180 0 0", "-179 0 0", "-178 0 0", "-177 0 0");
        var file = BvhTakes.Read(text);
        var leap = Assert.Single(file.Take.Findings);
        Assert.NotEqual(text, BvhTakes.Written(file, file.Take));
        var left = file.Take with { Findings = [leap with { Action = MocapClean.Core.Takes.FaultAction.Noted }] };
        Assert.Equal(text, BvhTakes.Written(file, left));
    }
}
