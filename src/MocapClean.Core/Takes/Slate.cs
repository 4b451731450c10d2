namespace MocapClean.Core.Takes;

/// <summary>The one frame of a take whose time code is known.</summary>
/// <param name="Frame">Frame number from 0.</param>
/// <param name="Address">The address that begins with it.</param>
public sealed record Slate(int Frame, TimeCode Address)
{
    /// <summary>
    /// The address that runs at a frame, rounded down. It follows the times of the clock and not the count of frames, so that lost frames
    /// pass in it; by exact fractions where the rate is exact.
    /// </summary>
    public TimeCode At(Clock clock, int frame)
    {
        ArgumentNullException.ThrowIfNull(clock);

        // A wild time has no address worth having, but it must not break the arithmetic either.
        var seconds = Math.Clamp(clock.Steady[frame] - clock.Steady[Frame], -1e9, 1e9);
        return clock.ExactRate is { } capture
            ? Address.After((long)Math.Round(seconds * capture.Hertz), capture)
            : Address.After(seconds + clock.Rounding);
    }
}
