using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>A step and the later one that undoes it.</summary>
/// <param name="In">The step in.</param>
/// <param name="Out">The step back.</param>
/// <param name="InRoom">Turned on the left, in the frame the samples are delivered in; on the right, in the joint's own, otherwise.</param>
/// <param name="TurnIn">The rotation of the samples inside as the first edge tells it.</param>
/// <param name="TurnOut">The same as the second edge tells it.</param>
internal sealed record OffsetStory(Story.Step In, Story.Step Out, bool InRoom, Quat TurnIn, Quat TurnOut)
{
    /// <summary>By how much the two edges disagree, radians.</summary>
    public double Disagreement => Angle.Between(TurnIn, TurnOut);

    /// <summary>What they may disagree by for the uncertainty of both alone, in one robust spread, radians.</summary>
    public double Spread => Math.Sqrt((In.Spread * In.Spread) + (Out.Spread * Out.Spread));
}

/// <summary>
/// Pairs steps that undo each other. The pair that closes best comes first; once it is out of the way its neighbours may be a pair.
/// </summary>
internal static class OffsetClosure
{
    /// <summary>An offset that returns by four fifths is one; its ends disagree, but two unrelated steps would by far more.</summary>
    private const double Returned = 0.2;

    /// <summary>However uncertain the edges, what disagrees by more than this part of the turn is no return.</summary>
    private const double Unrelated = 0.4;

    /// <summary>Takes the pairs out of a list of steps in order of frames.</summary>
    /// <param name="steps">The steps; those that stay have no way back.</param>
    /// <param name="longest">Samples of the longest offset.</param>
    /// <param name="threshold">Robust spreads that the ends may disagree by in any case.</param>
    public static List<OffsetStory> Take(List<Story.Step> steps, int longest, double threshold)
    {
        var found = new List<OffsetStory>();
        while (Best(steps, longest, threshold) is var best and >= 0)
        {
            found.Add(Closed(steps[best], steps[best + 1]));
            steps.RemoveRange(best, 2);
        }

        return found;
    }

    private static int Best(List<Story.Step> steps, int longest, double threshold)
    {
        var (best, least) = (-1, double.PositiveInfinity);
        for (var i = 0; i + 1 < steps.Count; i++)
        {
            var pair = Closed(steps[i], steps[i + 1]);
            var size = Math.Min(pair.In.Size, pair.Out.Size);
            var allowed = Math.Min(Math.Max(threshold * pair.Spread, Returned * size), Unrelated * size);
            if (pair.Out.First - pair.In.First <= longest && pair.Disagreement < Math.Min(allowed, least))
            {
                (best, least) = (i, pair.Disagreement);
            }
        }

        return best;
    }

    private static OffsetStory Closed(Story.Step first, Story.Step second)
    {
        var room = new OffsetStory(first, second, InRoom: true, first.Edge.RoomTurn, second.Edge.RoomTurn.Conjugate);
        var joint = new OffsetStory(first, second, InRoom: false, first.Edge.JointTurn, second.Edge.JointTurn.Conjugate);
        return joint.Disagreement < room.Disagreement ? joint : room;
    }
}
