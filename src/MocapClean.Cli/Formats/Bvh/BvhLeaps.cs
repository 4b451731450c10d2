using System.Collections.Immutable;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>A run of frames whose angles stand on another branch than those before the first leap.</summary>
/// <param name="First">The frame behind the leap.</param>
/// <param name="Last">The last frame before the next leap, or of the take.</param>
/// <param name="Branch">What brings its angles back to the branch of the first frames.</param>
/// <param name="Leap">What brings its angles to the branch of the frame before the run.</param>
internal sealed record BvhRun(int First, int Last, BvhBranch Branch, BvhBranch Leap);

/// <summary>
/// Finds where the three angles of a joint leap to another branch between neighbours while the orientation goes on as before: the curve is
/// broken, the motion is not. A leap is a jump of the angles at least four times as wide as that of the nearest way to write the same
/// orientation, with a turn that is small or not much more than the turns around it. So real jumps are no leaps, and a fast swing of two
/// angles near the lock is one only where it comes within a fifth of a half turn.
/// </summary>
internal static class BvhLeaps
{
    private const int Around = 4;
    private const double Clearly = 4;
    private const double NotMuchMore = 3;
    private const double Narrowest = Math.PI * Clearly / (Clearly + 1);

    /// <summary>Beyond this (some thousand turns) whole turns say nothing any more.</summary>
    private const double Widest = 2e4;

    private static readonly double SmallTurn = Angle.FromDegrees(5);

    /// <summary>What brings a triple to the branch of the one before it where it leaps from it; null where it does not.</summary>
    public static BvhBranch? Between(EulerAngles before, EulerAngles angles)
    {
        var jump = BvhBranch.Leap(angles, before);
        if (jump is not (> Narrowest and < Widest))
        {
            return null;
        }

        var nearest = BvhBranch.Nearest(angles, before);
        return Clearly * BvhBranch.Leap(nearest.Of(angles), before) <= jump ? nearest : null;
    }

    /// <summary>The runs of a track, in order.</summary>
    /// <param name="angles">The angles of each frame, radians.</param>
    /// <param name="samples">The orientations; NaN where missing.</param>
    public static ImmutableArray<BvhRun> Find(ReadOnlySpan<EulerAngles> angles, ImmutableArray<Quat> samples)
    {
        var runs = ImmutableArray.CreateBuilder<BvhRun>();
        var (start, branch, leap) = (0, BvhBranch.Same, BvhBranch.Same);
        for (var (n, before) = (0, -1); n < angles.Length; n++)
        {
            if (!samples[n].IsOrientation)
            {
                continue;
            }

            if (before >= 0 && Between(angles[before], angles[n]) is { } found && GoesOn(samples, before, n))
            {
                Close(n - 1);
                (start, branch, leap) = (n, branch.After(found), found);
            }

            before = n;
        }

        Close(angles.Length - 1);
        return runs.ToImmutable();

        void Close(int last)
        {
            if (branch != BvhBranch.Same)
            {
                runs.Add(new BvhRun(start, last, branch, leap));
            }
        }
    }

    private static bool GoesOn(ImmutableArray<Quat> samples, int before, int n)
    {
        var widest = 0.0;
        for (var k = 0; k < Around; k++)
        {
            widest = Math.Max(widest, Math.Max(TurnTo(samples, before - k), TurnTo(samples, n + 1 + k)));
        }

        // A first frame that is a pose put in front has no motion that goes on from it.
        var small = before == 0 ? 1e-6 : SmallTurn;
        return Angle.Between(samples[before], samples[n]) <= Math.Max(small, NotMuchMore * widest);
    }

    private static double TurnTo(ImmutableArray<Quat> samples, int n) =>
        n > 0 && n < samples.Length && samples[n - 1].IsOrientation && samples[n].IsOrientation
            ? Angle.Between(samples[n - 1], samples[n])
            : 0;
}
