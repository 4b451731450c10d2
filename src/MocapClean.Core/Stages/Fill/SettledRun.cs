namespace MocapClean.Core.Stages.Fill;

/// <summary>An open run with what was decided about it.</summary>
/// <param name="Run">The run.</param>
/// <param name="Bridge">What fills it; null where it stays open.</param>
/// <param name="Refusal">Why it stays open, in plain words; empty where it is filled.</param>
internal sealed record SettledRun(OpenRun Run, Bridge? Bridge, string Refusal);
