using System.Globalization;
using System.Text;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>What a BVH file is made of: words parted by white space and braces, on lines that end in LF, CR LF or CR.</summary>
internal static class BvhText
{
    /// <summary>White space.</summary>
    public static ReadOnlySpan<byte> Spaces => " \t\n\v\f\r"u8;

    /// <summary>One of <see cref="Spaces"/>.</summary>
    public static bool IsSpace(byte b) => b is (byte)' ' or (>= (byte)'\t' and <= (byte)'\r');

    /// <summary>Same word, in any case.</summary>
    public static bool Is(ReadOnlySpan<byte> word, string keyword) => Ascii.EqualsIgnoreCase(word, keyword);

    /// <summary>
    /// A number as printed by any exporter: <c>.5</c>, <c>5.</c>, <c>-0</c>, <c>1e-3</c>. Texts for values that are not finite, in the spellings
    /// of the common run-time libraries (<c>nan</c>, <c>-inf</c>, <c>1.#QNAN</c>, <c>-nan(ind)</c>), give a number that is not finite.
    /// </summary>
    public static bool TryNumber(ReadOnlySpan<byte> word, out double value)
    {
        if (double.TryParse(word, NumberStyles.Float, CultureInfo.InvariantCulture, out value))
        {
            return true;
        }

        value = double.NaN;
        var bare = word.TrimStart("+-"u8);
        return Is(bare, "inf") || Is(bare, "nan") || bare.StartsWith("1.#"u8)
            || (bare.Length > 4 && Is(bare[..4], "nan(") && bare[^1] == (byte)')');
    }

    /// <summary>How many decimals a number is printed with; negative where its last digit stands for tens, hundreds and so on.</summary>
    public static int Decimals(ReadOnlySpan<byte> word)
    {
        var exponent = word.IndexOfAny((byte)'e', (byte)'E');
        var mantissa = exponent < 0 ? word : word[..exponent];
        var power = 0;
        if (exponent >= 0 && !int.TryParse(word[(exponent + 1)..], NumberStyles.Integer, CultureInfo.InvariantCulture, out power))
        {
            return 0;
        }

        var point = mantissa.IndexOf((byte)'.');
        return (point < 0 ? 0 : mantissa.Length - point - 1) - Math.Clamp(power, -400, 400);
    }

    /// <summary>Half a unit of the last printed digit.</summary>
    public static double HalfUnit(int decimals) => 0.5 * Math.Pow(10, -decimals);

    /// <summary>A text as it may stand in a message: quoted, short, without characters that a terminal would obey.</summary>
    public static string Quote(ReadOnlySpan<byte> text)
    {
        const int longest = 40;
        var shown = Encoding.UTF8.GetString(text[..Math.Min(text.Length, longest)]);
        var safe = string.Create(shown.Length, shown, (span, s) =>
        {
            for (var i = 0; i < span.Length; i++)
            {
                span[i] = char.IsControl(s[i]) ? '?' : s[i];
            }
        });
        return $"'{safe}{(text.Length > longest ? "..." : "")}'";
    }
}
