using System.Collections.Immutable;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// Reads a table with one row a joint and frame, in any order of rows. Frames stand in the order of their numbers, or of their times
/// where they have no number; a joint without a row in a frame has no sample there.
/// </summary>
internal sealed class LongReader
{
    /// <summary>A table whose rows fill less than this share of joints times frames is no motion capture, and might need any memory.</summary>
    private const double LeastFilled = 0.02;

    /// <summary>Below this many samples the share does not matter.</summary>
    private const long FewSamples = 1_000_000;

    private readonly CsvRows rows;
    private readonly CsvColumns columns;
    private readonly SampleReader reader;
    private readonly RowKeys keys;
    private readonly List<int> rowJoints = [];
    private readonly List<int> rowFrames = [];
    private readonly List<Quat> samples = [];

    private LongReader(CsvRows rows, CsvColumns columns)
    {
        this.rows = rows;
        this.columns = columns;
        keys = new RowKeys();
        rowJoints.Capacity = rowFrames.Capacity = samples.Capacity = rows.Estimate;
        reader = new SampleReader(rows, columns, samples.Capacity);
    }

    private int Key => columns.Frame >= 0 ? columns.Frame : columns.Time;

    /// <summary>Reads all rows.</summary>
    public static CsvContent Read(CsvRows rows, CsvColumns columns) => new LongReader(rows, columns).Read();

    private CsvContent Read()
    {
        var times = new List<double>();
        while (rows.Next())
        {
            var joint = keys.Joint(rows, columns.Joint);
            var frame = keys.Frame(reader.Time(Key));
            if (frame == times.Count)
            {
                times.Add(columns.Time >= 0 ? reader.Time(columns.Time) : keys.Number(frame));
            }

            rowJoints.Add(joint);
            rowFrames.Add(frame);
            samples.Add(reader.Sample(0));
            reader.CountDigits();
        }

        return Arrange(times);
    }

    /// <summary>Puts frames in order and samples in their places.</summary>
    private CsvContent Arrange(List<double> times)
    {
        var (order, rank) = keys.FrameOrder();
        var (joints, frames) = (keys.Joints.Count, order.Length);
        if ((long)joints * frames > FewSamples && rowJoints.Count < LeastFilled * joints * frames)
        {
            throw rows.Unusable($"{rowJoints.Count} rows for {joints} joints and {frames} frames", "a row for most joints in most frames");
        }

        var places = new RowPlaces([.. rowJoints], [.. rowFrames.Select(f => rank[f])]);
        return new CsvContent
        {
            Joints = [.. keys.Joints],
            Samples = Scatter(places, joints, frames),
            Times = [.. order.Select(f => times[f])],
            TimesAreFrames = columns.Time < 0,
            TimeRounding = columns.Time >= 0 ? reader.TimeRounding : 0,
            ComponentRounding = reader.ComponentRounding,
            Places = places,
            DecimalComma = rows.DecimalComma,
        };
    }

    private ImmutableArray<ImmutableArray<Quat>> Scatter(RowPlaces places, int joints, int frames)
    {
        var tracks = new Quat[joints][];
        var taken = new bool[joints][];
        for (var joint = 0; joint < joints; joint++)
        {
            tracks[joint] = new Quat[frames];
            tracks[joint].AsSpan().Fill(Quat.Missing);
            taken[joint] = new bool[frames];
        }

        for (var row = 0; row < samples.Count; row++)
        {
            var (joint, frame) = (places.Joints[row], places.Frames[row]);
            if (taken[joint][frame])
            {
                throw Repeated(places, row);
            }

            taken[joint][frame] = true;
            tracks[joint][frame] = samples[row];
        }

        return [.. tracks.Select(ImmutableCollectionsMarshal.AsImmutableArray)];
    }

    private InputFormatException Repeated(RowPlaces places, int second)
    {
        var first = 0;
        while (places.Joints[first] != places.Joints[second] || places.Frames[first] != places.Frames[second])
        {
            first++;
        }

        return rows.Unusable(
            $"joint '{CsvText.Shown(keys.Joints[places.Joints[second]])}' in rows {first + 1} and {second + 1} of one frame",
            "one row for a joint and frame");
    }
}
