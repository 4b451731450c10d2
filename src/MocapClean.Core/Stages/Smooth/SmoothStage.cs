using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Smooths every run of trusted samples by itself, joint by joint, in the domain of quaternions. Runs that are too short for the method pass
/// as they are, and so do samples between which the joint turned too far for an average to mean anything; each with a row that says so.
/// </summary>
public sealed class SmoothStage : IStage
{
    /// <summary>
    /// Smoothed components shorter than this before they are brought to length 1 averaged samples up to 50 degrees off: the motion is faster
    /// than the filter.
    /// </summary>
    internal const double LeastLength = 0.9;

    /// <summary>Angle in radians, far below what is promised of any output, under which a sample counts as unchanged.</summary>
    private const double Unchanged = 1e-12;

    /// <inheritdoc/>
    public Take Run(Take take, StageContext context) =>
        PerJoint.Run(take, context, (joint, track, findings) => Smooth(take, joint, track, findings, context.PerJoint[joint].Smooth));

    private static JointResult Smooth(Take take, int joint, JointTrack track, ImmutableArray<Finding> findings, SmoothSettings settings)
    {
        if (settings.Method == SmoothMethod.None)
        {
            return new JointResult(track, findings);
        }

        var rows = ImmutableArray.CreateBuilder<Finding>();
        var smoother = Smoother(settings, take.Clock.Rate);
        var stretches = new List<Segment>();
        foreach (var segment in Segment.Trusted(track))
        {
            if (Refusal(segment, smoother, settings, take.Clock.Rate) is { } reason)
            {
                rows.Add(Row(joint, segment, FaultAction.Unsmoothed) with { Note = reason });
            }
            else
            {
                stretches.Add(segment);
            }
        }

        if (stretches.Count > 0)
        {
            var curve = new JointCurve(track, take.Clock, stretches, take.TextRounding);
            track = Replace(track, curve, smoother.Smooth(curve), settings.LargestRadians, joint, rows);
        }
        else
        {
            track = track with { Smoothing = new SmoothingMeasure(double.NaN, double.NaN) };
        }

        rows.Sort((a, b) => (a.First, -a.Last).CompareTo((b.First, -b.Last)));
        return new JointResult(track, findings.AddRange(rows));
    }

    private static ISmoother Smoother(SmoothSettings settings, double rate) => settings.Method switch
    {
        SmoothMethod.Whittaker => new WhittakerSmoother(),
        SmoothMethod.Butterworth => new ButterworthSmoother(settings.CutoffHertz),
        SmoothMethod.SavitzkyGolay => new SavitzkyGolaySmoother(settings.Window.WholeFrames(rate) | 1, settings.Order),
        _ => new AdaptiveSmoother(),
    };

    private static string? Refusal(Segment segment, ISmoother smoother, SmoothSettings settings, double rate)
    {
        if (settings.Method == SmoothMethod.Butterworth && !ButterworthSmoother.Exists(settings.CutoffHertz, rate))
        {
            return $"not smoothed: a cutoff of {settings.CutoffHertz} Hz is not below half of {Math.Round(rate, 3)} frames a second";
        }

        if (settings.Method == SmoothMethod.SavitzkyGolay && smoother.Shortest <= settings.Order)
        {
            return $"not smoothed: a window of {smoother.Shortest} samples leaves a polynomial of degree {settings.Order} nothing to average";
        }

        return segment.Count < smoother.Shortest
            ? $"not smoothed: {segment.Count} samples are too few for the method, which needs {smoother.Shortest}"
            : null;
    }

    private static JointTrack Replace(
        JointTrack track, JointCurve curve, SmoothedCurve smoothed, double largest, int joint, ImmutableArray<Finding>.Builder rows)
    {
        var samples = track.Samples.ToArray();
        var squared = new double[curve.Length];
        for (var s = 0; s < curve.Stretches.Count; s++)
        {
            var stretch = curve.Stretches[s];
            var (size, from) = (0.0, curve.Starts[s]);
            var (tooFast, held) = (new List<int>(), new List<int>());
            for (var i = from; i < curve.Starts[s + 1]; i++)
            {
                squared[i] = (smoothed.Samples[i] + (-curve.Samples[i])).NormSquared;
                var frame = stretch.First + i - from;
                if (smoothed.Samples[i].Norm < LeastLength)
                {
                    tooFast.Add(frame);
                    continue;
                }

                var wanted = smoothed.Samples[i].Normalised();
                var moved = Bounded(curve.Samples[i], wanted, largest);
                if (!moved.Equals(wanted))
                {
                    held.Add(frame);
                }

                var angle = Angle.Between(curve.Samples[i], moved);
                samples[frame] = angle > Unchanged ? curve.Signed(i, moved) : samples[frame];
                size = Math.Max(size, angle);
            }

            rows.Add(Row(joint, stretch, FaultAction.Smoothed) with { SizeRadians = size });
            rows.AddRange(Runs(joint, tooFast, FaultAction.Unsmoothed, "kept as it was: the joint turns faster here than the filter can follow"));
            rows.AddRange(Runs(joint, held, FaultAction.Smoothed, "smoothing would move it farther: held to the largest move allowed"));
        }

        var noise = 2 * Math.Sqrt(NoiseEstimate.Variance(squared, smoothed.Leverage, curve.Finest));
        return track with { Samples = [.. samples], Smoothing = new SmoothingMeasure(noise, smoothed.EquivalentCutoff(curve.Rate)) };
    }

    private static Quat Bounded(Quat from, Quat to, double largest)
    {
        if (double.IsPositiveInfinity(largest))
        {
            return to;
        }

        var turn = RotationVector.From(from, to);
        var angle = turn.Norm;
        return angle <= largest ? to : from * RotationVector.Exp(largest / angle * turn);
    }

    // A row for every run of neighbouring frames.
    private static IEnumerable<Finding> Runs(int joint, List<int> frames, FaultAction action, string note)
    {
        for (var (first, n) = (0, 1); n <= frames.Count; n++)
        {
            if (n == frames.Count || frames[n] > frames[n - 1] + 1)
            {
                yield return Row(joint, new Segment(frames[first], frames[n - 1]), action) with { Note = note };
                first = n;
            }
        }
    }

    private static Finding Row(int joint, Segment run, FaultAction action) =>
        new() { Joint = joint, First = run.First, Last = run.Last, Kind = FaultKind.Smoothing, Action = action };
}
