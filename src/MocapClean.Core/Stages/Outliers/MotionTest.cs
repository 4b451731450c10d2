using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// The other story: real motion that changes faster than a smooth path can, such as a blow, a landing or a bounce. A sample is motion when
/// the increments on one side of it lead there: at a steady speed, steadily speeding up or down, or anything between. A blow parts a path
/// into two, each of which explains its own samples; a fault is explained by neither.
/// </summary>
internal sealed class MotionTest
{
    /// <summary>How far beyond the carried-on motions a sample may lie, as a part of what they differ by.</summary>
    private const double Leeway = 0.5;

    /// <summary>Samples that the instant of a blow may take.</summary>
    private const int Instant = 2;

    /// <summary>Increments on one side.</summary>
    private const int Steps = 3;

    private readonly MotionPath path;
    private readonly int first;
    private readonly double[] before;
    private readonly double[] after;

    /// <summary>Looks at a range of samples.</summary>
    public MotionTest(MotionPath path, int first, int last)
    {
        this.path = path;
        this.first = first;
        before = new double[last - first + 1];
        after = new double[last - first + 1];
        for (var n = first; n <= last; n++)
        {
            before[n - first] = OneSided(path, n, -1);
            after[n - first] = OneSided(path, n, 1);
        }
    }

    /// <summary>How far a sample lies from where the motion on one side leads, radians; infinite where too little is there.</summary>
    /// <param name="path">The series.</param>
    /// <param name="n">The sample.</param>
    /// <param name="side">-1 for the samples before it, 1 for those after it.</param>
    public static double OneSided(MotionPath path, int n, int side)
    {
        var far = n + (side * (Steps + 1));
        if (!path.IsWhole(Math.Min(n, far), Math.Max(n, far)))
        {
            return double.PositiveInfinity;
        }

        var on = Carried.On(path, n, side);
        var wanted = -Increment(path, n, 0, side);
        var distance = Math.Min(ToSegment(wanted, on.Steady, on.Even), ToSegment(wanted, on.Even, on.Bent));
        return Math.Max(0, distance - (Leeway * on.Range));
    }

    /// <summary>
    /// How far the increment across an edge lies from what a blow at some moment between its samples would make of it: anything between
    /// where the motion before leads and where the motion after comes from, radians.
    /// </summary>
    public static double AcrossEdge(MotionPath path, int edge)
    {
        if (!path.IsWhole(edge - Steps - 1, edge + Steps))
        {
            return double.PositiveInfinity;
        }

        var wanted = -Increment(path, edge, 0, -1);
        var (from, to) = (Carried.On(path, edge, -1), Carried.On(path, edge - 1, 1));
        var least = double.PositiveInfinity;
        foreach (var start in (ReadOnlySpan<Vec3>)[from.Steady, from.Even, from.Bent])
        {
            // Seen from the other side the same turn has the opposite vector.
            foreach (var end in (ReadOnlySpan<Vec3>)[-to.Steady, -to.Even, -to.Bent])
            {
                least = Math.Min(least, ToSegment(wanted, start, end));
            }
        }

        return Math.Max(0, least - (Leeway * Math.Max(from.Range, to.Range)));
    }

    /// <summary>
    /// Whether motion explains a run within the range, parted between the motion before and after it in the best place. The instant of a
    /// blow takes one or two samples, which need to be roughly where motion leads only.
    /// </summary>
    /// <param name="start">First sample of the run.</param>
    /// <param name="end">Its last.</param>
    /// <param name="near">How near samples must be to where motion leads, radians.</param>
    /// <param name="roughly">How near those of the blow itself, radians.</param>
    public bool Explains(int start, int end, double near, double roughly)
    {
        int Rough(double miss) => miss <= near ? 0 : miss <= roughly ? 1 : Instant + 1;
        var (fromAfter, fromBefore) = (0, 0);
        for (var n = start; n <= end; n++)
        {
            fromAfter += Rough(after[n - first]);
        }

        var least = fromAfter;
        for (var n = start; n <= end && fromBefore <= Instant; n++)
        {
            fromBefore += Rough(before[n - first]);
            fromAfter -= Rough(after[n - first]);
            least = Math.Min(least, fromBefore + fromAfter);
        }

        return least <= Instant;
    }

    /// <summary>The largest turn between neighbours just outside a run, radians.</summary>
    public double Pace(int start, int end)
    {
        var most = 0.0;
        for (var n = start - Steps; n <= end + Steps + 1; n++)
        {
            if ((n < start || n > end + 1) && path.IsWhole(n - 1, n))
            {
                most = Math.Max(most, Chart.Log(path.Samples[n - 1].Conjugate * path.Samples[n]).Norm);
            }
        }

        return most;
    }

    /// <summary>The turn, some samples away on one side, to the sample yet farther away.</summary>
    private static Vec3 Increment(MotionPath path, int n, int steps, int side)
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

    /// <summary>The increment that leads to a sample if the motion on one side is carried on: steady, evenly changing, or bent.</summary>
    private readonly record struct Carried(Vec3 Steady, Vec3 Even, Vec3 Bent)
    {
        /// <summary>How much it matters which.</summary>
        public double Range => Math.Max((Even - Steady).Norm, (Bent - Even).Norm);

        public static Carried On(MotionPath path, int n, int side)
        {
            var (a, b, c) = (-Increment(path, n, 1, side), -Increment(path, n, 2, side), -Increment(path, n, 3, side));
            return new(a, (2 * a) - b, (3 * (a - b)) + c);
        }
    }
}
