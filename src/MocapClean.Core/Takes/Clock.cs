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

    /// <summary>The rate as an exact fraction, where it is nominal or an exact decimal; null where it was only measured.</summary>
    public FrameRate? ExactRate { get; init; }

    /// <summary>Half a unit of the last printed digit of the delivered times, in seconds.</summary>
    public double Rounding { get; init; }

    /// <summary>Seconds between frames.</summary>
    public double Interval => ExactRate?.Interval ?? (1 / Rate);

    /// <summary>Number of frames.</summary>
    public int Length => Delivered.Length;

    /// <summary>A clock that ticks evenly from 0.</summary>
    /// <param name="frames">Number of frames, at least 1.</param>
    /// <param name="rate">Frames per second, above 0.</param>
    public static Clock Regular(int frames, double rate) => Regular(frames, FrameRate.FromHertz(rate));

    /// <summary>A clock that ticks evenly from 0.</summary>
    /// <param name="frames">Number of frames, at least 1.</param>
    /// <param name="rate">Frames per second.</param>
    public static Clock Regular(int frames, FrameRate rate)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(frames, 1);
        var times = Enumerable.Range(0, frames).Select(n => rate.TimeOf(n)).ToImmutableArray();
        return new Clock { Delivered = times, Steady = times, Rate = rate.Hertz, ExactRate = rate, IsRegular = true };
    }

    /// <summary>
    /// The clock of a column of times. They are delivered as they are; what they say about the rate is read within their rounding.
    /// A time that stands still or runs back, or a jump, is data and not an error: see <see cref="Rises"/> and <see cref="Lost"/>.
    /// </summary>
    /// <param name="times">Seconds, one for each frame, at least one.</param>
    /// <param name="rounding">Half a unit of the last printed digit, in seconds; 0 for times that were not printed.</param>
    /// <exception cref="ArgumentException">No frame, a time that is not finite, or a median spacing that is not above zero.</exception>
    public static Clock FromTimes(ReadOnlySpan<double> times, double rounding) => ClockReading.Read(times, rounding);

    /// <summary>
    /// The clock of a take that says only how long a frame lasts. The nominal rate is meant where the printed digits agree with it
    /// (.0083333 is 120 frames a second), else the exact decimal that was printed.
    /// </summary>
    /// <param name="frames">Number of frames, at least 1.</param>
    /// <param name="secondsPerFrame">Seconds, above 0.</param>
    /// <param name="rounding">Half a unit of the last printed digit, in seconds; 0 for a number that was not printed.</param>
    /// <exception cref="ArgumentException">No frame, or a frame time that is not above zero.</exception>
    public static Clock FromFrameTime(int frames, double secondsPerFrame, double rounding)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(frames, 1);
        if (!(double.IsFinite(secondsPerFrame) && secondsPerFrame > 0))
        {
            throw new ArgumentException($"no usable time: a frame lasts {secondsPerFrame} s", nameof(secondsPerFrame));
        }

        var allowed = Math.Max(rounding, 1e-9 * secondsPerFrame);
        var exact = ClockReading.Meant(secondsPerFrame, allowed, ClockReading.NearNominal) ?? ClockReading.Printed(secondsPerFrame, rounding);
        if (exact is { } rate)
        {
            return Regular(frames, rate);
        }

        var times = Enumerable.Range(0, frames).Select(n => n * secondsPerFrame).ToImmutableArray();
        return new Clock { Delivered = times, Steady = times, Rate = 1 / secondsPerFrame, IsRegular = true };
    }

    /// <summary>How many frames are missing between a frame and the one before it, by their times.</summary>
    public int Lost(int frame)
    {
        var intervals = frame == 0 ? 1 : (Steady[frame] - Steady[frame - 1]) / Interval;
        return intervals > 1.5 ? (int)Math.Min(Math.Round(intervals) - 1, int.MaxValue) : 0;
    }

    /// <summary>The delivered time of a frame is later than that of the frame before it, as far as the printed digits can tell.</summary>
    public bool Rises(int frame) => frame == 0 || !ClockReading.Stalls(Delivered[frame] - Delivered[frame - 1], Interval, Rounding);
}
