using System.Collections.Immutable;
using System.Globalization;
using System.Text.RegularExpressions;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>A way to write a unit, and how it leads to the unit that settings count in.</summary>
/// <param name="Text">As written.</param>
/// <param name="Times">Multiply by this.</param>
/// <param name="Per">Then divide by this: 25 ms are exactly 0.025 s.</param>
internal readonly record struct UnitSpelling(string Text, double Times = 1, double Per = 1);

/// <summary>How a unit is written.</summary>
/// <param name="Noun">What is measured, with its article.</param>
/// <param name="Example">A value.</param>
/// <param name="Spellings">The first one is the one that messages use.</param>
internal sealed partial record UnitText(string Noun, string Example, params ImmutableArray<UnitSpelling> Spellings)
{
    /// <summary>A number as a config writes it: a decimal point, no separators.</summary>
    public const string NumberPattern = @"[+-]?([0-9]+(\.[0-9]*)?|\.[0-9]+)([eE][+-]?[0-9]+)?";

    /// <summary>How a unit is written.</summary>
    public static UnitText Of(Unit unit) => unit switch
    {
        Unit.Degrees => new("an angle", "0.5 deg", new UnitSpelling("deg")),
        Unit.DegreesPerSecond => new("a turning speed", "1500 deg/s", new UnitSpelling("deg/s")),
        Unit.Hertz => new("a frequency", "6 Hz", new UnitSpelling("Hz")),
        Unit.Percent => new("a share", "2 %", new UnitSpelling("%")),
        Unit.Spreads => new("a number of spreads", "6 spreads", new("spreads"), new("spread")),
        Unit.FramesOrTime => new("frames or a time", "250 ms", new("s"), new("ms", Per: 1000), new("frames"), new("frame")),
        Unit.Frames => new("a number of frames", "12 frames", new("frames"), new("frame")),
        Unit.Time => new("a time", "250 ms", new("s"), new("ms", Per: 1000)),
        Unit.Bytes => new("a size", "2 GB", new("GB", 1e9), new("MB", 1e6), new("kB", 1e3)),
        _ => new("a number", "1", new UnitSpelling("")),
    };

    /// <summary>Splits a number from what follows it.</summary>
    public static bool TrySplit(string text, out double number, out string unit)
    {
        var match = NumberAndRest().Match(text);
        unit = match.Groups["unit"].Value;
        return double.TryParse(match.Groups["number"].Value, NumberStyles.Float, CultureInfo.InvariantCulture, out number);
    }

    /// <summary>A number with a comma in it, whichever way it is meant.</summary>
    public static bool HasComma(string text) => NumberWithComma().IsMatch(text);

    /// <summary>The spelling, or null.</summary>
    public UnitSpelling? Spelling(string text) => Spellings.Where(s => s.Text == text).Select(s => (UnitSpelling?)s).FirstOrDefault();

    /// <summary>A pattern that every value with this unit meets.</summary>
    public string Expression() => NumberPattern + " *(" + string.Join('|', Spellings.Select(s => Regex.Escape(s.Text))) + ")";

    [GeneratedRegex("^(?<number>" + NumberPattern + ") *(?<unit>.*)$", RegexOptions.ExplicitCapture | RegexOptions.CultureInvariant, 1000)]
    private static partial Regex NumberAndRest();

    [GeneratedRegex("^[+-]?[0-9.]+,[0-9]", RegexOptions.ExplicitCapture | RegexOptions.CultureInvariant, 1000)]
    private static partial Regex NumberWithComma();
}
