namespace MocapClean.Cli.Report;

/// <summary>How frames are named to a person.</summary>
/// <param name="FirstFrame">Number of the first frame.</param>
/// <param name="TimeCode">SMPTE address of a frame counted from 0; empty where none is known.</param>
public sealed record FrameLabels(int FirstFrame, Func<int, string> TimeCode)
{
    /// <summary>What a person should know about the time code; empty where all is well.</summary>
    public string Note { get; init; } = "";

    /// <summary>The number that a person reads for a frame counted from 0.</summary>
    public int Number(int frame) => frame + FirstFrame;
}
