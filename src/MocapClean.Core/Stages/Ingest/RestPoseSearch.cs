using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Ingest;

/// <summary>
/// Recognises a posed first frame that was put in front of the motion: most joints that move at all step between frames 0 and 1, far
/// beyond what they do in the frames after. Such a frame is kept as delivered and belongs to no segment.
/// </summary>
internal static class RestPoseSearch
{
    /// <summary>A step below this is within what a joint may do at the start of a motion.</summary>
    private static readonly double SmallestStep = Angle.FromDegrees(2);

    /// <summary>How many times the largest of the next increments a step must be: no acceleration of a body gives this in one frame.</summary>
    private const double TimesTheNext = 6;

    private const int NextFrames = 10;

    public static Take SetApart(Take take, StageContext context)
    {
        if (take.Length < 3 || take.Tracks.Length < 2 || !context.PerJoint[0].Ingest.RecogniseRestPose)
        {
            return take;
        }

        var (moving, stepping, widest) = (0, 0, 0.0);
        foreach (var track in take.Tracks)
        {
            var (moves, step) = Look(track);
            moving += moves ? 1 : 0;
            stepping += step > 0 ? 1 : 0;
            widest = Math.Max(widest, step);
        }

        return stepping >= 2 && 2 * stepping > moving ? Label(take, stepping, widest) : take;
    }

    private static (bool Moves, double Step) Look(JointTrack track)
    {
        var samples = track.Samples;
        var moves = false;
        for (var n = 1; n < samples.Length && !moves; n++)
        {
            moves = !samples[n].Equals(samples[0]) && track.States[n] == SampleState.Good;
        }

        if (!moves || track.States[0] != SampleState.Good || track.States[1] != SampleState.Good)
        {
            return (moves, 0);
        }

        var step = Angle.Between(samples[0], samples[1]);
        var next = 0.0;
        for (var n = 2; n < Math.Min(samples.Length, NextFrames + 2); n++)
        {
            var turn = Angle.Between(samples[n - 1], samples[n]);
            next = double.IsNaN(turn) ? next : Math.Max(next, turn);
        }

        return (moves, step > Math.Max(SmallestStep, TimesTheNext * next) ? step : 0);
    }

    private static Take Label(Take take, int stepping, double widest)
    {
        var row = new Finding
        {
            Joint = -1,
            First = 0,
            Last = 0,
            Kind = FaultKind.RestPose,
            Action = FaultAction.Noted,
            SizeRadians = widest,
            Note = $"{stepping} joints step from a pose to the motion at the next frame",
        };
        return take with
        {
            Tracks = [.. take.Tracks.Select(SetFirstApart)],
            Findings = [row, .. take.Findings],
        };
    }

    private static JointTrack SetFirstApart(JointTrack track) => track with
    {
        Breaks = track.Breaks.Contains(1) ? track.Breaks : [1, .. track.Breaks],
        States = track.States[0] == SampleState.Good ? track.States.SetItem(0, SampleState.Flagged) : track.States,
    };
}
