using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>Any two takes side by side, whoever made them: aligned by time, matched by the names of their joints.</summary>
/// <param name="Joints">Joints that both have, in the order of the first take.</param>
/// <param name="OnlyBefore">Names of joints that only the first take has.</param>
/// <param name="OnlyAfter">Names of joints that only the second take has.</param>
/// <param name="PairedFrames">Frames of the first take that have a partner in the second.</param>
public sealed record TakeComparison(
    ImmutableArray<JointComparison> Joints, ImmutableArray<string> OnlyBefore, ImmutableArray<string> OnlyAfter, int PairedFrames)
{
    /// <summary>
    /// Both takes have the same joints, some frames in common, the same samples missing, and no angle above the tolerance in radians.
    /// </summary>
    public bool IsWithin(double tolerance) => OnlyBefore.IsEmpty && OnlyAfter.IsEmpty && PairedFrames > 0
        && Joints.All(j => j.MissingBefore + j.MissingAfter == 0 && j.Change.Largest <= tolerance);

    /// <summary>Compares two takes.</summary>
    /// <param name="before">The first take, after ingest.</param>
    /// <param name="after">The second take, after ingest.</param>
    /// <param name="shift">Frames by which the second take's clock is set later.</param>
    public static TakeComparison Of(Take before, Take after, int shift)
    {
        var partner = Align(before.Clock, after.Clock, shift);
        var there = after.Tracks.ToLookup(t => t.Name, StringComparer.Ordinal);
        var names = before.Tracks.Select(t => t.Name).ToHashSet(StringComparer.Ordinal);
        return new TakeComparison(
            [.. before.Tracks.Where(t => there[t.Name].Any()).Select(t => JointComparison.Of(t, there[t.Name].First(), partner))],
            [.. before.Tracks.Where(t => !there[t.Name].Any()).Select(t => t.Name)],
            [.. after.Tracks.Where(t => !names.Contains(t.Name)).Select(t => t.Name)],
            partner.Count(p => p >= 0));
    }

    /// <summary>For each frame of the first clock the nearest frame of the second within half an interval, or -1.</summary>
    private static int[] Align(Clock before, Clock after, int shift)
    {
        var later = shift / after.Rate;
        var partner = new int[before.Length];
        var m = 0;
        for (var n = 0; n < partner.Length; n++)
        {
            var time = before.Steady[n];
            while (m + 1 < after.Length && Math.Abs(after.Steady[m + 1] + later - time) <= Math.Abs(after.Steady[m] + later - time))
            {
                m++;
            }

            partner[n] = Math.Abs(after.Steady[m] + later - time) <= 0.5 * before.Interval ? m : -1;
        }

        return partner;
    }
}

/// <summary>How far one joint differs between two takes, radians.</summary>
/// <param name="Name">The joint's name.</param>
/// <param name="Compared">Frames in which both have a sample.</param>
/// <param name="Changed">Frames in which the orientations differ by more than a millionth of a degree.</param>
/// <param name="Change">Largest, RMS and 95th percentile over the compared frames.</param>
/// <param name="LargestAt">Frame of the first take with the largest difference; -1 where nothing was compared.</param>
/// <param name="MissingBefore">Paired frames in which only the second take has a sample.</param>
/// <param name="MissingAfter">Paired frames in which only the first take has a sample.</param>
public sealed record JointComparison(
    string Name, int Compared, int Changed, ChangeSize Change, int LargestAt, int MissingBefore, int MissingAfter)
{
    /// <summary>Finer than any capture and than the digits of usual files.</summary>
    private static readonly double Same = Angle.FromDegrees(1e-6);

    internal static JointComparison Of(JointTrack before, JointTrack after, int[] partner)
    {
        var (angles, changed, at, largest) = (new List<double>(), 0, -1, -1.0);
        var (missingBefore, missingAfter) = (0, 0);
        for (var n = 0; n < partner.Length; n++)
        {
            if (partner[n] < 0)
            {
                continue;
            }

            var (a, b) = (before.States[n] != SampleState.Missing, after.States[partner[n]] != SampleState.Missing);
            missingBefore += !a && b ? 1 : 0;
            missingAfter += a && !b ? 1 : 0;
            if (a && b)
            {
                var angle = Angle.Between(before.Samples[n], after.Samples[partner[n]]);
                angles.Add(angle);
                changed += angle > Same ? 1 : 0;
                (largest, at) = angle > largest ? (angle, n) : (largest, at);
            }
        }

        return new JointComparison(before.Name, angles.Count, changed, ChangeSize.Of(angles), at, missingBefore, missingAfter);
    }
}
