using System.Buffers.Binary;
using System.Runtime.CompilerServices;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// Writes components with 14 fixed decimals. Their rounding moves a length by less than 1e-13. The framework's own "F14" gives the same
/// text ten times slower and would be the longest part of writing a session.
/// </summary>
internal static class FixedDecimals
{
    /// <summary>Bytes that a number takes at most.</summary>
    public const int Longest = 32;

    private const double Scale = 1e14;

    /// <summary>From here a number has two digits before the mark.</summary>
    private const double TooLarge = 10;

    /// <summary>Writes a number; a negative one that rounds to nothing keeps no sign.</summary>
    /// <param name="value">A component, between -9.99 and 9.99.</param>
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
        var sign = scaled < 0 ? 1 : 0;
        to[0] = (byte)'-';
        var (high, low) = Math.DivRem((ulong)Math.Abs(scaled), 100_000_000UL);

        // Of the upper eight digits the first is nought, the second stands before the mark; the lower eight cover what goes over.
        var upper = EightDigits((uint)high);
        to[sign] = (byte)(upper >> 8);
        to[sign + 1] = mark;
        BinaryPrimitives.WriteUInt64LittleEndian(to[(sign + 2)..], upper >> 16);
        BinaryPrimitives.WriteUInt64LittleEndian(to[(sign + 8)..], EightDigits((uint)low));
        return sign + 16;
    }

    /// <summary>The nearest integer to the exact product, ties to even, as the framework's own formatting has it.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static long Scaled(double value)
    {
        var nearest = Math.Round(value * Scale);
        var rest = Math.FusedMultiplyAdd(value, Scale, -nearest);
        return (long)nearest + (rest > 0.5 ? 1 : rest < -0.5 ? -1 : 0);
    }

    /// <summary>
    /// Eight digits as text, the first in the lowest byte. All are split off side by side in one word, by multiplying with rounded
    /// reciprocals: 10486 / 2^20 for a hundredth (exact below 10 000), 103 / 2^10 for a tenth (exact below 100).
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static ulong EightDigits(uint number)
    {
        var (first, second) = Math.DivRem(number, 10_000u);
        var fours = first | ((ulong)second << 32);
        var hundreds = ((fours * 10486) >> 20) & 0x0000_007F_0000_007F;
        var twos = hundreds | ((fours - (100 * hundreds)) << 16);
        var tens = ((twos * 103) >> 10) & 0x000F_000F_000F_000F;
        return (tens | ((twos - (10 * tens)) << 8)) + 0x3030_3030_3030_3030;
    }
}
