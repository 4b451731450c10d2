using System.Collections.Immutable;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Settings;

/// <summary>A value that has passed the check against its <see cref="Shape"/>.</summary>
public sealed record SettingValue
{
    /// <summary>The number in the unit of the setting: degrees, deg/s, Hz, percent, seconds, frames, bytes; NaN for a word.</summary>
    public double Number { get; init; } = double.NaN;

    /// <summary>A <see cref="Unit.FramesOrTime"/> value was given in frames.</summary>
    public bool InFrames { get; init; }

    /// <summary>The word or text, <c>true</c> or <c>false</c> for a flag, or empty for a number.</summary>
    public string Word { get; init; } = "";

    /// <summary>The texts of a list.</summary>
    public ImmutableArray<string> List { get; init; } = [];

    /// <summary>A word was given instead of a number.</summary>
    public bool IsWord => Word.Length > 0;

    /// <summary>Degrees as radians, and deg/s as rad/s.</summary>
    public double Radians => Angle.FromDegrees(Number);

    /// <summary>Percent as a fraction of 1.</summary>
    public double Fraction => Number / 100;

    /// <summary>Whole number.</summary>
    public int Whole => (int)Number;

    /// <summary>Frames or time.</summary>
    public Extent Extent => new(Number, InFrames);
}
