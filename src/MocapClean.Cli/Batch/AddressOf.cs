using MocapClean.Cli.Config;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Report;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Batch;

/// <summary>Finds out how the frames of a take are named: by number, and by SMPTE address where a slate or a carried column tells it.</summary>
internal sealed class AddressOf(SessionConfig config, Config.Sources.SlateTable slates)
{
    /// <summary>The labels of a take that was read.</summary>
    /// <exception cref="InputFormatException">Its slate lies outside the take.</exception>
    public FrameLabels Labels(ITakeFile file)
    {
        var first = config.Output.FirstFrame;
        if (config.TimeCode.Column.Length > 0 && file.Column(config.TimeCode.Column) is { } column)
        {
            return new FrameLabels(first, frame => column[frame]);
        }

        return slates.For(file.Take.Name) is { } row
            ? new FrameLabels(first, FromSlate(file.Take, row.Slate))
            : new FrameLabels(first, _ => "");
    }

    private static Func<int, string> FromSlate(Take take, Slate slate) => slate.Frame < take.Length
        ? frame => slate.At(take.Clock, frame).ToString()
        : throw new InputFormatException(take.Name, "", $"a slate at frame {slate.Frame}", $"a frame of the take, 0 to {take.Length - 1}");
}
