using System.Globalization;
using System.Text;
using BenchmarkDotNet.Attributes;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Csv;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Benchmarks;

/// <summary>A wide CSV take in memory, read and written.</summary>
public class CsvBenchmarks
{
    private const int Joints = 10;
    private const int Samples = Joints * InventedTake.Frames;

    private readonly TakeSource source = new("invented.csv", Text(InventedTake.Of(Joints, 0.05)));
    private readonly ITakeFile file;
    private readonly Take changed;

    public CsvBenchmarks()
    {
        file = Read();
        var turn = RotationVector.Exp(new(0.01, 0, 0));
        changed = file.Take with { Tracks = [.. file.Take.Tracks.Select(t => t with { Samples = [.. t.Samples.Select(q => turn * q)] })] };
    }

    [Benchmark(OperationsPerInvoke = Samples)]
    public ITakeFile Read() => new CsvFormat().Read(source, new ReadSettings());

    /// <summary>Nothing changed: every byte is the delivered one.</summary>
    [Benchmark(OperationsPerInvoke = Samples)]
    public long WriteUnchanged() => Write(file.Take);

    /// <summary>Every sample changed: every number is printed anew.</summary>
    [Benchmark(OperationsPerInvoke = Samples)]
    public long WriteChanged() => Write(changed);

    private long Write(Take take)
    {
        using var output = new MemoryStream(8 << 20);
        file.Write(take, output);
        return output.Length;
    }

    private static byte[] Text(Take take)
    {
        var text = new StringBuilder("time");
        foreach (var track in take.Tracks)
        {
            text.Append(CultureInfo.InvariantCulture, $",{track.Name}.qw,{track.Name}.qx,{track.Name}.qy,{track.Name}.qz");
        }

        for (var n = 0; n < take.Length; n++)
        {
            text.Append('\n').Append(CultureInfo.InvariantCulture, $"{take.Clock.Steady[n]:F6}");
            foreach (var q in take.Tracks.Select(t => t.Samples[n]))
            {
                text.Append(CultureInfo.InvariantCulture, $",{q.W:F10},{q.X:F10},{q.Y:F10},{q.Z:F10}");
            }
        }

        return Encoding.UTF8.GetBytes(text.Append('\n').ToString());
    }
}
