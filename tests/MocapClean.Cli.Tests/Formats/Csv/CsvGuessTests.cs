using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Csv;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

public sealed class CsvGuessTests
{
    [Theory]
    [InlineData("hand_r.qw", "{joint}.{component}", "qw qx qy qz", "hand_r hand_l spine1")]
    [InlineData("hand_r_qw", "{joint}_{component}", "qw qx qy qz", "hand_r hand_l spine1")]
    [InlineData("hand_r_QW", "{joint}_{component}", "QW QX QY QZ", "hand_r hand_l spine1")]
    [InlineData("qw_hand_r", "{component}_{joint}", "qw qx qy qz", "hand_r hand_l spine1")]
    [InlineData("hand_r rotation W", "{joint} rotation {component}", "W X Y Z", "hand_r hand_l spine1")]
    [InlineData("hand_r:Rotation.W", "{joint}:Rotation.{component}", "W X Y Z", "hand_r hand_l spine1")]
    [InlineData("hand_r (quat w)", "{joint} (quat {component})", "w x y z", "hand_r hand_l spine1")]
    [InlineData("Rot[W] of hand_r", "Rot[{component}] of {joint}", "W X Y Z", "hand_r hand_l spine1")]
    [InlineData("Quat.hand_r.w", "{joint}.{component}", "w x y z", "Quat.hand_r Quat.hand_l Quat.spine1")]
    [InlineData("hand_rQw", "{joint}{component}", "Qw Qx Qy Qz", "hand_r hand_l spine1")]
    [InlineData("hand_rqw", "{joint}{component}", "qw qx qy qz", "hand_r hand_l spine1")]
    [InlineData("hand_r/w", "{joint}/{component}", "w x y z", "hand_r hand_l spine1")]
    [InlineData("hand_r.w [1]", "{joint}.{component} [1]", "w x y z", "hand_r hand_l spine1")]
    public void Naming_is_found_from_the_columns_that_differ_in_one_letter(string name, string pattern, string components, string joints)
    {
        var letters = name.Contains('W', StringComparison.Ordinal) ? "XYZW" : "xyzw";
        var places = name.LastIndexOf(letters[3]);
        var columns = new[] { "hand_r", "hand_l", "spine1" }.SelectMany(j => letters.Select(c =>
            (name[..places] + c + name[(places + 1)..]).Replace("hand_r", j, StringComparison.Ordinal)));
        var header = string.Join(';', columns.Prepend("Time (s)").Append("contact"));
        var row = string.Join(';', Enumerable.Repeat("0,5;-0,5;0,5;0,5", 3));
        var text = $"Some title\n{header}\n0;{row};1\n0,01;{row};1\n";

        var guess = CsvGuess.From(Table.Source(Table.Bytes(text)));

        Assert.NotNull(guess);
        Assert.Equal(
            ("wide", pattern, components, "Time (s)", joints, ';', 2, true),
            (guess.Layout, guess.JointColumns, string.Join(' ', guess.Components), guess.Time, string.Join(' ', guess.Joints),
                guess.Separator, guess.HeaderLine, guess.DecimalComma));
        Assert.False(guess.NeedsRate);
        Assert.Empty(guess.Notes);
        var read = Table.Read(text, guess.ApplyTo(new ReadSettings()));
        Assert.Equal(guess.Joints, read.Take.Tracks.Select(t => t.Name));
        Assert.Equal(-0.5, read.Take.Tracks[2].Samples[1].Y);
    }

    [Fact]
    public void One_joint_without_a_name_has_a_pattern_without_joint()
    {
        var guess = CsvGuess.From(Table.Source(Table.Bytes("timestamp,qw,qx,qy,qz\n0,1,0,0,0\n0.1,1,0,0,0\n")));

        Assert.Equal("layout: wide, joint-columns: \"{component}\", components: [qw, qx, qy, qz], time: \"timestamp\"", guess?.Settings);
    }

