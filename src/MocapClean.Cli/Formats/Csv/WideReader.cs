using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Reads a table with one row a frame straight into one array a joint.</summary>
internal static class WideReader
{
    /// <summary>Reads all rows.</summary>
    public static CsvContent Read(CsvRows rows, CsvColumns columns)
    {
        var reader = new SampleReader(rows, columns);
        var tracks = new Quat[columns.Joints.Length][];
        var times = columns.Time >= 0 ? new double[rows.Estimate] : null;
        var (frames, room) = (0, rows.Estimate);
        Resize(tracks, room);
        while (rows.Next())
        {
            if (frames == room)
            {
                room *= 2;
                Resize(tracks, room);
                Array.Resize(ref times, times is null ? 0 : room);
            }

            if (columns.Time >= 0)
            {
                times![frames] = reader.Time(columns.Time);
            }

            for (var joint = 0; joint < tracks.Length; joint++)
            {
                tracks[joint][frames] = reader.Sample(joint);
            }

            reader.CountDigits();
            frames++;
        }

        Resize(tracks, frames);
        return new CsvContent
        {
            Joints = columns.Joints,
            Samples = [.. tracks.Select(ImmutableCollectionsMarshal.AsImmutableArray)],
            Times = columns.Time >= 0 ? times![..frames] : null,
            TimeRounding = columns.Time >= 0 ? reader.TimeRounding : 0,
            ComponentRounding = reader.ComponentRounding,
            DecimalComma = rows.DecimalComma,
        };
    }

    private static void Resize(Quat[][] tracks, int length)
    {
        for (var joint = 0; joint < tracks.Length; joint++)
        {
            Array.Resize(ref tracks[joint], length);
        }
    }
}
