namespace MocapClean.Core.Stages.Outliers;

/// <summary>The stories that can be told of one place of a series, as it stands now.</summary>
internal sealed class Explanations
{
    /// <summary>
    /// A path counts as whole when its misfit is within this many spreads: that healthy motion exceeds it is about as rare as six spreads
    /// of size, since the misfit sums more values.
    /// </summary>
    private const double Whole = 4;

    /// <summary>Or within this part of the jump that was explained away: near another fault nothing fits better.</summary>
    private const double WholeBeside = 0.02;

    /// <summary>
    /// What a sample given up must save in squared spreads of misfit. A path that is whole has less than one of them in nearly every place,
    /// so a sample that is not needed is never given up, and one that is needed always.
    /// </summary>
    private const double PriceOfSample = 1;

    /// <summary>
    /// What is within so many spreads of where the motion on one side leads is motion, and so is what is within this part of its pace; at
    /// the instant of a blow, within this part of the size, which is less than what even the softest spike of eight samples has at its
    /// ends, sin(pi / 9).
    /// </summary>
    private const double MotionSpreads = 5;
    private const double MotionPart = 0.25;

    /// <summary>Samples of the run that decides how runs are best looked at.</summary>
    private const int TypicalRun = 2;

    private readonly MotionPath path;
    private readonly Tests tests;
    private readonly (int First, int Last) place;
    private readonly double threshold;
    private readonly double noise;
    private readonly MotionTest motion;
    private readonly LocalSpread spread;

    /// <summary>Looks at a place.</summary>
    /// <param name="path">The series.</param>
    /// <param name="tests">The tests.</param>
    /// <param name="place">First and last sample in doubt.</param>
    /// <param name="threshold">Robust spreads that make a jump.</param>
    /// <param name="noise">Robust spread of the length of one sample's noise, radians.</param>
    public Explanations(MotionPath path, Tests tests, (int First, int Last) place, double threshold, double noise)
    {
        this.path = path;
        this.tests = tests;
        this.place = place;
        this.threshold = threshold;
        this.noise = noise;
        motion = new MotionTest(path, place.First, place.Last);
        spread = new LocalSpread(path, tests, place, noise);
    }

    /// <summary>The story that leaves least unexplained for the samples that it gives up; null where all is motion.</summary>
    public Story? Cheapest(int longestSpike) => Steps().Concat<Story>(Spikes(longestSpike)).MinBy(s => s.Cost);

    private IEnumerable<Story.Step> Steps()
    {
        for (var n = place.First; n <= place.Last + 1 && n < path.Length; n++)
        {
            // No look is worth its time where motion explains the edge even by the least allowance.
            if (path.Trusted[n] && MotionTest.AcrossEdge(path, n) is var miss && miss > MotionSpreads * noise
                && spread.Best(0) is { } look && tests.Edges.At(path, n, look) is { } edge && edge.Better is var m
                && spread.OfEdge(m.Pattern) is { } usual && IsFault(m, usual)
                && (m.Pattern.Run == 0 ? miss > Roughly(m) : IsSure(n)))
            {
                yield return new Story.Step
                {
                    First = n,
                    Edge = edge,
                    Size = m.Size,
                    Spread = usual.Size,
                    Spreads = m.Size / usual.Size,
                    Cost = Cost(m, usual, 1),
                };
            }
        }
    }

    /// <summary>
    /// A jump across a gap is sure when every look sees it, the plainest too: what bends at the edges of a gap must not pass for one.
    /// </summary>
    private bool IsSure(int edge)
    {
        foreach (var look in Pattern.AllLooks)
        {
            if (tests.Edges.At(path, edge, look) is not { } seen || spread.OfEdge(seen.Better.Pattern) is not { } usual
                || seen.Better.Size < threshold * usual.Size)
            {
                return false;
            }
        }

        return true;
    }

    private IEnumerable<Story.Pop> Spikes(int longest)
    {
        for (var count = 1; count <= longest; count++)
        {
            for (var n = place.First; n + count - 1 <= place.Last; n++)
            {
                if (path.Trusted[n] && path.Trusted[n + count - 1] && Spike(n, n + count - 1) is { } spike)
                {
                    yield return spike;
                }
            }
        }
    }

    private Story.Pop? Spike(int first, int last)
    {
        var least = MotionSpreads * noise;
        if (motion.Explains(first, last, least, least) || spread.Best(TypicalRun) is not { } look
            || tests.Runs.At(path, first, last, look) is not { } m || m.Size <= threshold * noise
            || spread.OfRun(m.Pattern) is not { } usual || !IsFault(m, usual)
            || motion.Explains(first, last, Near(first, last, m), Roughly(m)))
        {
            return null;
        }

        return new Story.Pop
        {
            First = first,
            Last = last,
            Size = m.Size,
            Spreads = m.Size / usual.Size,
            Cost = Cost(m, usual, last - first + 1),
        };
    }

    private double Near(int first, int last, RunMeasure m) =>
        Math.Max(MotionSpreads * spread.OfMotion, MotionPart * Math.Min(m.Size, motion.Pace(first, last)));

    private double Roughly(RunMeasure m) => Math.Max(MotionSpreads * spread.OfMotion, MotionPart * m.Size);

    private bool IsFault(RunMeasure m, RunMeasure usual) =>
        m.Size > threshold * usual.Size && m.Misfit < Math.Max(Whole * usual.Misfit, WholeBeside * m.Size);

    private static double Cost(RunMeasure m, RunMeasure usual, int samples) =>
        (m.Misfit / usual.Misfit * (m.Misfit / usual.Misfit)) + (PriceOfSample * samples);
}
