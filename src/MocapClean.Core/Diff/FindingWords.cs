using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Diff;

/// <summary>Findings in plain words, degrees and seconds.</summary>
public static class FindingWords
{
    /// <summary>Frames with their seconds, such as <c>84 frames (0.70 s)</c>.</summary>
    public static string Length(double frames, double rate) =>
        $"{frames:0.#} {(frames == 1 ? "frame" : "frames")} ({frames / rate:0.00} s)";

    /// <summary>What happened, such as <c>jumps by 41 deg and stays</c>.</summary>
    public static string What(Finding f, double rate) => Happened(f, rate)
        + (f.Kind is FaultKind.Gap or FaultKind.Spike or FaultKind.Freeze && f.Note.StartsWith("not filled", StringComparison.Ordinal) ? $" ({f.Note})" : "");

    private static string Happened(Finding f, double rate) => f.Kind switch
    {
        FaultKind.Gap => $"missing for {Length(f.Count, rate)}",
        FaultKind.Spike => $"pops by {Degrees(f)} for {Length(f.Count, rate)}",
        FaultKind.Step => $"jumps by {Degrees(f)} and stays",
        FaultKind.Offset => $"is turned by {Degrees(f)} for {Length(f.Count, rate)}",
        FaultKind.Freeze => $"is frozen for {Length(f.Count, rate)}",
        FaultKind.LostFrames => f.Note,
        FaultKind.Clock => f.Note,
        FaultKind.SignFlip => f.Note.Length > 0 ? f.Note : "changes sign",
        _ => f.Kind.Text(),
    };

    private static string Degrees(Finding f) =>
        double.IsNaN(f.SizeRadians) ? "an unknown angle" : $"{Angle.ToDegrees(f.SizeRadians):0.#} deg";
}
