using System.Collections.Immutable;
using MocapClean.Core.Kernels;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>The search in one joint: its rhythm, its gaps, its freezes, its jumps and their stories.</summary>
internal static class JointOutliers
{
    /// <summary>Fewer repeats than this are rounding or chance at any rate.</summary>
    private const int ShortestFreeze = 4;

    /// <summary>A turn between neighbours beyond which not even its axis is sure, radians: 170 degrees.</summary>
    private const double WidestTurn = 2.967;

    /// <summary>
    /// The smallest turn that is told as a step or an offset, radians: 1 degree. Sensors settle anew by some tenths of a degree as markers
    /// come and go or fields change; that is their accuracy, not a fault, and nobody need look at it.
    /// </summary>
    private const double SmallestTurn = Math.PI / 180;

    /// <summary>Searches one track.</summary>
    /// <param name="take">The take that it belongs to.</param>
    /// <param name="joint">Index of the track.</param>
    /// <param name="settings">Settings of the joint.</param>
    /// <param name="before">Findings of the joint so far.</param>
    public static JointResult Search(Take take, int joint, StageSettings settings, ImmutableArray<Finding> before)
    {
        var track = take.Tracks[joint];
        var rhythm = UpdateRhythm.Of(track);
        var path = MotionPath.Of(track, take.Clock.Rate, take.TextRounding, rhythm);
        var marks = new TrackMarks(joint, track);
        marks.TellGaps();
        if (rhythm.Every > 1)
        {
            marks.TellRhythm(rhythm.Every);
        }

        Search(path, rhythm, settings, marks);
        var marked = marks.Track with { UpdateEvery = rhythm.Every };
        var (settled, all) = SignContinuity.Settle(marked, [.. before, .. marks.Findings], joint, flagGuesses: true);
        return new JointResult(settled, all);
    }

    private static void Search(MotionPath path, UpdateRhythm rhythm, StageSettings settings, TrackMarks marks)
    {
        var (outliers, end) = (settings.Outliers, path.Length - 1);
        int LastFrame(int index) => index >= end ? marks.Length - 1 : rhythm.FrameOf(index + 1) - 1;
        var longestSpike = outliers.LongestSpike.WholeFrames(path.Rate);
        var jumps = new JumpSearch(path, outliers.Threshold, longestSpike, Math.Min(outliers.TopSpeed / path.Rate, WidestTurn));
        var shortest = Math.Max(ShortestFreeze, outliers.Freeze.WholeFrames(path.Rate));
        foreach (var (first, last, turn) in new FreezeSearch(path, shortest, jumps.Noise).Run())
        {
            jumps.Refresh(first, last);
            marks.Reject(rhythm.FrameOf(first), LastFrame(last), FaultKind.Freeze, turn, spreads: null);
        }

        var stories = jumps.Run();
        foreach (var spike in stories.OfType<Story.Pop>())
        {
            marks.Reject(rhythm.FrameOf(spike.First), LastFrame(spike.Last), FaultKind.Spike, spike.Size, spike.Spreads);
        }

        foreach (var (first, last, size) in jumps.Unexplained())
        {
            marks.Flag(rhythm.FrameOf(first), LastFrame(last), size);
        }

        var steps = stories.OfType<Story.Step>().ToList();
        foreach (var offset in OffsetClosure.Take(steps, outliers.LongestOffset.WholeFrames(path.Rate), outliers.Threshold))
        {
            var (first, last) = (rhythm.FrameOf(offset.In.First), LastFrame(offset.Out.First - 1));
            if (offset.Out.First - offset.In.First <= longestSpike)
            {
                marks.Reject(first, last, FaultKind.Spike, offset.In.Size, offset.In.Spreads);
            }
            else if (Math.Max(offset.In.Size, offset.Out.Size) >= SmallestTurn)
            {
                // Where nothing may be mended, nothing is turned back either: no two ends agree exactly.
                marks.Offset(first, last, offset, settings.Fill.Method == FillMethod.None ? 0 : settings.Fill.Worst);
            }
        }

        foreach (var step in steps.Where(s => s.Size >= SmallestTurn))
        {
            marks.Step(rhythm.FrameOf(step.First), step);
        }
    }
}
