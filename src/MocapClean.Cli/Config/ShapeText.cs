using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Puts the shape of a setting into words.</summary>
internal static class ShapeText
{
    /// <summary>What the key takes, and what stands there instead.</summary>
    public static string Mismatch(KeyNode key, string found) => $"{key.Path} takes {Wanted(key.Setting!)}, not {found}";

    /// <summary>Both bounds, spelt as the value was, or in a smaller unit where that would be a tiny number.</summary>
    public static string Bounds(Shape.Quantity quantity, UnitText unit, UnitSpelling spelling) =>
        $"from {Amount(quantity.Low, unit, spelling)} to {Amount(quantity.High, unit, spelling)}";

    private static string Amount(double amount, UnitText unit, UnitSpelling spelling)
    {
        var fit = amount > 0 && amount / spelling.Times < 0.001 ? unit.Spellings[^1] : spelling;
        return $"{amount * fit.Per / fit.Times} {fit.Text}".TrimEnd();
    }

    /// <summary>What a setting takes, in words.</summary>
    public static string Wanted(Setting setting) => setting.Shape switch
    {
        Shape.Choice choice => choice.Words is [var only] ? $"the word {only}" : "one of " + Either(choice.Words),
        Shape.Quantity quantity => Quantity(setting, quantity),
        Shape.WholeNumber count => $"a whole number from {count.Low} to {count.High}",
        Shape.Flag => "true or false",
        Shape.FreeText { Holding: [] } => "a text",
        Shape.FreeText text => $"a text with {string.Join(" and ", text.Holding)} in it",
        Shape.WordList words => $"a list of {Either(words.Words)}",
        Shape.TextList { Length: { } length } => $"a list of {length} different texts",
        _ => "a text or a list of texts",
    };

    /// <summary>Words with commas and an "or".</summary>
    public static string Either(IReadOnlyList<string> words) => Joined(words, "or");

    /// <summary>Words with commas and an "and".</summary>
    public static string All(IReadOnlyList<string> words) => Joined(words, "and");

    private static string Joined(IReadOnlyList<string> words, string last) =>
        words.Count < 2 ? string.Concat(words) : $"{string.Join(", ", words.SkipLast(1))} {last} {words[^1]}";

    private static string Quantity(Setting setting, Shape.Quantity quantity)
    {
        var unit = UnitText.Of(quantity.Unit);
        string[] examples = [setting.Default, setting.Example, unit.Example];
        var example = examples.First(e => char.IsAsciiDigit(e.FirstOrDefault()));
        return $"{unit.Noun} such as '{example}'" + (quantity.OrWords is [] ? "" : $" or the word {Either(quantity.OrWords)}");
    }
}
