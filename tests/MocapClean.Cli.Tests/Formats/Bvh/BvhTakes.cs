using System.Text;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Bvh;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Tests.Formats.Bvh;

/// <summary>Small takes for the tests.</summary>
internal static class BvhTakes
{
    public const string OneJoint = """
        HIERARCHY
        ROOT Hips
        {
            OFFSET 1 2 3
            CHANNELS 6 Xposition Yposition Zposition Zrotation Yrotation Xrotation
            End Site
            {
                OFFSET 0 10 0
            }
        }
        """;

    public static ITakeFile Read(string text, ReadSettings? settings = null) => Read(Encoding.UTF8.GetBytes(text), settings);

    public static ITakeFile Read(byte[] bytes, ReadSettings? settings = null) =>
        new BvhFormat().Read(new TakeSource("fight.bvh", bytes), settings ?? new ReadSettings());

    /// <summary>One joint with the given channels, no position.</summary>
    public static string WithChannels(string channels, params string[] rows) =>
        $"HIERARCHY\nROOT Hips\n{{\n OFFSET 0 0 0\n CHANNELS {channels.Split(' ').Length} {channels}\n}}\n{Motion(rows)}";

    /// <summary>One joint that turns Z, Y, X.</summary>
    public static string Zyx(params string[] rows) => WithChannels("Zrotation Yrotation Xrotation", rows);

    public static string Motion(params string[] rows) =>
        $"MOTION\nFrames: {rows.Length}\nFrame Time: 0.01\n{string.Concat(rows.Select(r => r + "\n"))}";

    public static string Written(ITakeFile file, Take cleaned)
    {
        using var stream = new MemoryStream();
        file.Write(cleaned, stream);
        return Encoding.UTF8.GetString(stream.ToArray());
    }

    public static string Unchanged(string text)
    {
        var file = Read(text);
        return Written(file, file.Take);
    }

    /// <summary>The take with one sample of a track replaced.</summary>
    public static Take With(this Take take, int frame, Quat sample, int track = 0) => take.With(track, n => n == frame ? sample : null);

    /// <summary>The take with some samples of a track replaced.</summary>
    public static Take With(this Take take, int track, Func<int, Quat?> sample)
    {
        var old = take.Tracks[track];
        var samples = old.Samples.Select((q, n) => sample(n) ?? q);
        return take with { Tracks = take.Tracks.SetItem(track, old with { Samples = [.. samples] }) };
    }

    /// <summary>The lines of values.</summary>
    public static string[] Rows(string text) =>
        text.Split("Frame Time:")[1].Split('\n').Skip(1).Where(l => l.Trim().Length > 0).Select(l => l.TrimEnd('\r')).ToArray();

    public static double[] Numbers(string row) => row.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries).Select(double.Parse).ToArray();
}
