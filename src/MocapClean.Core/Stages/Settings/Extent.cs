namespace MocapClean.Core.Stages.Settings;

/// <summary>A length of time, given in seconds or in frames.</summary>
/// <param name="Amount">Seconds, or frames.</param>
/// <param name="InFrames">Which of the two.</param>
public readonly record struct Extent(double Amount, bool InFrames)
{
    /// <summary>So many seconds.</summary>
    public static Extent Seconds(double seconds) => new(seconds, InFrames: false);

    /// <summary>So many frames.</summary>
    public static Extent Frames(double frames) => new(frames, InFrames: true);

    /// <summary>Frames at a rate in frames per second, not rounded.</summary>
    public double ToFrames(double rate) => InFrames ? Amount : Amount * rate;

    /// <summary>Whole frames that fit at a rate in frames per second; a hair is allowed for, so that 0.5 s at 59.94 means what it says.</summary>
    public int WholeFrames(double rate) => (int)Math.Min(int.MaxValue, Math.Floor(ToFrames(rate) + 1e-6));
}
