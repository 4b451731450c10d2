namespace MocapClean.Core.Takes;

/// <summary>What smoothing measured on one joint.</summary>
/// <param name="NoiseRadians">Estimated noise of one sample, RMS per axis, radians.</param>
/// <param name="CutoffHertz">Cutoff of the two-pass low-pass of equal effect, hertz; NaN where nothing was smoothed.</param>
public sealed record SmoothingMeasure(double NoiseRadians, double CutoffHertz);
