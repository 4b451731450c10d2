using System.Globalization;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>
/// How a triple of angles about three axes is written on another branch of the same orientation: half turns added to each angle, and the
/// middle one mirrored where it is the other of the two solutions, (a + 180, 180 - b, c + 180) degrees.
/// </summary>
/// <param name="Mirrored">The middle angle changes its sign before its half turns are added.</param>
/// <param name="First">Half turns, whole numbers.</param>
/// <param name="Second">Half turns of the middle angle.</param>
/// <param name="Third">Half turns of the last angle.</param>
internal readonly record struct BvhBranch(bool Mirrored, double First, double Second, double Third)
{
    /// <summary>The branch the triple stands on.</summary>
    public static BvhBranch Same => default;

    /// <summary>Of the triple's two solutions, with whole turns added, the one nearest to another triple; the same solution if as near.</summary>
    public static BvhBranch Nearest(EulerAngles angles, EulerAngles other)
    {
        var one = new BvhBranch(
            Mirrored: false, Turns(other.First - angles.First), Turns(other.Second - angles.Second), Turns(other.Third - angles.Third));
        var mirrored = new BvhBranch(
            Mirrored: true,
            1 + Turns(other.First - angles.First - Math.PI),
            1 + Turns(other.Second + angles.Second - Math.PI),
            1 + Turns(other.Third - angles.Third - Math.PI));
        return Leap(mirrored.Of(angles), other) < Leap(one.Of(angles), other) ? mirrored : one;
    }

    /// <summary>The widest of the three differences, radians.</summary>
    public static double Leap(EulerAngles a, EulerAngles b) =>
        Math.Max(Math.Abs(a.First - b.First), Math.Max(Math.Abs(a.Second - b.Second), Math.Abs(a.Third - b.Third)));

    /// <summary>The triple on this branch, radians.</summary>
    public EulerAngles Of(EulerAngles a) => new(
        a.First + (First * Math.PI), (Mirrored ? -a.Second : a.Second) + (Second * Math.PI), a.Third + (Third * Math.PI));

    /// <summary>This branch of a triple that was brought to another branch before.</summary>
    public BvhBranch After(BvhBranch before) => new(
        Mirrored ^ before.Mirrored, First + before.First, (Mirrored ? -before.Second : before.Second) + Second, Third + before.Third);

    /// <summary>One angle's text on this branch, with its decimals as delivered; null where the text is no plain decimal.</summary>
    /// <param name="text">As delivered, degrees.</param>
    /// <param name="angle">0, 1 or 2.</param>
    public string? Rewrite(ReadOnlySpan<byte> text, int angle)
    {
        var halfTurns = angle == 0 ? First : angle == 1 ? Second : Third;
        return decimal.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var degrees)
            ? ((Mirrored && angle == 1 ? -degrees : degrees) + (180 * (decimal)halfTurns)).ToString(CultureInfo.InvariantCulture)
            : null;
    }

    /// <summary>Half turns, an even number, that bring a difference in radians nearest to 0.</summary>
    private static double Turns(double difference) => 2 * Math.Round(difference / (2 * Math.PI));
}
