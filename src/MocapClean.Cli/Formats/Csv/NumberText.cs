using System.Collections.Frozen;
using System.Globalization;
using System.Text;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>How numbers are written in a table, and which texts stand for a number that is not there.</summary>
internal static class NumberText
{
    /// <summary>
    /// Decimal point. The group separator is a character that no text holds: with the usual comma "0,25" would be read as 25.
    /// </summary>
    public static readonly NumberFormatInfo Point = NumberFormatInfo.ReadOnly(new NumberFormatInfo { NumberGroupSeparator = "\u0001" });

    /// <summary>Decimal comma, no groups.</summary>
    public static readonly NumberFormatInfo Comma = NumberFormatInfo.ReadOnly(
        new NumberFormatInfo { NumberDecimalSeparator = ",", NumberGroupSeparator = "" });

    private const int LongestMissing = 10;

    private static readonly FrozenSet<string> MissingWords = FrozenSet.Create(
        StringComparer.OrdinalIgnoreCase,
        "-", "--", "nan", "-nan", "nan(ind)", "-nan(ind)", "null", "none", "nil", "na", "n/a", "#n/a", "missing",
        "inf", "+inf", "-inf", "infinity", "+infinity", "-infinity", "1.#inf", "-1.#inf", "1.#qnan", "-1.#ind");

    /// <summary>An empty or blank field, or one of the words that programs write for a missing or infinite number.</summary>
    public static bool IsMissing(ReadOnlySpan<byte> text)
    {
        var word = text.Trim(" \t"u8);
        return word.IsEmpty || (word.Length <= LongestMissing && MissingWords.Contains(Encoding.UTF8.GetString(word)));
    }

    /// <summary>Whether a text settles the decimal mark: true for a comma, false for a point, null where it has neither.</summary>
    public static bool? HasDecimalComma(ReadOnlySpan<byte> text)
    {
        var number = text.Trim(" \t"u8).TrimStart("+-"u8);
        var mark = number.IndexOfAnyExceptInRange((byte)'0', (byte)'9');
        if (mark < 0 || (number.Length == 1 && mark == 0) || number[mark] is not ((byte)',' or (byte)'.'))
        {
            return null;
        }

        var rest = number[(mark + 1)..].IndexOfAnyExceptInRange((byte)'0', (byte)'9');
        return rest >= 0 && number[mark + 1 + rest] is not ((byte)'e' or (byte)'E') ? null : number[mark] == ',';
    }

    /// <summary>Number of decimals printed, such as 3 for 0.125 and 5 for 1.25e-3.</summary>
    public static int Decimals(ReadOnlySpan<byte> text)
    {
        var number = text.Trim(" \t"u8);
        var exponent = number.IndexOfAny((byte)'e', (byte)'E');
        var mantissa = exponent < 0 ? number : number[..exponent];
        var mark = mantissa.IndexOfAny((byte)'.', (byte)',');
        var power = exponent >= 0 && int.TryParse(number[(exponent + 1)..], CultureInfo.InvariantCulture, out var p) ? p : 0;
        return (mark < 0 ? 0 : mantissa.Length - mark - 1) - power;
    }
}
