using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>What a span between two neighbouring keys must keep to. Two adjacent frames may always be neighbouring keys.</summary>
/// <param name="Tolerance">Largest angle between samples and playback, radians, at most pi/2.</param>
/// <param name="Widest">Widest turn from key to key as it is played, radians, at most pi.</param>
/// <param name="Longest">Longest time from key to key, seconds.</param>
internal readonly record struct SpanLimits(double Tolerance, double Widest, double Longest)
{
    /// <summary>Angles are kept a hair below what was asked for, so that the rounding of the written keys cannot pass it.</summary>
    public const double Hair = 1 - 1e-9;

    /// <summary>The cosine of half the widest turn.</summary>
    public double CosWidest { get; } = Math.Cos(Widest * Hair / 2);

    /// <summary>Whether turn and time allow a span.</summary>
    public bool Allow<TCurve>(Stretch stretch, int first, int last)
        where TCurve : struct, ICurve<TCurve> =>
        last == first + 1 || (stretch.Time[last] - stretch.Time[first] <= Longest &&
            TCurve.CosHalfTurn(Quat.Dot(stretch[first], stretch[last])) >= CosWidest);
}
