namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// Learns how the joint moves: about a run, since a joint that rests now and fights later moves in two ways, and for long runs over
/// the whole track as well, since a neighbourhood holds too few slow swings to learn them from.
/// </summary>
internal sealed class MotionModels(Increments increments, double rate, double textRounding)
{
    // Up to this length a run is bridged from what lies close by; slower swings are straight lines to it.
    private const double ShortSeconds = 0.3;

    // Lags that matter to a short run and its neighbours, and the slowest swing that a take holds often enough to learn from.
    private const double ShortLagSeconds = 0.7;
    private const double LongLagSeconds = 2.8;

    // Neighbours on either side that are asked: at 100 to 150 Hz about a quarter of a second for short runs, twice that for long ones
    // would do no better than this.
    private const int FewNeighbours = 30;
    private const int ManyNeighbours = 50;

    // Half the width of the neighbourhood that is learned from: long enough for some swings, short enough to tell rest from action.
    private const double NeighbourhoodSeconds = 3;

    // Known increments that a neighbourhood must hold; it is widened until it does. Four times the neighbours of a short run.
    private const int FewestKnown = 8 * FewNeighbours;

    // Memory and time grow with the lags; only rates above 1400 Hz are cut short by it.
    private const int MostLags = 4000;

    // Rounding of a product of unit quaternions in double precision, radians: no data is better than that.
    private const double Arithmetic = 1e-12;

    // Shares of the variance that may be noise: a clean motion, a common one, jitter. Which one holds is decided at each run.
    private static readonly double[] NoiseShares = [1e-5, 1e-3, 1e-2];

    private MotionCovariance? wholeTrack;

    /// <summary>Some increment is known, so that there is something to learn from.</summary>
    public bool CanLearn { get; } = increments.Known.Contains(value: true);

    /// <summary>Models for a row of intervals, and how many neighbours on either side they should be given.</summary>
    public (MotionModel[] Models, int Neighbours) About(int first, int count)
    {
        if (count <= ShortSeconds * rate)
        {
            return ([.. WithNoise(Local(first, count, ShortLagSeconds))], FewNeighbours);
        }

        wholeTrack ??= Learn(0, increments.Known.Length, _ => 1, LongLagSeconds);
        return ([.. WithNoise(wholeTrack), .. WithNoise(Local(first, count, LongLagSeconds))], ManyNeighbours);
    }

    private IEnumerable<MotionModel> WithNoise(MotionCovariance covariance)
    {
        var least = Math.Max(textRounding, Arithmetic);
        return NoiseShares.Select(share => new MotionModel(covariance, (share * covariance.Variance) + (least * least)));
    }

    private MotionCovariance Local(int first, int count, double lagSeconds)
    {
        var middle = first + ((count - 1) / 2.0);
        var half = (NeighbourhoodSeconds * rate) + (count / 2.0);
        while (half < increments.Known.Length && increments.CountKnown(From(half), To(half)) < FewestKnown)
        {
            half *= 2;
        }

        return Learn(From(half), To(half), i => (1 + Math.Cos(Math.PI * (i - middle) / half)) / 2, lagSeconds);

        int From(double half) => Math.Max(0, (int)Math.Ceiling(middle - half));

        int To(double half) => Math.Min(increments.Known.Length, (int)Math.Floor(middle + half) + 1);
    }

    private MotionCovariance Learn(int from, int to, Func<double, double> weight, double lagSeconds)
    {
        var longest = (int)Math.Clamp(lagSeconds * rate, 1, MostLags);
        var turns = increments.Turns(from, to);
        return MotionCovariance.Learn(turns, increments.Known.AsSpan(from, to - from), i => weight(from + i), longest, rate);
    }
}
