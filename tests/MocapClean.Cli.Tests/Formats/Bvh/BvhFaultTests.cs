using System.Text;
using MocapClean.Cli.Formats;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Bvh;

/// <summary>Takes that cannot be processed: one clear line each.</summary>
public sealed class BvhFaultTests
{
    private const string Good = "HIERARCHY\nROOT Hips\n{\n OFFSET 0 0 0\n CHANNELS 3 Zrotation Yrotation Xrotation\n}\n"
        + "MOTION\nFrames: 2\nFrame Time: 0.01\n1 2 3\n4 5 6\n";

    [Fact]
    public void The_take_that_the_others_are_made_of_is_good() => Assert.Equal(2, BvhTakes.Read(Good).Take.Length);

    [Theory]
    [InlineData("HIERARCHY", "HEADER", "line 1: found 'HEADER', expected HIERARCHY")]
    [InlineData("ROOT", "JOINT", "line 2: found 'JOINT', expected ROOT")]
    [InlineData("ROOT Hips\n{", "ROOT\n{", "line 3: found no name, expected the name of a joint")]
    [InlineData("Hips\n{", "Hips\n", "line 4: found 'OFFSET', expected {")]
    [InlineData(" OFFSET 0 0 0\n", "", "line 5, joint 'Hips': found '}', expected OFFSET, JOINT, End Site or }")]
    [InlineData("OFFSET 0 0 0", "OFFSET 0 0", "line 5, joint 'Hips': found 'CHANNELS', expected a number (OFFSET x y z)")]
    [InlineData("OFFSET 0 0 0", "OFFSET 0 nan 0", "line 4, joint 'Hips': found 'nan', expected a number (OFFSET x y z)")]
    [InlineData("OFFSET 0 0 0", "OFFSET 0 0 0 0", "line 4, joint 'Hips': found '0', expected CHANNELS, JOINT, End Site or }")]
    [InlineData("CHANNELS 3", "CHANNELS x", "line 5, joint 'Hips': found 'x', expected a number of channels from 0 to 6")]
    [InlineData("CHANNELS 3", "CHANNELS 7", "line 5, joint 'Hips': found '7', expected a number of channels from 0 to 6")]
    [InlineData("CHANNELS 3", "CHANNELS -1", "line 5, joint 'Hips': found '-1', expected a number of channels from 0 to 6")]
    [InlineData("CHANNELS 3", "CHANNELS 2", "line 5, joint 'Hips': found 'Xrotation', expected JOINT, End Site or }")]
    [InlineData("CHANNELS 3", "CHANNELS 4", "line 6, joint 'Hips': found '}', expected a channel (Xposition, Yposition, Zposition, Xrotation, Yrotation, Zrotation)")]
    [InlineData("Yrotation", "Wrotation", "line 5, joint 'Hips': found 'Wrotation', expected a channel (Xposition, Yposition, Zposition, Xrotation, Yrotation, Zrotation)")]
    [InlineData("Yrotation", "Zrotation", "line 5, joint 'Hips': found 'Zrotation' a second time, expected each channel once")]
    [InlineData("CHANNELS 3 Zrotation Yrotation Xrotation", "CHANNELS 0", "HIERARCHY: found no joint with three rotation channels or one, expected at least one joint that turns")]
    [InlineData(" CHANNELS 3 Zrotation Yrotation Xrotation\n", "", "HIERARCHY: found no joint with three rotation channels or one, expected at least one joint that turns")]
    [InlineData("\n}\n", "\n", "line 6, joint 'Hips': found 'MOTION', expected JOINT, End Site or }")]
    [InlineData("}\n", "}\n}\n", "line 7: found '}', expected ROOT or MOTION")]
    [InlineData("}\n", "End Site\n{\n}\n}\n", "line 8: found '}', expected OFFSET")]
    [InlineData("}\n", "End Site\n{\nOFFSET 1 2 3\nJOINT\n", "line 9: found 'JOINT', expected }")]
    [InlineData("}\n", "JOINT Hips\n{\n}\n}\n", "line 6: found a second joint 'Hips', expected a name for each joint that no other has")]
    [InlineData("MOTION\n", "", "line 7: found 'Frames:', expected ROOT or MOTION")]
    [InlineData("Frames: 2\n", "", "line 8: found 'Frame Time: 0.01', expected 'Frames:'")]
    [InlineData("Frames: 2", "Frames: 0", "line 8, Frames: found '0', expected a whole number of frames, at least 1")]
    [InlineData("Frames: 2", "Frames: -2", "line 8, Frames: found '-2', expected a whole number of frames, at least 1")]
    [InlineData("Frames: 2", "Frames: 2.5", "line 8, Frames: found '2.5', expected a whole number of frames, at least 1")]
    [InlineData("Frames: 2", "Frames:", "line 8, Frames: found '', expected a whole number of frames, at least 1")]
    [InlineData("Frames: 2", "Frames: 3", "MOTION: found 2 lines of values, expected 3, as 'Frames:' says")]
    [InlineData("Frames: 2", "Frames: 99999999999", "MOTION: found 2 lines of values, expected 99999999999, as 'Frames:' says")]
    [InlineData("Frame Time: 0.01\n", "", "line 9: found '1 2 3', expected 'Frame Time:'")]
    [InlineData("Frame Time: 0.01", "Frame Time: 0", "line 9, Frame Time: found '0', expected a number of seconds above 0 (from 1E-06 to 1000000)")]
    [InlineData("Frame Time: 0.01", "Frame Time: -0.01", "line 9, Frame Time: found '-0.01', expected a number of seconds above 0 (from 1E-06 to 1000000)")]
    [InlineData("Frame Time: 0.01", "Frame Time: inf", "line 9, Frame Time: found 'inf', expected a number of seconds above 0 (from 1E-06 to 1000000)")]
    [InlineData("Frame Time: 0.01", "Frame Time: 0,01", "line 9, Frame Time: found '0,01', expected a number of seconds above 0 (from 1E-06 to 1000000)")]
    [InlineData("4 5 6", "4 5", "row 2 (line 11): found 2 values, expected 3, one for each channel")]
    [InlineData("4 5 6", "4 5 6 7 8", "row 2 (line 11): found 5 values, expected 3, one for each channel")]
    [InlineData("4 5 6", "4 5,5 6", "row 2 (line 11), column 2 'Hips Yrotation': found '5,5', expected a number")]
    [InlineData("4 5 6", "4 0x5 6", "row 2 (line 11), column 2 'Hips Yrotation': found '0x5', expected a number")]
    [InlineData("4 5 6", "4 5\u001b[31m 6", "row 2 (line 11), column 2 'Hips Yrotation': found '5?[31m', expected a number")]
    public void A_broken_take_says_where_and_what(string good, string broken, string expected)
    {
        var at = Good.IndexOf(good, StringComparison.Ordinal);
        var text = string.Concat(Good.AsSpan(0, at), broken, Good.AsSpan(at + good.Length));
        Assert.Equal(expected, Message(Encoding.UTF8.GetBytes(text)));
    }

