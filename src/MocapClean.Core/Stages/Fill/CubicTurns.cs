using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// The cubic whose speeds at both edges are those of the neighbours: its angular velocity runs straight from one speed to the other,
/// plus a parabola that closes the path.
/// </summary>
internal static class CubicTurns
{
    /// <summary>Turns along the straight line between the edge speeds, and the parabola's shares.</summary>
    public static (Vec3[] Turns, double[] Shares) Across(Increments increments, OpenRun run, Quat from, Quat to)
    {
        var (first, count) = (run.First - 1, run.Count + 1);
        var elapsed = increments.Elapsed(first, count);
        var mean = (1 / elapsed) * RotationVector.From(from, to);
        var left = EdgeSpeed(increments, first - 1, -1) ?? mean;
        var right = EdgeSpeed(increments, first + count, 1) ?? mean;
        var (turns, shares) = (new Vec3[count], new double[count]);
        var past = 0.0;
        for (var g = 0; g < count; g++)
        {
            var tick = increments.Tick(first + g) / elapsed;
            var middle = past + (tick / 2);
            turns[g] = (tick * elapsed) * (((1 - middle) * left) + (middle * right));
            shares[g] = Eased(past + tick) - Eased(past);
            past += tick;
        }

        return (turns, shares);
    }

    /// <summary>The integral from 0 of 6 t (1 - t), which is 1 at 1.</summary>
    private static double Eased(double t) => t * t * (3 - (2 * t));

    /// <summary>
    /// Speed at the edge by the straight line through the two nearest increments; of one alone, its own; null without any.
    /// </summary>
    private static Vec3? EdgeSpeed(Increments increments, int near, int step)
    {
        if (!increments.IsKnown(near))
        {
            return null;
        }

        var next = near + step;
        return increments.IsKnown(next) ? (1.5 * increments.Turn(near)) - (0.5 * increments.Turn(next)) : increments.Turn(near);
    }
}
