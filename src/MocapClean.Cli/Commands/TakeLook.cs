using MocapClean.Cli.Batch;
using MocapClean.Cli.Formats.Csv;
using MocapClean.Core.Kernels;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Commands;

/// <summary>What a look at one take found: its shape, its speeds, its faults.</summary>
internal sealed record TakeLook
{
    /// <summary>The stages that look; the others change.</summary>
    private static readonly string[] Looking = ["ingest", "unwrap", "outliers"];

    /// <summary>The file, as the user named it.</summary>
    public required string Path { get; init; }

    /// <summary>The take after the looking stages.</summary>
    public required Take Take { get; init; }

    /// <summary>How a table is named, where that is not the default.</summary>
    public CsvGuess? Guess { get; init; }

    /// <summary>The lines of a config that say how the take is read; empty for the defaults.</summary>
    public string ReadingLines => Guess is null
        ? ""
        : $"  csv: {{ {Guess.Settings} }}\n{(Guess.NeedsRate ? "  rate: 120 Hz  # assumed: the file does not tell its time\n" : "")}";

    /// <summary>Reads a file and looks.</summary>
    public static TakeLook At(string path)
    {
        var (file, _, guess) = TakeOpener.Open(path);
        var take = file.Take;
        var context = StageContext.Uniform(take, new StageSettings());
        foreach (var entry in StageCatalog.All.Where(e => Looking.Contains(e.Name)))
        {
            take = entry.Stage.Run(take, context);
        }

        return new TakeLook { Path = path, Take = take, Guess = guess };
    }

    /// <summary>What was seen, for a person.</summary>
    public IEnumerable<string> Lines()
    {
        var clock = Take.Clock;
        yield return $"{Path}: {Take.Tracks.Length} joints, {Take.Length} frames, {clock.Rate:0.###} Hz{(clock.IsRegular ? "" : " (irregular clock)")}, {Take.Length / clock.Rate:0.00} s, {(Take.Space == OrientationSpace.World ? "world" : "local")} orientations";
        foreach (var note in (Guess?.Notes ?? []).Concat(Take.Notes))
        {
            yield return $"  {note}";
        }

        var samples = (double)Take.Tracks.Length * Take.Length;
        var missing = Take.Tracks.Sum(t => t.States.Count(s => s == SampleState.Missing));
        yield return $"  missing samples {missing} ({100 * missing / samples:0.##} %)";
        foreach (var line in Findings())
        {
            yield return line;
        }

        foreach (var line in Speeds().Concat(Noises()))
        {
            yield return line;
        }
    }

    private IEnumerable<string> Findings()
    {
        foreach (var kind in Take.Findings.GroupBy(f => f.Kind).OrderBy(g => g.Key))
        {
            var joints = kind.Where(f => f.Joint >= 0).GroupBy(f => f.Joint).OrderByDescending(g => g.Count()).ThenBy(g => g.Key)
                .Select(g => $"{Take.Tracks[g.Key].Name} {g.Count()}").ToList();
            var most = joints.Count > 0 ? $": {string.Join(", ", joints.Take(6))}{(joints.Count > 6 ? $" and {joints.Count - 6} more joints" : "")}" : "";
            yield return $"  {kind.Key.Text()} {kind.Count()}{most}";
        }
    }

    /// <summary>The three fastest joints and the stillest: a sensor that never moves is worth a look too.</summary>
    private IEnumerable<string> Speeds()
    {
        var joints = Take.Tracks.Select(t => (t.Name, Speeds: TurnRates(t))).Where(t => t.Speeds.Count > 0)
            .Select(t => (t.Name, Typical: Rank(t.Speeds, 0.5), High: Rank(t.Speeds, 0.99))).OrderByDescending(t => t.High).ToList();
        foreach (var (name, typical, high) in joints.Take(3))
        {
            yield return $"  turns at {typical:0.#} deg/s in the median, {high:0.#} deg/s at the 99th percentile: {name}";
        }

        var still = joints.Where(j => j.High == 0).Select(j => j.Name).ToList();
        if (still.Count > 0)
        {
            yield return $"  never moves: {string.Join(", ", still)}";
        }
    }

    /// <summary>The typical noise, and the joints that are three times noisier: worth a look at the sensor.</summary>
    private IEnumerable<string> Noises()
    {
        var joints = Take.Tracks.Select(t => (t.Name, Noise: Angle.ToDegrees(JitterEstimate.OneAxis(t)))).Where(j => j.Noise > 0).OrderByDescending(j => j.Noise).ToList();
        if (joints.Count == 0)
        {
            yield break;
        }

        var typical = joints[joints.Count / 2].Noise;
        yield return $"  noise about {typical:0.0000} deg an axis in the median joint, at most {joints[0].Noise:0.0000} deg: {joints[0].Name}";
        var noisy = joints.Where(j => j.Noise > 3 * typical).Select(j => j.Name).ToList();
        if (noisy.Count > 0)
        {
            yield return $"  more than three times noisier than the median: {string.Join(", ", noisy.Take(8))}{(noisy.Count > 8 ? $" and {noisy.Count - 8} more" : "")}";
        }
    }

    private List<double> TurnRates(JointTrack track)
    {
        var speeds = new List<double>(track.Length);
        for (var n = 1; n < track.Length; n++)
        {
            if (track.States[n] == SampleState.Good && track.States[n - 1] == SampleState.Good)
            {
                speeds.Add(Angle.ToDegrees(Angle.Between(track.Samples[n - 1], track.Samples[n])) * Take.Clock.Rate);
            }
        }

        speeds.Sort();
        return speeds;
    }

    private static double Rank(List<double> sorted, double share) => sorted[(int)(share * (sorted.Count - 1))];
}
