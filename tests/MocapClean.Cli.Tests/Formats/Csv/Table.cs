using System.Collections.Immutable;
using System.Text;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Csv;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Tests.Formats.Csv;

/// <summary>Reads and writes tables in memory, under the name t.csv.</summary>
internal static class Table
{
    public const string Header = "time,a.qw,a.qx,a.qy,a.qz";

    public static byte[] Bytes(string text) => Encoding.UTF8.GetBytes(text);

    public static TakeSource Source(byte[] bytes) => new("t.csv", bytes);

    public static ITakeFile Read(byte[] bytes, ReadSettings? settings = null) =>
        new CsvFormat().Read(Source(bytes), settings ?? new ReadSettings());

    public static ITakeFile Read(string text, ReadSettings? settings = null) => Read(Bytes(text), settings);

    public static string Refusal(string text, ReadSettings? settings = null) =>
        Xunit.Assert.Throws<InputFormatException>(() => Read(text, settings)).Message;

    public static byte[] Write(ITakeFile file, Take cleaned)
    {
        using var output = new MemoryStream();
        file.Write(cleaned, output);
        return output.ToArray();
    }

    public static string WriteText(ITakeFile file, Take cleaned) => Encoding.UTF8.GetString(Write(file, cleaned));

    public static Take With(this Take take, int joint, int frame, Quat sample)
    {
        var track = take.Tracks[joint];
        return take with { Tracks = take.Tracks.SetItem(joint, track with { Samples = track.Samples.SetItem(frame, sample) }) };
    }

    public static ImmutableArray<Quat> Samples(this ITakeFile file, string joint = "a") =>
        file.Take.Tracks.Single(t => t.Name == joint).Samples;
}
