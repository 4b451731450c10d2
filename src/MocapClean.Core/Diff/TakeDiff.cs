using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>What was delivered against what is written, take by take; the ground of every report.</summary>
public sealed record TakeDiff
{
    /// <summary>The take's name.</summary>
    public required string Name { get; init; }

    /// <summary>All rows: the whole take's first, then joint by joint by frame, then smoothing.</summary>
    public required ImmutableArray<DiffRow> Rows { get; init; }

    /// <summary>One for each track.</summary>
    public required ImmutableArray<JointDiff> Joints { get; init; }

    /// <summary>Compares the take's delivered samples with those it now holds.</summary>
    public static TakeDiff Of(Take take)
    {
        var joints = take.Tracks.Select((t, j) => Compare(t, take.Findings.Where(f => f.Joint == j))).ToImmutableArray();
        var rows = take.Findings
            .OrderBy(f => f.Kind == FaultKind.Smoothing).ThenBy(f => f.Joint).ThenBy(f => f.First).ThenBy(f => f.Kind)
            .Select(f => new DiffRow(f, Largest(take, f))).ToImmutableArray();
        return new TakeDiff { Name = take.Name, Rows = rows, Joints = joints };
    }

    /// <summary>A sample whose delivered text cannot stay.</summary>
    public static bool IsRewritten(JointTrack track, int frame) =>
        !track.Samples[frame].Equals(track.Delivered[frame]) || track.Renormalised.BinarySearch(frame) >= 0;

    private static JointDiff Compare(JointTrack track, IEnumerable<Finding> findings)
    {
        var (identical, rewritten, missing, mended) = (0, 0, 0, 0);
        var (smoothing, mends) = (new List<double>(), new List<double>());
        for (var n = 0; n < track.Length; n++)
        {
            var state = track.States[n];
            if (state == SampleState.Missing)
            {
                missing++;
            }
            else if (!IsRewritten(track, n))
            {
                identical++;
            }
            else if (state is SampleState.Filled or SampleState.TurnedBack)
            {
                mended++;
                AddAngle(mends, track, n);
            }
            else if (IsSameOrientation(track.Samples[n], track.Delivered[n]))
            {
                rewritten++;
            }
            else
            {
                AddAngle(smoothing, track, n);
            }
        }

        return new JointDiff
        {
            Name = track.Name,
            Missing = missing,
            Identical = identical,
            Rewritten = rewritten,
            Smoothed = smoothing.Count,
            Smoothing = ChangeSize.Of(smoothing),
            Mended = mended,
            Mends = ChangeSize.Of(mends),
            BadFrames = BadFrames.Merge(findings, new Segment(0, track.Length - 1)).Sum(s => s.Count),
        };
    }

    private static bool IsSameOrientation(Quat a, Quat b) => a.Equals(b) || a.Equals(-b);

    private static void AddAngle(List<double> angles, JointTrack track, int n)
    {
        var angle = Angle.Between(track.Delivered[n], track.Samples[n]);
        if (!double.IsNaN(angle))
        {
            angles.Add(angle);
        }
    }

    private static double Largest(Take take, Finding f)
    {
        if (f.Joint < 0 || f.Action is FaultAction.Flagged or FaultAction.Left or FaultAction.Noted or FaultAction.Unsmoothed)
        {
            return f.SizeRadians;
        }

        if (f.Action is FaultAction.Flipped or FaultAction.Renormalised)
        {
            return 0;
        }

        var track = take.Tracks[f.Joint];
        var largest = double.NaN;
        for (var n = f.First; n <= f.Last; n++)
        {
            // Mends inside a smoothed segment have rows of their own.
            var counts = f.Kind != FaultKind.Smoothing || track.States[n] == SampleState.Good;
            var angle = counts ? Angle.Between(track.Delivered[n], track.Samples[n]) : double.NaN;
            largest = angle > largest || double.IsNaN(largest) ? angle : largest;
        }

        return double.IsNaN(largest) ? f.SizeRadians : largest;
    }
}
