using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// Builds bridges across the open runs of one track. Every method predicts the turns inside a run and shares out what is lacking to
/// reach the other edge; the models of the motion, learned when first needed, say how far from the truth the result is likely to be.
/// </summary>
internal sealed class Bridging
{
    private readonly JointTrack track;
    private readonly FillMethod method;
    private readonly Increments increments;
    private readonly MotionModels models;
    private readonly GaussianBridge process;

    public Bridging(JointTrack track, Clock clock, double textRounding, FillMethod method)
    {
        (this.track, this.method) = (track, method);
        increments = new Increments(track, clock);
        models = new MotionModels(increments, clock.Rate, textRounding);
        process = new GaussianBridge(increments, models);
    }

    /// <summary>The bridge across a run with two trusted edges, or null where the track has nothing to learn its motion from.</summary>
    public Bridge? Across(OpenRun run)
    {
        if (!models.CanLearn)
        {
            return null;
        }

        var (from, to) = (track.Samples[run.First - 1], track.Samples[run.Last + 1]);
        var (turns, shares, squares) = process.Across(run);
        var expected = ClosedPath.Close(from, to, turns, shares);
        if (method == FillMethod.GaussianProcess)
        {
            return Result(expected, squares, to);
        }

        (turns, shares) = method == FillMethod.Spline ? CubicTurns.Across(increments, run, from, to) : ConstantTurns(run);
        var path = ClosedPath.Close(from, to, turns, shares);
        for (var g = 0; g < path.Length; g++)
        {
            // The mean square about any other estimate is the variance plus its distance from the mean.
            var away = Angle.Between(path[g], expected[g]);
            squares[g] += away * away;
        }

        return Result(path, squares, to);
    }

    private static Bridge Result(Quat[] path, double[] squares, Quat to) =>
        new(path[..^1], squares[..^1], Quat.Dot(path[^1], to) < 0);

    private (Vec3[] Turns, double[] Shares) ConstantTurns(OpenRun run)
    {
        var (first, count) = (run.First - 1, run.Count + 1);
        var elapsed = increments.Elapsed(first, count);
        return (new Vec3[count], [.. Enumerable.Range(first, count).Select(i => increments.Tick(i) / elapsed)]);
    }
}