    [Theory]
    [InlineData("\n", "\r\n")]
    [InlineData("\n", "\r")]
    public void Lines_are_counted_however_they_end(string lf, string end)
    {
        var text = Good.Replace("4 5 6", "4 five 6").Replace(lf, end);
        Assert.Equal("row 2 (line 11), column 2 'Hips Yrotation': found 'five', expected a number", Message(Encoding.UTF8.GetBytes(text)));
    }

    [Fact]
    public void Nothing_and_not_text_are_told_apart()
    {
        Assert.Equal("found an empty file, expected HIERARCHY", Message([]));
        Assert.Equal("line 3: found the end of the file, expected HIERARCHY", Message("  \n\t\n"u8.ToArray()));
        Assert.Equal("found a zero byte at byte 1, expected text that begins with HIERARCHY", Message([0x48, 0, 0x49, 0]));
        Assert.StartsWith("line 1: found '", Message([0x89, 0x50, 0x4E, 0x47, 0xFF, 0xFE, 0x0A]), StringComparison.Ordinal);
    }

    [Fact]
    public void A_file_cut_off_anywhere_is_one_clear_line()
    {
        // Behind the last digit the take is whole: only a longer number could have stood there.
        for (var length = 0; length < Good.Length - 2; length++)
        {
            Assert.NotEmpty(Message(Encoding.UTF8.GetBytes(Good[..length])));
        }
    }

    [Fact]
    public void Deep_nesting_is_an_error_and_not_a_crash()
    {
        Assert.Equal("line 258: found joint 'j256' below 256 others, expected at most 256 joints in a row", Message(Nested(10_000, "")));
        Assert.Equal(256, BvhTakes.Read(Nested(256, BvhTakes.Motion(string.Join(' ', Enumerable.Repeat("1", 256))))).Take.Tracks.Length);

        static byte[] Nested(int depth, string motion)
        {
            var joints = Enumerable.Range(0, depth).Select(n => $"{(n == 0 ? "ROOT" : "JOINT")} j{n} {{ OFFSET 0 0 0 CHANNELS 1 Xrotation\n");
            return Encoding.UTF8.GetBytes($"HIERARCHY\n{string.Concat(joints)}{new string('}', depth)}\n{motion}");
        }
    }

    [Fact]
    public void Many_joints_and_short_lines_ask_for_no_more_memory_than_the_file_is_large()
    {
        var joints = string.Concat(Enumerable.Range(0, 20_000).Select(n => $"ROOT j{n} {{OFFSET 0 0 0 CHANNELS 3 Zrotation Yrotation Xrotation}}\n"));
        var text = $"HIERARCHY\n{joints}{BvhTakes.Motion([.. Enumerable.Repeat("1", 200_000)])}";
        var before = GC.GetAllocatedBytesForCurrentThread();
        Assert.EndsWith("found 1 values, expected 60000, one for each channel", Message(Encoding.UTF8.GetBytes(text)), StringComparison.Ordinal);
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, 100_000_000);
    }

    [Theory]
    [InlineData("1e-320")]
    [InlineData("1e-2147483648")]
    [InlineData("1e308")]
    [InlineData("nan")]
    public void A_frame_time_beyond_any_sense_is_refused(string text) => Assert.Equal(
        $"line 9, Frame Time: found '{text}', expected a number of seconds above 0 (from 1E-06 to 1000000)",
        Message(Encoding.UTF8.GetBytes(Good.Replace("0.01", text))));

    [Fact]
    public void A_long_word_is_cut_short_in_the_message()
    {
        var text = Good.Replace("4 5 6", $"4 {new string('x', 100_000)} 6");
        Assert.InRange(Message(Encoding.UTF8.GetBytes(text)).Length, 40, 200);
    }

    private static string Message(byte[] bytes)
    {
        var message = Assert.Throws<InputFormatException>(() => BvhTakes.Read(bytes)).Message;
        Assert.StartsWith("fight.bvh", message, StringComparison.Ordinal);
        Assert.DoesNotContain('\n', message);
        return message["fight.bvh".Length..].TrimStart(',', ':', ' ');
    }
}
