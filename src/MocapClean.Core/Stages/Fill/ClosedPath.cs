using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Fill;

/// <summary>Chains turns from frame to frame so that they lead exactly from one orientation to another.</summary>
internal static class ClosedPath
{
    // Each round leaves the product of closing error and curvature of the path: five are usual, more only where both are large.
    private const int Rounds = 30;

    // Rounding of a chain of products in double precision, radians.
    private const double Closed = 1e-14;
    private const double NearlyClosed = 1e-12;

    /// <summary>
    /// Changes the turns so that their product leads from <paramref name="from"/> to <paramref name="to"/>: the closing error, seen from
    /// the middle of each interval, is shared out by the weights, until none is left. The closing error is the shortest rotation, so the
    /// path takes the branch (whole turns more or fewer) nearest to the turn that was predicted.
    /// </summary>
    /// <param name="from">Left edge.</param>
    /// <param name="to">Right edge, either sign.</param>
    /// <param name="turns">Rotation vectors of the intervals in order, each in the joint's own frame; changed in place.</param>
    /// <param name="weights">Shares of the closing error; their sum is 1.</param>
    /// <returns>The orientations after each turn; the last one is the right edge on the sign it is reached with.</returns>
    public static Quat[] Close(Quat from, Quat to, Span<Vec3> turns, ReadOnlySpan<double> weights)
    {
        var path = new Quat[turns.Length];
        var last = double.PositiveInfinity;
        for (var round = 0; round < Rounds; round++)
        {
            Chain(from, turns, path);
            var error = RotationVector.From(path[^1], to);
            if (error.Norm <= Closed || (error.Norm <= NearlyClosed && error.Norm >= last))
            {
                path[^1] = Quat.Dot(path[^1], to) < 0 ? -to : to;
                return path;
            }

            last = error.Norm;
            Share(from, path, path[^1].Rotate(error), turns, weights);
        }

        // Turns so wild that sharing does not settle say nothing: the straight way closes in one step.
        var straight = RotationVector.From(from, to);
        for (var i = 0; i < turns.Length; i++)
        {
            turns[i] = weights[i] * straight;
        }

        Chain(from, turns, path);
        path[^1] = Quat.Dot(path[^1], to) < 0 ? -to : to;
        return path;
    }

    private static void Share(Quat from, ReadOnlySpan<Quat> path, Vec3 errorInRoom, Span<Vec3> turns, ReadOnlySpan<double> weights)
    {
        var before = from;
        for (var i = 0; i < turns.Length; i++)
        {
            // Half the turn on from the sample before: the same place from both ends, so that time reversal gives the same path.
            var middle = before * RotationVector.Exp(0.5 * turns[i]);
            before = path[i];
            turns[i] += weights[i] * middle.Conjugate.Rotate(errorInRoom);
        }
    }

    private static void Chain(Quat from, ReadOnlySpan<Vec3> turns, Span<Quat> path)
    {
        var at = from;
        for (var i = 0; i < turns.Length; i++)
        {
            at = (at * RotationVector.Exp(turns[i])).Normalised();
            path[i] = at;
        }
    }
}
