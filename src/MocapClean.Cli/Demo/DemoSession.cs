using CsvHelper;
using MocapClean.Cli.Batch;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>Writes the invented session: takes with faults, the truth about them, slates and a config.</summary>
public static class DemoSession
{
    private static readonly CsvWriterOptions Options = new() { NewLine = "\n" };

    /// <summary>Writes everything; the same seed gives the same bytes.</summary>
    /// <returns>Relative paths of what was written.</returns>
    public static IReadOnlyList<string> Write(IOutput output, ulong seed)
    {
        var written = new List<string>();
        void Put(string path, Action<Stream> write)
        {
            output.Write(path, write);
            written.Add(path);
        }

        for (var i = 0; i < DemoTakes.All.Length; i++)
        {
            var take = DemoTakes.All[i];
            var (tracks, times, truth) = Make(take, new SeededNumbers((seed * 1000) + (ulong)i));
            Put($"takes/{take.Name}", s =>
            {
                if (take.Name.EndsWith(".bvh", StringComparison.Ordinal))
                {
                    DemoBvh.Write(take, tracks, s);
                }
                else
                {
                    DemoCsv.Write(take, times, tracks, s);
                }
            });
            Put($"truth/{take.Name}.truth.csv", s => WriteTruth(truth, s));
        }

        Put("slates.csv", WriteSlates);
        Put("session.yaml", s => s.Write(DemoText.Config));
        Put("README.md", s => s.Write(DemoText.Readme(seed)));
        return written;
    }

    private static (Quat[][] Tracks, double[] Times, List<DemoTruth> Truth) Make(DemoTake take, SeededNumbers numbers)
    {
        var truth = new List<DemoTruth>();
        var faults = new DemoFaults(numbers, truth);
        var isLocal = take.Name.EndsWith(".bvh", StringComparison.Ordinal);
        var tracks = new Quat[DemoTakes.Joints.Length][];
        for (var j = 0; j < tracks.Length; j++)
        {
            var joint = DemoTakes.Joints[j];
            tracks[j] = DemoMotion.Joint(numbers, take.Frames, take.Rate, take.Liveliness);
            faults.Spoil(joint, tracks[j], take.Faults.GetValueOrDefault(joint) ?? []);
            tracks[j] = isLocal ? [Quat.Identity, .. tracks[j]] : tracks[j];
        }

        if (isLocal)
        {
            // The rest pose in front moves every frame on by one.
            truth = [new DemoTruth("", 0, 0, "rest-pose", 0, IsHard: false), .. truth.Select(t => t with { First = t.First + 1, Last = t.Last + 1 })];
        }

        var times = Enumerable.Range(0, tracks[0].Length).Select(n => n / take.Rate).ToArray();
        return take.LostFrames > 0 ? Lose(take, tracks, times, truth) : (tracks, times, truth);
    }

    private static (Quat[][] Tracks, double[] Times, List<DemoTruth> Truth) Lose(
        DemoTake take, Quat[][] tracks, double[] times, List<DemoTruth> truth)
    {
        T[] Cut<T>(T[] all) => [.. all[..take.LostAt], .. all[(take.LostAt + take.LostFrames)..]];
        // The demo puts time lost behind the other faults of its take, so that no fault is cut in two.
        var later = truth.Select(t => t.First < take.LostAt ? t : t with { First = t.First - take.LostFrames, Last = t.Last - take.LostFrames });
        var lost = new DemoTruth("", take.LostAt, take.LostAt, "lost-frames", take.LostFrames, IsHard: false);
        return ([.. tracks.Select(Cut)], Cut(times), [.. later, lost]);
    }

    private static void WriteTruth(List<DemoTruth> truth, Stream output)
    {
        using var csv = CsvWriter.Create(output, Options, leaveOpen: true);
        csv.WriteHeader(["joint", "first_frame", "last_frame", "kind", "size_deg", "class"]);
        foreach (var t in truth.OrderBy(t => t.First).ThenBy(t => t.Joint, StringComparer.Ordinal))
        {
            csv.WriteField(t.Joint);
            csv.WriteField(t.First, []);
            csv.WriteField(t.Last, []);
            csv.WriteField(t.Kind);
            csv.WriteField(Math.Round(t.SizeDegrees, 3), []);
            csv.WriteField(t.IsHard ? "hard" : "plain");
            csv.EndRecord();
        }
    }

    private static void WriteSlates(Stream output)
    {
        using var csv = CsvWriter.Create(output, Options, leaveOpen: true);
        csv.WriteHeader(["take", "frame", "timecode", "action_first", "action_last"]);
        foreach (var take in DemoTakes.All)
        {
            csv.WriteField(take.Name);
            csv.WriteField(0, []);
            csv.WriteField(take.TimeCode);
            csv.WriteField(20, []);
            csv.WriteField(take.Frames - take.LostFrames - 21, []);
            csv.EndRecord();
        }
    }
}
