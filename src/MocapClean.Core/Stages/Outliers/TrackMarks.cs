using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>What the search says of a track, frame by frame: states, breaks, samples turned back, and one row for one event.</summary>
internal sealed class TrackMarks(int joint, JointTrack track)
{
    private readonly Quat[] samples = [.. track.Samples];
    private readonly SampleState[] states = [.. track.States];
    private readonly SortedSet<int> breaks = [.. track.Breaks];
    private readonly List<Finding> findings = [];

    /// <summary>Number of frames.</summary>
    public int Length => states.Length;

    /// <summary>The track as marked.</summary>
    public JointTrack Track => track with
    {
        Samples = ImmutableCollectionsMarshal.AsImmutableArray(samples),
        States = ImmutableCollectionsMarshal.AsImmutableArray(states),
        Breaks = [.. breaks],
    };

    /// <summary>The rows, in order of frames.</summary>
    public IEnumerable<Finding> Findings => findings.OrderBy(f => f.First).ThenBy(f => f.Kind);

    /// <summary>One row for each run of missing samples, lost time apart.</summary>
    public void TellGaps()
    {
        for (var n = 0; n < states.Length; n++)
        {
            if (states[n] != SampleState.Missing)
            {
                continue;
            }

            var first = n;
            n = EndOf(first, SampleState.Missing);
            var isInside = first > 0 && n + 1 < states.Length;
            findings.Add(Row(first, n, FaultKind.Gap, FaultAction.Filled) with
            {
                SizeRadians = isInside ? Angle.Between(samples[first - 1], samples[n + 1]) : double.NaN,
            });
        }
    }

    /// <summary>The joint is slower than the take.</summary>
    public void TellRhythm(int every) => findings.Add(Row(0, states.Length - 1, FaultKind.SlowUpdate, FaultAction.Noted) with
    {
        Note = $"a new value every {every} frames: judged at that rate",
    });

    /// <summary>A run that the fill stage shall replace.</summary>
    public void Reject(int first, int last, FaultKind kind, double size, double? spreads)
    {
        for (var n = first; n <= last; n++)
        {
            states[n] = states[n] == SampleState.Missing ? SampleState.Missing : SampleState.Rejected;
        }

        foreach (var (from, to) in Runs(first, last, SampleState.Rejected))
        {
            findings.Add(Row(from, to, kind, FaultAction.Filled) with { SizeRadians = size, Spreads = spreads });
        }
    }

    /// <summary>A run that jumps about and has no story: kept as delivered, and nothing goes across it.</summary>
    public void Flag(int first, int last, double size)
    {
        foreach (var (from, to) in Runs(first, last, SampleState.Good).ToList())
        {
            states.AsSpan(from, to - from + 1).Fill(SampleState.Flagged);
            findings.Add(Row(from, to, FaultKind.Spike, FaultAction.Flagged) with
            {
                SizeRadians = size,
                Note = "jumps with too little motion between them to tell what happened",
            });
        }
    }

    /// <summary>From this frame on all is turned, and no way back is known: kept, and nothing goes across it.</summary>
    public void Step(int frame, Story.Step step)
    {
        breaks.Add(frame);
        findings.Add(Row(frame, frame, FaultKind.Step, FaultAction.Flagged) with
        {
            SizeRadians = step.Size,
            Spreads = step.Spreads,
            UndoRoom = step.Edge.RoomTurn.Conjugate,
            UndoJoint = step.Edge.JointTurn.Conjugate,
        });
    }

    /// <summary>Turns an offset back where its ends agree, flags it where they do not.</summary>
    public void Offset(int first, int last, OffsetStory story, double worst)
    {
        var agree = story.Disagreement <= worst;
        for (var n = first; n <= last && agree; n++)
        {
            if (states[n] is SampleState.Good or SampleState.TurnedBack)
            {
                var undo = OffsetMend.Undo(story, last == first ? 0.5 : (n - first) / (double)(last - first));
                samples[n] = OffsetMend.Apply(story, undo, samples[n]);
            }
        }

        var mended = agree ? SampleState.TurnedBack : SampleState.Flagged;
        foreach (var (from, to) in Runs(first, last, SampleState.Good).ToList())
        {
            states.AsSpan(from, to - from + 1).Fill(mended);
            findings.Add(OffsetRow(from, to, story, agree));
        }
    }

    private Finding OffsetRow(int first, int last, OffsetStory story, bool agree)
    {
        var undo = OffsetMend.Undo(story, 0.5);
        return Row(first, last, FaultKind.Offset, agree ? FaultAction.TurnedBack : FaultAction.Flagged) with
        {
            SizeRadians = (story.In.Size + story.Out.Size) / 2,
            Spreads = Math.Min(story.In.Spreads, story.Out.Spreads),
            UndoRoom = story.InRoom ? undo : null,
            UndoJoint = story.InRoom ? null : undo,
            ExpectedErrorRadians = agree ? OffsetMend.ExpectedError(story) : null,
            Note = agree ? "" : $"its two ends disagree by {Angle.ToDegrees(story.Disagreement):0.0} degrees",
        };
    }

    private Finding Row(int first, int last, FaultKind kind, FaultAction action) =>
        new() { Joint = joint, First = first, Last = last, Kind = kind, Action = action };

    private IEnumerable<(int First, int Last)> Runs(int first, int last, SampleState state)
    {
        for (var n = first; n <= last; n++)
        {
            if (states[n] == state)
            {
                var end = Math.Min(last, EndOf(n, state));
                yield return (n, end);
                n = end;
            }
        }
    }

    private int EndOf(int first, SampleState state)
    {
        var n = first;
        while (n + 1 < states.Length && states[n + 1] == state)
        {
            n++;
        }

        return n;
    }
}
