using System.Collections.Immutable;
using System.Globalization;
using MocapClean.Cli.Config.Yaml;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Reads one value against the shape of its setting.</summary>
internal sealed class ValueReader(ProblemList problems)
{
    /// <summary>The value, or null with the reason in the list.</summary>
    public SettingValue? Read(ConfigNode node, KeyNode key)
    {
        var (value, wrong) = (key.Setting!.Shape, node) switch
        {
            (Shape.Choice choice, WordNode word) when !node.IsNothing => Choice(word.Text, choice, key),
            (Shape.Quantity quantity, WordNode word) when !node.IsNothing => Quantity(word.Text, quantity, key),
            (Shape.WholeNumber count, WordNode word) when !node.IsNothing => Count(word.Text, count, key),
            (Shape.Flag, WordNode { IsPlain: true } word) => Flag(word.Text, key),
            (Shape.FreeText text, WordNode word) when !node.IsNothing => Text(word.Text, text, key),
            (Shape.TextList or Shape.WordList, ListNode or WordNode) when !node.IsNothing => List(node, key),
            _ => (null, ShapeText.Mismatch(key, node.Kind)),
        };
        if (wrong.Length > 0)
        {
            problems.Add(node.At, wrong);
        }

        return value;
    }

    private static (SettingValue? Value, string Wrong) Choice(string text, Shape.Choice choice, KeyNode key) =>
        choice.Words.Contains(text)
            ? (new() { Word = text }, "")
            : (null, ShapeText.Mismatch(key, $"'{text}'") + NearMiss.Hint(NearMiss.Of(text, choice.Words)));

    private static (SettingValue? Value, string Wrong) Quantity(string text, Shape.Quantity quantity, KeyNode key)
    {
        if (quantity.OrWords.Contains(text))
        {
            return (new() { Word = text }, "");
        }

        if (UnitText.HasComma(text))
        {
            return (null, $"{key.Path}: '{text}' has a comma; write a decimal point, and nothing between thousands");
        }

        var unit = UnitText.Of(quantity.Unit);
        var isNumber = UnitText.TrySplit(text, out var number, out var written);
        if (!isNumber || unit.Spelling(written) is not { } spelling)
        {
            return (null, ShapeText.Mismatch(key, $"'{text}'") + (isNumber && written.Length == 0 ? ": its unit is missing" : ""));
        }

        var amount = number * spelling.Times / spelling.Per;
        var inFrames = spelling.Text.StartsWith("frame", StringComparison.Ordinal);
        if (inFrames && amount != Math.Floor(amount))
        {
            return (null, $"{key.Path} takes whole frames, not '{text}'");
        }

        return amount >= quantity.Low && amount <= quantity.High
            ? (new() { Number = amount, InFrames = inFrames }, "")
            : (null, $"{key.Path} goes {ShapeText.Bounds(quantity, unit, spelling)}, not '{text}'");
    }

    private static (SettingValue? Value, string Wrong) Count(string text, Shape.WholeNumber count, KeyNode key)
    {
        if (UnitText.HasComma(text))
        {
            return (null, $"{key.Path}: '{text}' has a comma; write nothing between thousands");
        }

        if (!int.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out var number))
        {
            return (null, ShapeText.Mismatch(key, $"'{text}'"));
        }

        return number >= count.Low && number <= count.High
            ? (new() { Number = number }, "")
            : (null, $"{key.Path} goes from {count.Low} to {count.High}, not '{text}'");
    }

    private static (SettingValue? Value, string Wrong) Flag(string text, KeyNode key) => text switch
    {
        "true" or "True" or "TRUE" => (new() { Word = "true" }, ""),
        "false" or "False" or "FALSE" => (new() { Word = "false" }, ""),
        _ => (null, ShapeText.Mismatch(key, text.Length == 0 ? "nothing" : $"'{text}'")),
    };

    private static (SettingValue? Value, string Wrong) Text(string text, Shape.FreeText shape, KeyNode key) =>
        string.IsNullOrWhiteSpace(text) || shape.Holding.Any(h => !text.Contains(h, StringComparison.Ordinal))
            ? (null, ShapeText.Mismatch(key, $"'{text}'"))
            : (new() { Word = text }, "");

    private static (SettingValue? Value, string Wrong) List(ConfigNode node, KeyNode key)
    {
        ImmutableArray<ConfigNode> items = node is ListNode list ? list.Items : [node];
        if (items.FirstOrDefault(i => i is not WordNode || i.IsNothing || string.IsNullOrWhiteSpace(((WordNode)i).Text)) is { } odd)
        {
            return (null, ShapeText.Mismatch(key, $"a list with {odd.Kind} in it"));
        }

        ImmutableArray<string> texts = [.. items.Select(i => ((WordNode)i).Text)];
        return Wrong(texts, key) is { Length: > 0 } wrong ? (null, wrong) : (new() { List = texts }, "");
    }

    private static string Wrong(ImmutableArray<string> texts, KeyNode key) => key.Setting!.Shape switch
    {
        Shape.WordList words when texts.FirstOrDefault(t => !words.Words.Contains(t)) is { } odd =>
            ShapeText.Mismatch(key, $"'{odd}'") + NearMiss.Hint(NearMiss.Of(odd, words.Words)),
        Shape.TextList { Length: { } length } when texts.Length != length || texts.Distinct().Count() != length =>
            ShapeText.Mismatch(key, $"[{string.Join(", ", texts)}]"),
        Shape.WordList or Shape.TextList when texts is [] && (key.Setting.IsRequired || key.Setting.Shape is Shape.WordList) =>
            ShapeText.Mismatch(key, "an empty list"),
        _ => "",
    };
}
