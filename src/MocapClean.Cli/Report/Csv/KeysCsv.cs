using System.Collections.Immutable;
using CsvHelper;
using MocapClean.Cli.Formats.Csv;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report.Csv;

/// <summary>The keys of a take as a table, and the proof that they play back: the written text is read again and replayed.</summary>
public static class KeysCsv
{
    /// <summary>Names carry delivered text, so nothing is made safe here.</summary>
    private static readonly CsvWriterOptions Options = new() { NewLine = "\n" };

    /// <summary>The text of the keys, with the playback error of what it says measured at every frame, one for each track.</summary>
    /// <exception cref="InvalidOperationException">The keys do not play back within the tolerance: a fault of this program.</exception>
    public static (byte[] Text, ImmutableArray<KeySet> Measured) Replayed(Take take, ImmutableArray<StageSettings> settings, FrameLabels labels)
    {
        var text = Write(take, labels);
        return (text, Replay(text, take, settings, labels));
    }

    private static byte[] Write(Take take, FrameLabels labels)
    {
        using var output = new MemoryStream();
        using (var csv = CsvWriter.Create(output, Options, leaveOpen: true))
        {
            csv.WriteHeader(["joint", "frame", "time", "qw", "qx", "qy", "qz"]);
            foreach (var track in take.Tracks)
            {
                foreach (var frame in track.Keys?.Frames ?? [])
                {
                    csv.WriteField(track.Name);
                    csv.WriteField(labels.Number(frame), []);
                    csv.WriteField(take.Clock.Delivered[frame], []);
                    var q = track.Samples[frame];
                    WriteComponents(csv, q);
                    csv.EndRecord();
                }
            }
        }

        return output.ToArray();
    }

    private static void WriteComponents(CsvWriter csv, Quat q)
    {
        Span<byte> text = stackalloc byte[FixedDecimals.Longest];
        foreach (var component in (ReadOnlySpan<double>)[q.W, q.X, q.Y, q.Z])
        {
            csv.WriteField(text[..FixedDecimals.Write(component, text, (byte)'.')]);
        }
    }

    private static ImmutableArray<KeySet> Replay(byte[] text, Take take, ImmutableArray<StageSettings> settings, FrameLabels labels)
    {
        using var csv = CsvReader.Create(text, new CsvReaderOptions { Separator = ',' });
        var measured = ImmutableArray.CreateBuilder<KeySet>(take.Tracks.Length);
        for (var j = 0; j < take.Tracks.Length; j++)
        {
            var (track, rule) = (take.Tracks[j], settings[j].Reduce);
            var frames = track.Keys?.Frames ?? [];
            var keys = new Quat[frames.Length];
            for (var k = 0; k < keys.Length; k++)
            {
                if (!csv.Read() || csv.Parse<int>(1) != labels.Number(frames[k]) || !csv.Parse<double>(2).Equals(take.Clock.Delivered[frames[k]]))
                {
                    throw new InvalidOperationException($"keys of {track.Name} do not read back as written");
                }

                keys[k] = new Quat(csv.Parse<double>(3), csv.Parse<double>(4), csv.Parse<double>(5), csv.Parse<double>(6));
            }

            var error = KeyPlayback.Measure(rule.Playback, frames.AsSpan(), keys, take.Clock.Steady.AsSpan(), track.Samples.AsSpan());
            if (error.LargestRadians > rule.Tolerance)
            {
                throw new InvalidOperationException(
                    $"keys of {track.Name} play back {Angle.ToDegrees(error.LargestRadians)} deg off at frame {error.LargestFrame}, more than the tolerance");
            }

            measured.Add(new KeySet(frames, error.LargestRadians, error.RmsRadians));
        }

        return measured.ToImmutable();
    }
}
