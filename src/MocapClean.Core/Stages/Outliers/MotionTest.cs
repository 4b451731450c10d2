using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// The other story: real motion that changes faster than a smooth path can, such as a blow, a landing or a bounce. A sample is motion when
/// the increments on one side of it lead there: at a steady speed, steadily speeding up or down, or anything between. A blow parts a path
/// into two, each of which explains its own samples; a fault is explained by neither.
/// </summary>
/// <param name="path">The series.</param>
internal sealed class MotionTest(MotionPath path)
{
    /// <summary>How far beyond the carried-on motions a sample may lie, as a part of what they differ by.</summary>
    private const double Leeway = 0.5;

    /// <summary>Samples that the instant of a blow may take.</summary>
    private const int Instant = 2;

    /// <summary>Increments on one side.</summary>
    private const int Steps = 3;

    /// <summary>
    /// Whether motion explains a run, parted between the motion before and after it in the best place. The instant of a blow takes
    /// one or two samples, which need to be roughly where motion leads only.
    /// </summary>
    /// <param name="first">First sample of the run.</param>
    /// <param name="last">Its last.</param>
    /// <param name="near">How near samples must be to where motion leads, radians.</param>
    /// <param name="roughly">How near those of the blow itself, radians.</param>
    public bool Explains(int first, int last, double near, double roughly)
    {
        int Rough(int n, int side) => OneSided(n, side) is var miss && miss <= near ? 0 : miss <= roughly ? 1 : Instant + 1;
        Span<int> after = stackalloc int[last - first + 2];
        for (var n = last; n >= first; n--)
        {
            after[n - first] = after[n - first + 1] + Rough(n, 1);
        }

        var (least, before) = (after[0], 0);
        for (var n = first; n <= last && before <= Instant; n++)
        {
            before += Rough(n, -1);
            least = Math.Min(least, before + after[n - first + 1]);
        }

        return least <= Instant;
    }

    /// <summary>
    /// How far the increment across an edge lies from what a blow at some moment between its samples would make of it: anything between
    /// where the motion before leads and where the motion after comes from, radians.
    /// </summary>
    public double Miss(int edge)
    {
        if (!path.IsWhole(edge - Steps - 1, edge + Steps))
        {
            return double.PositiveInfinity;
        }

        var wanted = Increment(edge, 0, -1);
        var (before, after) = (Carried.On(this, edge, -1), Carried.On(this, edge - 1, 1));
        // Seen from the other side the same turn has the opposite vector.
        after = new Carried(-after.Steady, -after.Even, -after.Bent);
        var least = double.PositiveInfinity;
        foreach (var from in (ReadOnlySpan<Vec3>)[before.Steady, before.Even, before.Bent])
        {
            foreach (var to in (ReadOnlySpan<Vec3>)[after.Steady, after.Even, after.Bent])
            {
                least = Math.Min(least, ToSegment(-wanted, from, to));
            }
        }

        return Math.Max(0, least - (Leeway * Math.Max(before.Range, after.Range)));
    }

    /// <summary>The largest turn between neighbours just outside a run, radians.</summary>
    public double Pace(int first, int last)
    {
        var most = 0.0;
        for (var n = first - Steps; n <= last + Steps; n++)
        {
            if ((n < first || n > last) && path.IsWhole(n - 1, n) && n - 1 != last)
            {
                most = Math.Max(most, Chart.Log(path.Samples[n - 1].Conjugate * path.Samples[n]).Norm);
            }
        }

        return most;
    }

    /// <summary>How far a sample lies from where the motion on one side leads.</summary>
    /// <param name="n">The sample.</param>
    /// <param name="side">-1 for the samples before it, 1 for those after it.</param>
    public double OneSided(int n, int side)
    {
        var far = n + (side * (Steps + 1));
        if (!path.IsWhole(Math.Min(n, far), Math.Max(n, far)))
        {
            return double.PositiveInfinity;
        }

        var on = Carried.On(this, n, side);
        var wanted = -Increment(n, 0, side);
        var distance = Math.Min(ToSegment(wanted, on.Steady, on.Even), ToSegment(wanted, on.Even, on.Bent));
        return Math.Max(0, distance - (Leeway * on.Range));
    }

    /// <summary>The increment that leads to a sample if the motion on one side is carried on: steady, evenly changing, or bent.</summary>
    private readonly record struct Carried(Vec3 Steady, Vec3 Even, Vec3 Bent)
    {
        /// <summary>How much it matters which.</summary>
        public double Range => Math.Max((Even - Steady).Norm, (Bent - Even).Norm);

        public static Carried On(MotionTest test, int n, int side)
        {
            var (a, b, c) = (-test.Increment(n, 1, side), -test.Increment(n, 2, side), -test.Increment(n, 3, side));
            return new(a, (2 * a) - b, (3 * (a - b)) + c);
        }
    }

    /// <summary>The turn, some samples away on one side, to the sample yet farther away.</summary>
    private Vec3 Increment(int n, int steps, int side)
    {
        var from = n + (side * steps);
        return Chart.Log(path.Samples[from].Conjugate * path.Samples[from + side]);
    }

    private static double ToSegment(Vec3 point, Vec3 from, Vec3 to)
    {
        var along = to - from;
        var length = along.NormSquared;
        var part = length > 0 ? Math.Clamp(Vec3.Dot(point - from, along) / length, 0, 1) : 0;
        return (point - from - (part * along)).Norm;
    }
}
