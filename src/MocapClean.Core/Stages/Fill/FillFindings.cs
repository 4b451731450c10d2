using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>Brings the findings of a joint in line with what was decided about its open runs.</summary>
internal static class FillFindings
{
    /// <summary>
    /// Gaps, spikes and freezes within a run become filled, left or flagged; missing samples that no gap row tells of get one.
    /// </summary>
    public static ImmutableArray<Finding> Settle(
        int joint, JointTrack before, ImmutableArray<Finding> findings, ImmutableArray<SettledRun> runs)
    {
        var all = findings.ToList();
        foreach (var settled in runs)
        {
            AddGaps(all, joint, before, settled.Run);
        }

        return [.. all.Select(f => Settle(f, before, runs)).OrderBy(f => f.First)];
    }

    private static Finding Settle(Finding finding, JointTrack before, ImmutableArray<SettledRun> runs)
    {
        if (finding.Kind is not (FaultKind.Gap or FaultKind.Spike or FaultKind.Freeze)
            || runs.FirstOrDefault(r => r.Run.First <= finding.First && finding.Last <= r.Run.Last) is not { } settled)
        {
            return finding;
        }

        finding = double.IsNaN(finding.SizeRadians) ? finding with { SizeRadians = Width(before, settled.Run) } : finding;
        if (settled.Bridge is { } bridge)
        {
            var error = bridge.ExpectedError(finding.First - settled.Run.First, finding.Count);
            return finding with { Action = FaultAction.Filled, ExpectedErrorRadians = error };
        }

        var note = "not filled: " + settled.Refusal;
        return finding with
        {
            Action = finding.Kind == FaultKind.Gap ? FaultAction.Left : FaultAction.Flagged,
            ExpectedErrorRadians = null,
            Note = finding.Note.Length > 0 ? $"{finding.Note}; {note}" : note,
        };
    }

    private static void AddGaps(List<Finding> all, int joint, JointTrack before, OpenRun run)
    {
        var gaps = all.Where(f => f.Kind == FaultKind.Gap && f.First <= run.Last && f.Last >= run.First).ToList();
        for (var n = run.First; n <= run.Last; n++)
        {
            var first = n;
            while (n <= run.Last && before.States[n] == SampleState.Missing && !gaps.Exists(g => g.First <= n && n <= g.Last))
            {
                n++;
            }

            if (n > first)
            {
                all.Add(new Finding { Joint = joint, First = first, Last = n - 1, Kind = FaultKind.Gap, Action = FaultAction.Left });
            }
        }
    }

    /// <summary>The turn from edge to edge; NaN at the ends of a track.</summary>
    private static double Width(JointTrack track, OpenRun run) =>
        run.First == 0 || run.Last == track.Length - 1
            ? double.NaN
            : Angle.Between(track.Samples[run.First - 1], track.Samples[run.Last + 1]);
}
