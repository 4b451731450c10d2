using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// The stretches of one joint that are long enough to be smoothed, one after another, each sign-continuous in itself. Laid end to end so that
/// one strength can be judged on all of them; <see cref="Starts"/> keeps anything from reaching across.
/// </summary>
internal sealed class JointCurve
{
    private readonly bool[] _negated;

    /// <summary>Gathers the stretches; signs are settled in the copy only.</summary>
    public JointCurve(JointTrack track, Clock clock, IReadOnlyList<Segment> stretches, double finest)
    {
        Stretches = stretches;
        Rate = clock.Rate;
        IsRegular = clock.IsRegular;
        Finest = finest;
        Starts = new int[stretches.Count + 1];
        for (var s = 0; s < stretches.Count; s++)
        {
            Starts[s + 1] = Starts[s] + stretches[s].Count;
        }

        Samples = new Quat[Starts[^1]];
        Times = new double[Starts[^1]];
        _negated = new bool[Starts[^1]];
        for (var s = 0; s < stretches.Count; s++)
        {
            Gather(track, clock, stretches[s], Starts[s]);
        }
    }

    /// <summary>The stretches in frames of the take.</summary>
    public IReadOnlyList<Segment> Stretches { get; }

    /// <summary>Index of the first sample of each stretch, and the number of samples at the end.</summary>
    public int[] Starts { get; }

    /// <summary>The samples, sign-continuous within each stretch.</summary>
    public Quat[] Samples { get; }

    /// <summary>Time of each sample in frame intervals.</summary>
    public double[] Times { get; }

    /// <summary>Frames per second.</summary>
    public double Rate { get; }

    /// <summary>Times are whole intervals.</summary>
    public bool IsRegular { get; }

    /// <summary>RMS angle, radians, that rounding of the delivered text moves a sample by: no noise estimate goes below it.</summary>
    public double Finest { get; }

    /// <summary>Number of samples.</summary>
    public int Length => Samples.Length;

    /// <summary>A quaternion with the sign that the track has at that sample.</summary>
    public Quat Signed(int index, Quat q) => _negated[index] ? -q : q;

    private void Gather(JointTrack track, Clock clock, Segment stretch, int at)
    {
        for (var n = 0; n < stretch.Count; n++)
        {
            var q = track.Samples[stretch.First + n];
            var negate = n > 0 && Quat.Dot(q, Samples[at + n - 1]) < 0;
            _negated[at + n] = negate;
            Samples[at + n] = negate ? -q : q;
            Times[at + n] = clock.IsRegular ? n : (clock.Steady[stretch.First + n] - clock.Steady[stretch.First]) * clock.Rate;
        }
    }
}
