using System.Collections.Immutable;

namespace MocapClean.Core.Stages.Settings;

/// <summary>What a setting may look like.</summary>
public abstract record Shape
{
    private Shape()
    {
    }

    /// <summary>One word of a closed list.</summary>
    public sealed record Choice(ImmutableArray<string> Words) : Shape;

    /// <summary>
    /// A number with its unit, within bounds in that unit (times in seconds), or one of a few words such as <c>auto</c> or <c>off</c>.
    /// </summary>
    public sealed record Quantity(Unit Unit, double Low, double High, ImmutableArray<string> OrWords) : Shape;

    /// <summary>A whole number without unit.</summary>
    public sealed record WholeNumber(int Low, int High) : Shape;

    /// <summary>True or false.</summary>
    public sealed record Flag : Shape;

    /// <summary>Any text that is not empty, holding each of these parts.</summary>
    public sealed record FreeText(params ImmutableArray<string> Holding) : Shape;

    /// <summary>A list of texts; a single text counts as a list of one. Of a fixed length and without repeats where one is given, else of any.</summary>
    public sealed record TextList(int? Length = null) : Shape;

    /// <summary>A list, not empty, of words of a closed list; a single word counts as a list of one.</summary>
    public sealed record WordList(params ImmutableArray<string> Words) : Shape;

    /// <summary>One of these words.</summary>
    public static Shape OneOf(params ReadOnlySpan<string> words) => new Choice([.. words]);

    /// <summary>A number with unit, within bounds.</summary>
    public static Shape Of(Unit unit, double low, double high, params ReadOnlySpan<string> orWords) => new Quantity(unit, low, high, [.. orWords]);
}
