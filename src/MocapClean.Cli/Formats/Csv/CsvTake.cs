using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Makes a take of what a table held.</summary>
internal static class CsvTake
{
    /// <summary>The take as delivered.</summary>
    /// <exception cref="InputFormatException">There is no frame or no usable time.</exception>
    public static Take Build(TakeSource source, CsvHeader header, ReadSettings settings, CsvContent content)
    {
        var frames = content.Samples[0].Length;
        if (frames == 0)
        {
            throw new InputFormatException(source.Name, "", "a header without rows", "at least one frame");
        }

        var good = ImmutableArray.Create(new SampleState[frames]);
        return new Take
        {
            Name = source.Name,
            Clock = ClockOf(source, header, settings, content),
            Tracks = [.. content.Joints.Zip(content.Samples, (name, samples) => Track(name, samples, good))],
            Space = settings.Space ?? OrientationSpace.World,
            TextRounding = AngleOf(content.ComponentRounding),
        };
    }

    private static JointTrack Track(string name, ImmutableArray<Quat> samples, ImmutableArray<SampleState> good) =>
        new() { Name = name, Delivered = samples, Samples = samples, States = good };

    /// <summary>A unit quaternion that moves by a small length across its direction turns by twice that.</summary>
    private static double AngleOf(double length) => 2 * length;

    private static Clock ClockOf(TakeSource source, CsvHeader header, ReadSettings settings, CsvContent content)
    {
        if (content.Times is not { } times || content.TimesAreFrames)
        {
            var rate = settings.Rate ?? throw CsvAdvice.NoTime(source, header, settings);
            return content.Times is { } numbers ? FromNumbers(numbers, rate) : Clock.Regular(content.Samples[0].Length, rate);
        }

        var spacing = MedianSpacing(times);
        return spacing > 0 ? Clock.FromTimes(times, content.TimeRounding) : throw new InputFormatException(
            source.Name,
            $"column '{settings.CsvTime}'",
            spacing < 0 ? "times that mostly run back" : "times that mostly stand still",
            "times in seconds that rise from frame to frame");
    }

    /// <summary>Frames that are not in the file are lost: the time skips them.</summary>
    private static Clock FromNumbers(double[] numbers, double rate) =>
        Clock.FromTimes([.. numbers.Select(n => (n - numbers[0]) / rate)], rounding: 0);

    /// <summary>Infinite for a single frame, whose clock needs no spacing.</summary>
    private static double MedianSpacing(double[] times)
    {
        if (times.Length == 1)
        {
            return double.PositiveInfinity;
        }

        var spacings = new double[times.Length - 1];
        for (var n = 0; n < spacings.Length; n++)
        {
            spacings[n] = times[n + 1] - times[n];
        }

        Array.Sort(spacings);
        return spacings[spacings.Length / 2];
    }
}
