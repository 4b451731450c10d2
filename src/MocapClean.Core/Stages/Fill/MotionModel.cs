namespace MocapClean.Core.Stages.Fill;

/// <summary>One way in which the joint may be moving about a run.</summary>
/// <param name="Covariance">Covariance of the increments.</param>
/// <param name="Noise">Variance of what an increment holds beside that motion, per axis, square radians.</param>
internal sealed record MotionModel(MotionCovariance Covariance, double Noise);
