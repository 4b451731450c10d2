using System.Collections.Immutable;

namespace MocapClean.Core.Takes;

/// <summary>The time of every frame of a take.</summary>
public sealed record Clock
{
    /// <summary>Times as delivered, in seconds; may stand still or run back where the source does.</summary>
    public required ImmutableArray<double> Delivered { get; init; }

    /// <summary>
    /// Strictly rising times in seconds for computing: the exact grid where the delivered times agree with a regular clock within the
    /// rounding of their digits, the delivered times elsewhere, moved on by one interval where those do not rise.
    /// </summary>
    public required ImmutableArray<double> Steady { get; init; }

    /// <summary>Frames per second: the nominal rate where the spacing is within rounding of one, else one over the median spacing.</summary>
    public required double Rate { get; init; }

    /// <summary>Every spacing is one interval, within the rounding of the printed digits.</summary>
    public required bool IsRegular { get; init; }

    /// <summary>Seconds between frames.</summary>
    public double Interval => 1 / Rate;

    /// <summary>Number of frames.</summary>
    public int Length => Delivered.Length;

    /// <summary>A clock that ticks evenly from 0.</summary>
    /// <param name="frames">Number of frames, at least 1.</param>
    /// <param name="rate">Frames per second, above 0.</param>
    public static Clock Regular(int frames, double rate)
    {
        var times = Enumerable.Range(0, frames).Select(n => n / rate).ToImmutableArray();
        return new Clock { Delivered = times, Steady = times, Rate = rate, IsRegular = true };
    }
}
