using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Reads a table with one row a frame straight into one array a joint.</summary>
internal static class WideReader
{
    /// <summary>Reads all rows.</summary>
    public static CsvContent Read(CsvRows rows, CsvColumns columns)
    {
        var estimate = rows.Estimate;
        var reader = new SampleReader(rows, columns, estimate);
        var tracks = new Quat[columns.Joints.Length][];
        for (var joint = 0; joint < tracks.Length; joint++)
        {
            tracks[joint] = GC.AllocateUninitializedArray<Quat>(estimate);
        }

        var times = columns.Time >= 0 ? new double[estimate] : null;
        var frames = ReadRows(rows, reader, tracks, ref times, columns.Time);
        Resize(tracks, ref times, frames);
        return new CsvContent
        {
            Joints = columns.Joints,
            Samples = [.. tracks.Select(ImmutableCollectionsMarshal.AsImmutableArray)],
            Times = times,
            TimeRounding = times is null ? 0 : reader.TimeRounding,
            ComponentRounding = reader.ComponentRounding,
            DecimalComma = rows.DecimalComma,
        };
    }

    /// <summary>Nearly all time of reading goes by in here.</summary>
    private static int ReadRows(CsvRows rows, SampleReader reader, Quat[][] tracks, ref double[]? times, int timeColumn)
    {
        var frames = 0;
        while (rows.Next())
        {
            if (frames == tracks[0].Length)
            {
                Resize(tracks, ref times, 2 * frames);
            }

            if (times is not null)
            {
                times[frames] = reader.Time(timeColumn);
            }

            for (var joint = 0; joint < tracks.Length; joint++)
            {
                tracks[joint][frames] = reader.Sample(joint);
            }

            reader.CountDigits();
            frames++;
        }

        return frames;
    }

    private static void Resize(Quat[][] tracks, ref double[]? times, int length)
    {
        for (var joint = 0; joint < tracks.Length; joint++)
        {
            Array.Resize(ref tracks[joint], length);
        }

        if (times is not null)
        {
            Array.Resize(ref times, length);
        }
    }
}
