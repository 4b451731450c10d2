using MocapClean.Cli.Config;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Report;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Batch;

/// <summary>Finds out how the frames of a take are named: by number, and by SMPTE address where a slate or a carried column tells it.</summary>
internal sealed class AddressOf(SessionConfig config, Config.Sources.SlateTable slates)
{
    /// <summary>The labels of a take that was read.</summary>
    public FrameLabels Labels(ITakeFile file)
    {
        var first = config.Output.FirstFrame;
        if (config.TimeCode.Column.Length > 0 && file.Column(config.TimeCode.Column) is { } column)
        {
            return new FrameLabels(first, frame => column[frame]);
        }

        return slates.For(file.Take.Name) is { } row
            ? FromSlate(file.Take, row.Slate, first)
            : new FrameLabels(first, _ => "");
    }

    private static FrameLabels FromSlate(Take take, Slate slate, int first) => slate.Frame < take.Length
        ? new FrameLabels(first, frame => slate.At(take.Clock, frame).ToString())
        : new FrameLabels(first, _ => "")
        {
            Note = $"the slate stands at frame {first + slate.Frame}, outside the take: no time code",
        };
}
