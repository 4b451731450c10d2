using System.Globalization;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>
/// Turns the changed samples of one track back to angles, frame after frame. Frames behind a leap come to the branch before it with the
/// decimals they have; changed samples are written with ten decimals on the branch of the delivered angles where they moved little, else of
/// the angles written before them. Where a smoothed joint passes the lock on its other side, the changed samples behind it follow.
/// </summary>
internal sealed class BvhTrackWriter
{
    /// <summary>Ten decimals: three rounded angles move an orientation by 1.5e-10 degrees at most.</summary>
    private const string Decimals = "F10";

    /// <summary>Some thousand turns: beyond it ten decimals of whole turns are no longer kept.</summary>
    private const double MostTurned = 2e4;

    /// <summary>What a hinge cannot hold must be rounding, radians.</summary>
    private const double Rounding = 1e-7;

    private static readonly double MovedLittle = Angle.FromDegrees(30);

    private readonly BvhTrack track;
    private readonly JointTrack cleaned;
    private readonly bool rebranch;
    private EulerAngles? before;

    /// <summary>The changed sample before, -1 behind a delivered one; and the branch that its run has come to.</summary>
    private int changed = -1;
    private BvhBranch passed;

    private int run;

    /// <summary>For one track.</summary>
    /// <param name="track">As delivered.</param>
    /// <param name="cleaned">After the stages.</param>
    /// <param name="rebranch">Bring frames behind a leap back to the branch before it.</param>
    public BvhTrackWriter(BvhTrack track, JointTrack cleaned, bool rebranch)
    {
        this.rebranch = rebranch;
        this.track = track;
        this.cleaned = cleaned;
        before = FirstPresent();
    }

    /// <summary>Replaces the values of a frame that change; called once for each frame, in order.</summary>
    public void Put(int frame, BvhLine line)
    {
        var branch = BranchAt(frame);
        EulerAngles? delivered = track.Delivered[frame].IsOrientation ? branch.Of(track.Angles(frame)) : null;
        if (Changed(frame))
        {
            passed = changed < 0 ? BvhBranch.Same : passed;
            var angles = Follow(Convert(frame, delivered is { } own ? passed.Of(own) : null), frame);
            (before, changed) = (angles, frame);
            Put(angles, (_, text) => text, line);
            return;
        }

        before = delivered ?? before;
        changed = delivered is null ? changed : -1;
        if (delivered is { } moved && branch != BvhBranch.Same)
        {
            Put(moved, (k, text) => branch.Rewrite(line.Field(track.Columns[k]), k) ?? text, line);
        }
    }

    /// <summary>The other sign of a quaternion is the same three angles, and so is any other length.</summary>
    private bool Changed(int frame)
    {
        var (was, now) = (cleaned.Delivered[frame], cleaned.Samples[frame]);
        return now.IsOrientation && !now.Equals(was) && !now.Equals(-was);
    }

    private BvhBranch BranchAt(int frame)
    {
        while (run < track.Runs.Length && track.Runs[run].Last < frame)
        {
            run++;
        }

        return rebranch && run < track.Runs.Length && track.Runs[run].First <= frame ? track.Runs[run].Branch : BvhBranch.Same;
    }

    private EulerAngles? FirstPresent()
    {
        var first = 0;
        while (first < track.Delivered.Length && !track.Delivered[first].IsOrientation)
        {
            first++;
        }

        return first < track.Delivered.Length ? track.Angles(first) : null;
    }

    private EulerAngles Convert(int frame, EulerAngles? delivered)
    {
        var sample = cleaned.Samples[frame];
        var near = delivered is { } own && Angle.Between(track.Delivered[frame], sample) <= MovedLittle ? own : before ?? default;
        if (BvhBranch.Leap(near, default) > MostTurned)
        {
            near = default;
        }

        var angles = Euler.ToAngles(sample, track.Order, near);
        return !track.IsHinge || Math.Max(Math.Abs(angles.Second), Math.Abs(angles.Third)) <= Rounding
            ? angles
            : throw new ArgumentException(
                $"frame {frame} of joint '{track.Name}' turns about an axis for which the file has no channel", nameof(frame));
    }

    /// <summary>No triple leaps from the changed one before it.</summary>
    private EulerAngles Follow(EulerAngles angles, int frame)
    {
        if (changed >= 0 && before is { } last && BvhLeaps.Between(last, angles) is { } leap
            && Angle.Between(cleaned.Samples[changed], cleaned.Samples[frame]) <= MovedLittle)
        {
            passed = leap.After(passed);
            return leap.Of(angles);
        }

        return angles;
    }

    private void Put(EulerAngles angles, Func<int, string, string> text, BvhLine line)
    {
        var (first, second, third) = angles.ToDegrees();
        ReadOnlySpan<double> degrees = [first, second, third];
        for (var k = 0; k < track.Columns.Length; k++)
        {
            line.Replace(track.Columns[k], text(k, degrees[k].ToString(Decimals, CultureInfo.InvariantCulture)));
        }
    }
}
