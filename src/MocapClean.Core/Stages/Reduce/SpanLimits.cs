namespace MocapClean.Core.Stages.Reduce;

/// <summary>What a span between two neighbouring keys must keep to. Two adjacent frames may always be neighbouring keys.</summary>
/// <param name="Tolerance">Largest angle between samples and playback, radians, at most pi/2.</param>
/// <param name="Widest">Widest turn from key to key, radians, at most pi.</param>
/// <param name="Longest">Longest time from key to key, seconds.</param>
internal readonly record struct SpanLimits(double Tolerance, double Widest, double Longest);
