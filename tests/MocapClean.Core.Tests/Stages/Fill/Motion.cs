using System.Collections.Immutable;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Fill;
using MocapClean.Core.Stages.Settings;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Tests.Stages.Fill;

/// <summary>Made motions with known truth, their tracks, and the stage run on them.</summary>
internal static class Motion
{
    public const double Rate = 120;

    /// <summary>Every bound opened.</summary>
    public static FillSettings Open { get; } =
        new() { Longest = Extent.Frames(100000), Widest = Math.PI, Worst = Math.PI };

    /// <summary>A constant spin about a slanted axis, degrees per second.</summary>
    public static Quat[] Spin(int frames, double degreesPerSecond) =>
        [.. Enumerable.Range(0, frames).Select(n => RotationVector.Exp(Turn(Angle.FromDegrees(degreesPerSecond) * n / Rate)))];

    /// <summary>A swing about one axis while another swings at another pace.</summary>
    public static Quat[] Swing(int frames, double hertz = 0.8, double degrees = 40) =>
        [.. Enumerable.Range(0, frames).Select(n =>
            RotationVector.Exp(Turn(Angle.FromDegrees(degrees) * Math.Sin(2 * Math.PI * hertz * n / Rate)))
            * RotationVector.Exp(new Vec3(0, 0, Angle.FromDegrees(degrees / 2) * Math.Sin((2 * Math.PI * hertz * 1.37 * n / Rate) + 1))))];

    /// <summary>
    /// A wandering motion: angular velocity from white noise through two first-order lags of 0.1 s. Numbers by the multiplicative
    /// generator of Park and Miller 1988, so that they are the same everywhere.
    /// </summary>
    public static Quat[] Wander(int frames, long seed)
    {
        var state = seed;
        double Next()
        {
            var sum = -6.0;
            for (var i = 0; i < 12; i++)
            {
                state = state * 16807 % 2147483647;
                sum += state / 2147483647.0;
            }

            return sum;
        }

        const double keep = 0.92;
        var (once, twice, q) = (Vec3.Zero, Vec3.Zero, Quat.Identity);
        var path = new Quat[frames];
        for (var n = -200; n < frames; n++)
        {
            once = (keep * once) + ((1 - keep) * new Vec3(Next(), Next(), Next()));
            twice = (keep * twice) + ((1 - keep) * once);
            q = (q * RotationVector.Exp(0.1 * twice)).Normalised();
            if (n >= 0)
            {
                path[n] = q;
            }
        }

        return path;
    }

    /// <summary>A track with these frames missing.</summary>
    public static JointTrack Track(Quat[] path, params (int First, int Last)[] gaps)
    {
        var (samples, states) = (path.ToArray(), new SampleState[path.Length]);
        foreach (var (first, last) in gaps)
        {
            Array.Fill(samples, Quat.Missing, first, last - first + 1);
            Array.Fill(states, SampleState.Missing, first, last - first + 1);
        }

        return new JointTrack { Name = "Alder", Delivered = [.. samples], Samples = [.. samples], States = [.. states] };
    }

    /// <summary>The same track with other samples rejected: turned away by half a radian.</summary>
    public static JointTrack Rejecting(this JointTrack track, int first, int last)
    {
        var (samples, states) = (track.Samples.ToArray(), track.States.ToArray());
        for (var n = first; n <= last; n++)
        {
            (samples[n], states[n]) = (samples[n] * RotationVector.Exp(new Vec3(0.5, 0, 0)), SampleState.Rejected);
        }

        return track with { Delivered = [.. samples], Samples = [.. samples], States = [.. states] };
    }

    public static JointTrack With(this JointTrack track, int frame, SampleState state) =>
        track with { States = track.States.SetItem(frame, state) };

    /// <summary>A finding as the outlier stage makes it.</summary>
    public static Finding Found(FaultKind kind, int first, int last) =>
        new() { Joint = 0, First = first, Last = last, Kind = kind, Action = FaultAction.Filled };

    public static (JointTrack Track, ImmutableArray<Finding> Findings) Run(
        JointTrack track, FillSettings settings, params Finding[] findings) =>
        Run(track, Clock.Regular(track.Length, Rate), settings, findings);

    public static (JointTrack Track, ImmutableArray<Finding> Findings) Run(
        JointTrack track, Clock clock, FillSettings settings, params Finding[] findings)
    {
        var take = new Take
        {
            Name = "take.csv",
            Clock = clock,
            Tracks = [track],
            Space = OrientationSpace.World,
            TextRounding = 1e-12,
            Findings = [.. findings],
        };
        var after = new FillStage().Run(take, StageContext.Uniform(take, new StageSettings { Fill = settings }));
        return (after.Tracks[0], after.Findings);
    }

    /// <summary>Largest angle between a track and a path over some frames, radians.</summary>
    public static double Largest(JointTrack track, Quat[] path, int first, int last) =>
        Enumerable.Range(first, last - first + 1).Max(n => Angle.Between(track.Samples[n], path[n]));

    private static Vec3 Turn(double angle) => angle * new Vec3(0.6, 0, 0.8);
}
