using System.Text;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Csv;
using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

/// <summary>Tables put together at random, and excerpts of recorded takes (Data/Csv/README.md tells their source and licence).</summary>
public sealed class CsvRoundTripTests
{
    private static readonly string[] Ends = ["\n", "\r\n"];
    private static readonly string[] Between = ["", "# note, with \"quotes\n", "\n", "\r\n", "   \n"];
    private static readonly string[] Carried = ["", "x", "\"a,b;\"", "\"two\nlines\"", "\"\"\"\"", "µ", " y "];
    private static readonly string[] Gone = ["", " ", "\"\"", "NaN"];

    [Property(MaxTest = 300, Replay = "(123,457)")]
    public Property Unchanged_takes_come_back_byte_for_byte(DoNotSize<int> seed)
    {
        var (text, _) = Random(seed.Item);
        var file = Table.Read(text);
        return Table.Write(file, file.Take).AsSpan().SequenceEqual(Table.Bytes(text)).Label(text);
    }

    [Property(MaxTest = 300, Replay = "(123,457)")]
    public Property Changed_samples_are_read_back_and_all_others_stay(DoNotSize<int> seed)
    {
        var (text, random) = Random(seed.Item);
        var file = Table.Read(text);
        var (joint, frame) = (random.Next(file.Take.Tracks.Length), random.Next(file.Take.Length));
        var sample = new Quat(random.NextDouble(), random.NextDouble(), random.NextDouble(), -random.NextDouble()).Normalised();
        var back = Table.Read(Table.Write(file, file.Take.With(joint, frame, sample)));
        var (a, b) = (file.Take, back.Take);
        var same = a.Tracks.Zip(b.Tracks).SelectMany((t, j) => t.First.Samples.Zip(t.Second.Samples)
            .Select((s, n) => j == joint && n == frame ? (s.Second + (-1 * sample)).Norm < 1.1e-14 : s.First.Equals(s.Second)));
        return same.All(x => x).And(a.Clock.Delivered.SequenceEqual(b.Clock.Delivered))
            .And(file.Column("note")!.SequenceEqual(back.Column("note")!)).Label(text);
    }

    [Property(MaxTest = 2000, Replay = "(123,457)")]
    public Property A_spoilt_file_is_refused_or_comes_back_byte_for_byte(DoNotSize<int> seed)
    {
        var (text, random) = Random(seed.Item);
        var bytes = Table.Bytes(text);
        for (var i = random.Next(1, 4); i > 0; i--)
        {
            var at = random.Next(bytes.Length);
            bytes = random.Next(3) switch
            {
                0 => [.. bytes[..at], .. bytes[(at + 1)..]],
                1 => [.. bytes[..at], (byte)random.Next(256), .. bytes[at..]],
                _ => [.. bytes[..at], .. bytes[random.Next(at, bytes.Length)..], (byte)"\"\n,;#-.0"[random.Next(8)]],
            };
        }

        try
        {
            CsvGuess.From(Table.Source(bytes));
            var file = Table.Read(bytes);
            return Table.Write(file, file.Take).AsSpan().SequenceEqual(bytes).Label(Convert.ToHexString(bytes));
        }
        catch (InputFormatException e)
        {
            return (!e.Message.Contains('\n', StringComparison.Ordinal) && e.Message.Length < 500).Label(e.Message);
        }
    }

    [Theory]
    [InlineData("gentle.csv", 4, 120, 1e-8)]
    [InlineData("mixed-a.csv", 4, 400, 1e-8)]
    [InlineData("real-a.csv", 1, 400, 1e-8)]
    public void Recorded_takes_come_back_byte_for_byte(string name, int joints, int frames, double rounding)
    {
        var bytes = File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "Data", "Csv", name));
        var file = Table.Read(bytes);

        Assert.Equal((joints, frames), (file.Take.Tracks.Length, file.Take.Length));
        Assert.Equal(rounding, file.Take.TextRounding, 1e-15);
        Assert.Equal(bytes, Table.Write(file, file.Take));
    }

    [Theory]
    [InlineData("gentle.csv")]
    [InlineData("mixed-a.csv")]
    public void Samples_are_those_of_a_plain_split(string name)
    {
        var path = Path.Combine(AppContext.BaseDirectory, "Data", "Csv", name);
        var file = Table.Read(File.ReadAllBytes(path));
        var rows = File.ReadAllLines(path).Skip(1).Select(l => l.Split(',')).ToList();
        for (var frame = 0; frame < rows.Count; frame++)
        {
            for (var joint = 0; joint < file.Take.Tracks.Length; joint++)
            {
                var cells = rows[frame].Skip(1 + (4 * joint)).Take(4).Select(c => double.TryParse(c, null, out var v) ? v : double.NaN).ToList();
                var expected = cells.Any(double.IsNaN) ? Quat.Missing : new Quat(cells[0], cells[1], cells[2], cells[3]);
                Assert.Equal(expected, file.Take.Tracks[joint].Samples[frame]);
            }
        }
    }

    private static (string Text, Random Random) Random(int seed)
    {
        var random = new Random(seed);
        var comma = random.Next(3) == 0;
        var separator = comma ? ";\t"[random.Next(2)] : ",;\t|"[random.Next(4)];
        var joints = random.Next(1, 5);
        string[] names = [.. Enumerable.Range(0, 4 * joints).Select(i => $"j{i / 4}.q{"wxyz"[i % 4]}"), "time", "note"];
        random.Shuffle(names);
        var text = new StringBuilder(random.Next(2) == 0 ? "\uFEFF" : "").Append(Pick(random, ["", "a line before\n", "# c\r\n"]));
        text.AppendJoin(separator, names).Append(Pick(random, Ends));
        var frames = random.Next(2, 9);
        for (var n = 0; n < frames; n++)
        {
            var cells = names.Select(name => name switch
            {
                "time" => Cell(random, 1.5 + (n * 0.25), comma),
                "note" => Pick(random, Carried),
                _ => random.Next(9) == 0 ? Pick(random, Gone) : Cell(random, (random.NextDouble() * 2) - 1, comma),
            });
            text.Append(random.Next(5) == 0 ? Pick(random, Between) : "").AppendJoin(separator, cells);
            text.Append(n + 1 < frames || random.Next(2) == 0 ? Pick(random, Ends) : "");
        }

        return (text.ToString(), random);
    }

    private static string Cell(Random random, double value, bool comma)
    {
        var text = value.ToString(Pick(random, ["R", "F8", "E10"]), comma ? new System.Globalization.NumberFormatInfo { NumberDecimalSeparator = "," } : null);
        return random.Next(6) switch { 0 => $"\"{text}\"", 1 => $" {text} ", _ => text };
    }

    private static string Pick(Random random, string[] choices) => choices[random.Next(choices.Length)];
}
