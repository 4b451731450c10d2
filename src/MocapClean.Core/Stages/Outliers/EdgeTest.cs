using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>What a jump measures, told twice: one jump cannot say on which side the samples after it are turned.</summary>
/// <param name="Room">Turned on the left, in the frame the samples are delivered in: what the test measured so.</param>
/// <param name="RoomTurn">The rotation on the left of the samples after the edge.</param>
/// <param name="Joint">Turned on the right, in the joint's own frame: what the test measured so.</param>
/// <param name="JointTurn">The rotation on the right of the samples after the edge.</param>
internal readonly record struct EdgeMeasure(RunMeasure Room, Quat RoomTurn, RunMeasure Joint, Quat JointTurn)
{
    /// <summary>The telling that leaves the motion on both sides in better agreement.</summary>
    public RunMeasure Better => Joint.Misfit < Room.Misfit ? Joint : Room;
}

/// <summary>
/// The test of an edge: does the motion before and after it predict the increment across it? A polynomial with a free jump. A turn on the left
/// does not change increments seen in the joint's frame, a turn on the right none seen in the room, so each telling has its own charts,
/// one around the nearest neighbour on each side, in which the jump itself does not appear.
/// </summary>
internal sealed class EdgeTest
{
    private readonly FitCache fits = new(Solve);

    /// <summary>Tests the edge before a sample; null where too little is seen to tell.</summary>
    public EdgeMeasure? At(MotionPath path, int edge, Pattern most) => Across(path, edge, edge - 1, most);

    /// <summary>Tests the samples on both sides of a run as if it were not there.</summary>
    public EdgeMeasure? Across(MotionPath path, int first, int last, Pattern most)
    {
        var neighbours = TrustedNeighbours.Of(path, first, last, most, stackalloc int[2 * Pattern.Most]);
        if (!neighbours.Suffice)
        {
            return null;
        }

        Span<Vec3> joint = stackalloc Vec3[neighbours.Count];
        Span<Vec3> room = stackalloc Vec3[neighbours.Count];
        var (left, right) = (path.Samples[neighbours.Before[0]], path.Samples[neighbours.After[0]]);
        for (var i = 0; i < joint.Length; i++)
        {
            var centre = i < neighbours.Before.Length ? left : right;
            joint[i] = Chart.Log(centre.Conjugate * path.Samples[neighbours[i]]);
            room[i] = centre.Rotate(joint[i]);
            if (joint[i].NormSquared > Chart.Edge * Chart.Edge)
            {
                return null;
            }
        }

        var fit = fits.For(neighbours);
        // Turned on the left, the motion that the joint feels goes on: the true sample after the edge is left exp(motion).
        var roomTurn = right * (left * RotationVector.Exp(fit.Predict(0, joint))).Conjugate;
        var jointTurn = (RotationVector.Exp(fit.Predict(0, room)) * left).Conjugate * right;
        var pattern = neighbours.Pattern;
        return new EdgeMeasure(
            new RunMeasure(pattern, Chart.Log(roomTurn).Norm, fit.Misfit(joint)), roomTurn,
            new RunMeasure(pattern, Chart.Log(jointTurn).Norm, fit.Misfit(room)), jointTurn);
    }

    private static NeighbourFit Solve(TrustedNeighbours neighbours)
    {
        Span<double> times = stackalloc double[neighbours.Count];
        neighbours.Times(times);
        var (before, after) = (neighbours.Before.Length, neighbours.After.Length);
        // Where neighbours are short, no more than they can tell on the poorer side, and one value to spare.
        var degree = Math.Min(neighbours.Pattern.Degree, Math.Min(before + after - 3, (2 * Math.Min(before, after)) - 1));
        return NeighbourFit.WithJump(times, before, degree);
    }
}
