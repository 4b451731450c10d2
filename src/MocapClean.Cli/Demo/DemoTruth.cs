namespace MocapClean.Cli.Demo;

/// <summary>One fault that was put in on purpose. Frames from 0, the last one included.</summary>
/// <param name="Joint">The joint; empty for the whole take.</param>
/// <param name="First">First frame.</param>
/// <param name="Last">Last frame.</param>
/// <param name="Kind">The kind, spelled as in the reports.</param>
/// <param name="SizeDegrees">How large; 0 where size means nothing.</param>
/// <param name="IsHard">Near the limit of what the data can show.</param>
internal sealed record DemoTruth(string Joint, int First, int Last, string Kind, double SizeDegrees, bool IsHard);
