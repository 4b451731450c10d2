using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>What a playback rule does between two keys, four frames at a time, and what the search must know of the rule.</summary>
internal interface ICurve<TSelf>
    where TSelf : struct, ICurve<TSelf>
{
    /// <summary>
    /// The largest angle in radians, at equal times, between this playback and constant speed along the shorter arc, for neighbouring keys
    /// that are at most <paramref name="turn"/> radians apart. The search prunes by constant speed, widened by so much.
    /// </summary>
    static abstract double Stray(double turn);

    /// <summary>
    /// The cosine of half the turn that is played between two keys, from the inner product of their quaternions as written.
    /// </summary>
    static abstract double CosHalfTurn(double dot);

    /// <summary>The playback between two keys at two times, in seconds.</summary>
    static abstract TSelf Through(Quat a, Quat b, double start, double end);

    /// <summary>
    /// Squared chords between what is played at four times and four samples: 4 sin^2 of a quarter of the
    /// angle between them. Signs of samples do not matter.
    /// </summary>
    Vector256<double> SquaredChords(Vector256<double> time, in FourQuats samples);
}
