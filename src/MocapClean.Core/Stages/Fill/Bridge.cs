using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Fill;

/// <summary>A proposal for the samples of an open run.</summary>
/// <param name="Samples">One a frame, sign-continuous from the left edge on.</param>
/// <param name="SquaredErrors">Expected square of each sample's angular error, square radians.</param>
/// <param name="ArrivesNegated">The path reaches the right edge with the other sign: it turns by more than half a turn.</param>
internal sealed record Bridge(Quat[] Samples, double[] SquaredErrors, bool ArrivesNegated)
{
    /// <summary>Expected RMS error over some of its samples, radians.</summary>
    public double ExpectedError(int first, int count)
    {
        var sum = 0.0;
        foreach (var e in SquaredErrors.AsSpan(first, count))
        {
            sum += e;
        }

        return Math.Sqrt(sum / count);
    }
}
