using System.Collections.Immutable;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Kernels;

/// <summary>
/// Chooses between q and -q for every sample of a track. Each believed sample takes the sign whose inner product with the believed one
/// before it is not negative, across gaps too; the whole track then keeps the sign that changes fewest delivered samples (a tie: the
/// first sample's). Samples that are not believed follow their neighbours where those agree, and stay as delivered where they do not.
/// </summary>
public static class SignContinuity
{
    /// <summary>Neighbours turned apart by more than 170 degrees: which sign goes on is a guess.</summary>
    private static readonly double GuessBelow = Math.Cos(Angle.FromDegrees(170) / 2);

    /// <summary>
    /// The track with its signs settled anew from the delivered ones, and its findings with the sign-flip rows replaced: one row a run.
    /// </summary>
    /// <param name="track">A track before smoothing.</param>
    /// <param name="findings">The joint's findings so far.</param>
    /// <param name="joint">Index of the track.</param>
    /// <param name="flagGuesses">
    /// Flag neighbours about 180 degrees apart and end segments there, unless a finding begins or ends at that frame anyway.
    /// </param>
    public static (JointTrack Track, ImmutableArray<Finding> Findings) Settle(
        JointTrack track, ImmutableArray<Finding> findings, int joint, bool flagGuesses)
    {
        var flips = Choose(track, out var guesses);
        // What only the format can see (an Euler leap) carries a note and stays: there is no sign to settle in it.
        var kept = findings.RemoveAll(f => f.Kind == FaultKind.SignFlip && f.Note.Length == 0);
        var rows = Runs(track, flips).Select(r => Row(joint, r.First, r.Last, FaultAction.Flipped));
        var breaks = track.Breaks;
        if (flagGuesses)
        {
            var open = guesses.Where(g => !kept.Any(f => f.First == g || f.Last + 1 == g) && !breaks.Contains(g)).ToList();
            rows = rows.Concat(open.Select(g => Row(joint, g, g, FaultAction.Flagged) with
            {
                SizeRadians = Angle.Between(track.Delivered[g - 1], track.Delivered[g]),
                Note = "about half a turn between two frames: which sign goes on is a guess",
            }));
            breaks = [.. breaks.Concat(open).Order()];
        }

        var told = track.HasSigns ? rows.OrderBy(r => r.First) : Enumerable.Empty<Finding>();
        return (track with { Samples = Apply(track, flips), Breaks = breaks }, [.. kept, .. told]);
    }

    private static Finding Row(int joint, int first, int last, FaultAction action) =>
        new() { Joint = joint, First = first, Last = last, Kind = FaultKind.SignFlip, Action = action };

    private static bool IsBelieved(SampleState state) => state is SampleState.Good or SampleState.Filled or SampleState.TurnedBack;

    /// <summary>The orientation is the one delivered, so its delivered sign can be kept or changed.</summary>
    private static bool IsDelivered(SampleState state) => state is SampleState.Good or SampleState.Rejected or SampleState.Flagged;

    private static Quat Base(JointTrack track, int n) => IsDelivered(track.States[n]) ? track.Delivered[n] : track.Samples[n];

    private static bool[] Choose(JointTrack track, out List<int> guesses)
    {
        var flips = new bool[track.Length];
        guesses = [];
        var (last, changed, counted) = (-1, 0, 0);
        for (var n = 0; n < flips.Length; n++)
        {
            if (!IsBelieved(track.States[n]))
            {
                continue;
            }

            if (last >= 0)
            {
                var dot = Quat.Dot(Base(track, last), Base(track, n));
                flips[n] = flips[last] ^ (dot < 0);
                if (last == n - 1 && Math.Abs(dot) < GuessBelow)
                {
                    guesses.Add(n);
                }
            }

            if (track.States[n] == SampleState.Good)
            {
                counted++;
                changed += flips[n] ? 1 : 0;
            }

            last = n;
        }

        if (2 * changed > counted)
        {
            for (var n = 0; n < flips.Length; n++)
            {
                flips[n] = IsBelieved(track.States[n]) && !flips[n];
            }
        }

        FollowNeighbours(track, flips);
        return flips;
    }

    private static void FollowNeighbours(JointTrack track, bool[] flips)
    {
        var last = -1;
        for (var n = 0; n <= flips.Length; n++)
        {
            if (n < flips.Length && !IsBelieved(track.States[n]))
            {
                continue;
            }

            var before = last >= 0 ? flips[last] : n < flips.Length && flips[n];
            var both = before && (n == flips.Length || flips[n]);
            for (var m = last + 1; m < n && both; m++)
            {
                flips[m] = track.States[m] != SampleState.Missing;
            }

            last = n;
        }
    }

    private static ImmutableArray<Quat> Apply(JointTrack track, bool[] flips)
    {
        Quat[]? samples = null;
        for (var n = 0; n < flips.Length; n++)
        {
            var settled = flips[n] ? -Base(track, n) : Base(track, n);
            if (!settled.Equals(track.Samples[n]))
            {
                samples ??= [.. track.Samples];
                samples[n] = settled;
            }
        }

        return samples is null ? track.Samples : ImmutableCollectionsMarshal.AsImmutableArray(samples);
    }

    /// <summary>Runs of delivered samples that change sign; gaps and mends inside a run do not end it.</summary>
    private static IEnumerable<Segment> Runs(JointTrack track, bool[] flips)
    {
        var (first, last) = (-1, -1);
        for (var n = 0; n < flips.Length; n++)
        {
            if (!IsDelivered(track.States[n]))
            {
                continue;
            }

            if (flips[n])
            {
                first = first < 0 ? n : first;
                last = n;
            }
            else if (first >= 0)
            {
                yield return new Segment(first, last);
                first = -1;
            }
        }

        if (first >= 0)
        {
            yield return new Segment(first, last);
        }
    }
}
