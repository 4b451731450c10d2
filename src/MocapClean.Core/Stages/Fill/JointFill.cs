using System.Collections.Immutable;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Fill;

/// <summary>Decides about every open run of one joint, and writes what was decided into its track.</summary>
internal sealed class JointFill(JointTrack track, Clock clock, double textRounding, FillSettings settings)
{
    private readonly Bridging bridging = new(track, clock, textRounding, settings.Method);

    /// <summary>What becomes of each run, in order of frames.</summary>
    public ImmutableArray<SettledRun> Decide() => [.. OpenRun.Of(track).Select(Decide)];

    /// <summary>The track with the bridges in place, the unfilled rejected samples flagged and the unfilled missing ones missing.</summary>
    public JointTrack Apply(ImmutableArray<SettledRun> runs)
    {
        var (samples, states) = (track.Samples.ToArray(), track.States.ToArray());
        foreach (var (run, bridge, _) in runs)
        {
            for (var n = run.First; n <= run.Last; n++)
            {
                (samples[n], states[n]) = (bridge, states[n]) switch
                {
                    ({ } b, _) => (b.Samples[n - run.First], SampleState.Filled),
                    (null, SampleState.Missing) => (Quat.Missing, SampleState.Missing),
                    _ => (Continued(samples, n), SampleState.Flagged),
                };
            }
        }

        return track with
        {
            Samples = ImmutableCollectionsMarshal.AsImmutableArray(samples),
            States = ImmutableCollectionsMarshal.AsImmutableArray(states),
        };
    }

    private SettledRun Decide(OpenRun run)
    {
        if (Refusal(run) is { Length: > 0 } refusal)
        {
            return Refused(run, refusal);
        }

        if (bridging.Across(run) is not { } bridge)
        {
            return Refused(run, "no motion beside it to learn from");
        }

        var error = bridge.ExpectedError(0, run.Count);
        return error <= settings.Worst
            ? new SettledRun(run, bridge, "")
            : Refused(run, $"too uncertain, {Degrees(error)} expected error where {Degrees(settings.Worst)} is allowed");
    }

    private static SettledRun Refused(OpenRun run, string why) => new(run, Bridge: null, why);

    private string Refusal(OpenRun run)
    {
        if (settings.Method == FillMethod.None)
        {
            return "filling is off";
        }

        if (run.Obstacle.Length > 0)
        {
            return run.Obstacle;
        }

        // Frames where frames were asked for; time by the clock, of which a regular one gives the same.
        var elapsed = clock.Steady[run.Last + 1] - clock.Steady[run.First - 1];
        var frames = settings.Longest.InFrames ? run.Count : (elapsed * clock.Rate) - 1;
        var allowed = settings.Longest.ToFrames(clock.Rate);
        if (frames > allowed + 1e-6)
        {
            return $"too long, {frames:0.#} frames where {allowed:0.#} are allowed";
        }

        var width = Angle.Between(track.Samples[run.First - 1], track.Samples[run.Last + 1]);
        return width > settings.Widest ? $"too wide, {Degrees(width)} from edge to edge where {Degrees(settings.Widest)} is allowed" : "";
    }

    /// <summary>The delivered value on the sign nearer to the last present sample.</summary>
    private Quat Continued(Quat[] samples, int n)
    {
        for (var k = n - 1; k >= 0; k--)
        {
            if (samples[k].IsOrientation)
            {
                return Quat.Dot(samples[k], track.Delivered[n]) < 0 ? -track.Delivered[n] : track.Delivered[n];
            }
        }

        return track.Delivered[n];
    }

    private static string Degrees(double radians) => $"{Angle.ToDegrees(radians):0.##} deg";
}