    [Theory]
    [InlineData("joint,frame,qw,qx,qy,qz\na,0,1,0,0,0\nb,0,1,0,0,0\n", "layout: long, components: [qw, qx, qy, qz]", true, 1)]
    [InlineData("time,joint,w,x,y,z\n0,a,1,0,0,0\n0,b,1,0,0,0\n0.1,a,1,0,0,0\n", "layout: long, components: [w, x, y, z]", false, 0)]
    [InlineData("time,Bone,w,x,y,z\n0,a,1,0,0,0\n0,b,1,0,0,0\n0.1,a,1,0,0,0\n", "layout: long, components: [w, x, y, z]", false, 1)]
    public void A_column_that_names_joints_is_a_long_table(string text, string settings, bool needsRate, int notes)
    {
        var guess = CsvGuess.From(Table.Source(Table.Bytes(text)));

        Assert.Equal((settings, needsRate, notes), (guess!.Settings, guess.NeedsRate, guess.Notes.Length));
    }

    [Theory]
    [InlineData("frame,a.w,a.x,a.y,a.z\n0,1,0,0,0\n1,1,0,0,0\n", "No column counts seconds, but 'frame' counts frames: set ingest.rate.")]
    [InlineData("time_ms,a.w,a.x,a.y,a.z\n0,1,0,0,0\n8.5,1,0,0,0\n", "Column 'time_ms' steps by 8.5, so it hardly counts seconds.")]
    [InlineData("Timecode,a.w,a.x,a.y,a.z\n00:01,1,0,0,0\n00:02,1,0,0,0\n", "No column counts seconds: set ingest.rate.")]
    [InlineData("time,a.w,a.x,a.y,a.z\n00:01,1,0,0,0\n00:02,1,0,0,0\n", "Column 'time' holds no plain numbers of seconds.")]
    public void Without_seconds_a_rate_is_asked_for(string text, string note)
    {
        var guess = CsvGuess.From(Table.Source(Table.Bytes(text)));

        Assert.True(guess!.NeedsRate);
        Assert.Contains(note, guess.Notes);
    }

    [Fact]
    public void A_decimal_comma_in_the_times_alone_is_seen()
    {
        var guess = CsvGuess.From(Table.Source(Table.Bytes("time;a_QW;a_QX;a_QY;a_QZ\n0;1;0;0;0\n0,01;1;0;0;0\n")));

        Assert.Equal(("time", true), (guess!.Time, guess.DecimalComma));
        Assert.Empty(guess.Notes);
    }

    [Fact]
    public void Numbered_components_are_taken_with_w_first_and_said_so()
    {
        var guess = CsvGuess.From(Table.Source(Table.Bytes("time,a_q0,a_q1,a_q2,a_q3\n0,1,0,0,0\n0.1,1,0,0,0\n")));

        Assert.Equal(["q0", "q1", "q2", "q3"], guess!.Components);
        Assert.Contains("taken for w", Assert.Single(guess.Notes), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("time,a.x,a.y,a.z\n0,1,0,0\n0.1,1,0,0\n")]
    [InlineData("time,a.w,a.x,a.y,a.z\n0,100,20,30,50\n0.1,100,20,30,50\n")]
    [InlineData("0.0,0.1,0.2,0.3\n1.0,1.1,1.2,1.3\n")]
    [InlineData("nothing of the kind")]
    public void What_is_no_orientation_is_not_taken_for_one(string text) =>
        Assert.Null(CsvGuess.From(Table.Source(Table.Bytes(text))));

    [Fact]
    public void Numbers_of_length_one_decide_between_two_readings()
    {
        const string Text = "time,p.w,p.x,p.y,p.z,b:w,b:x,b:y,b:z\n0,9,8,7,6,0,1,0,0\n0.1,9,8,7,6,0,1,0,0\n";

        Assert.Equal("{joint}:{component}", CsvGuess.From(Table.Source(Table.Bytes(Text)))?.JointColumns);
    }
}
