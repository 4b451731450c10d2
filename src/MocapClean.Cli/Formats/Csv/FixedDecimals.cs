using System.Runtime.CompilerServices;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// Writes components with 14 fixed decimals. Their rounding moves a length by less than 1e-13. The framework's own "F14" is more than
/// ten times slower and would be the longest part of writing a session.
/// </summary>
internal static class FixedDecimals
{
    /// <summary>Decimals written.</summary>
    public const int Count = 14;

    /// <summary>Bytes that a number takes at most.</summary>
    public const int Longest = 32;

    private const double Scale = 1e14;

    /// <summary>From here, scaled numbers would no longer be exact integers.</summary>
    private const double TooLarge = 90;

    private static ReadOnlySpan<byte> Pairs =>
        "00010203040506070809101112131415161718192021222324252627282930313233343536373839404142434445464748495051525354555657585960616263"u8
        + "646566676869707172737475767778798081828384858687888990919293949596979899"u8;

    /// <summary>Writes a number; a negative one that rounds to nothing loses its sign.</summary>
    /// <param name="value">A component.</param>
    /// <param name="to">At least <see cref="Longest"/> bytes.</param>
    /// <param name="mark">Decimal mark.</param>
    /// <returns>Bytes written.</returns>
    public static int Write(double value, Span<byte> to, byte mark)
    {
        if (!(Math.Abs(value) < TooLarge))
        {
            throw new ArgumentOutOfRangeException(nameof(value), value, "No component of a unit quaternion");
        }

        var scaled = Scaled(value);
        var at = 0;
        if (scaled < 0)
        {
            to[at++] = (byte)'-';
            scaled = -scaled;
        }

        var (whole, fraction) = Math.DivRem((ulong)scaled, (ulong)Scale);
        if (whole >= 10)
        {
            to[at++] = (byte)('0' + (whole / 10));
        }

        to[at++] = (byte)('0' + (whole % 10));
        to[at++] = mark;
        var (high, low) = Math.DivRem(fraction, 10_000_000UL);
        WriteSeven((uint)high, to.Slice(at, 7));
        WriteSeven((uint)low, to.Slice(at + 7, 7));
        return at + Count;
    }

    /// <summary>The nearest integer to the exact product, ties to even, as the framework's own formatting has it.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static long Scaled(double value)
    {
        var nearest = Math.Round(value * Scale);
        var rest = Math.FusedMultiplyAdd(value, Scale, -nearest);
        return (long)nearest + (rest > 0.5 ? 1 : rest < -0.5 ? -1 : 0);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void WriteSeven(uint digits, Span<byte> to)
    {
        var (rest, last) = Math.DivRem(digits, 10u);
        to[6] = (byte)('0' + last);
        var (first, four) = Math.DivRem(rest, 10_000u);
        Pair(first, to);
        Pair(four / 100, to[2..]);
        Pair(four % 100, to[4..]);
    }

    private static void Pair(uint number, Span<byte> to) => Pairs.Slice(2 * (int)number, 2).CopyTo(to);
}
