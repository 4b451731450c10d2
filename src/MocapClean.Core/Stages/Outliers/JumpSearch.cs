namespace MocapClean.Core.Stages.Outliers;

/// <summary>
/// Finds the jumps of a series and tells of each the cheapest story. What is explained is marked in the series at once, so that it does
/// not speak in the neighbourhood that judges the next; the most striking place comes first.
/// </summary>
/// <param name="path">The series; spikes lose their trust and steps become cuts.</param>
/// <param name="threshold">Robust spreads that make a jump.</param>
/// <param name="longestSpike">Samples of the longest spike.</param>
/// <param name="topTurn">A turn between neighbours, radians, beyond which they are looked at in any case.</param>
internal sealed class JumpSearch(MotionPath path, double threshold, int longestSpike, double topTurn)
{
    /// <summary>Striking samples no farther apart than this belong to one place: what one jump stirs up at the widest stride.</summary>
    private const int Together = 8;

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

    /// <summary>Samples between two spikes that could as well belong to them.</summary>
    private const int Unvouched = 2;

    /// <summary>Samples of the run that decides how runs are best looked at.</summary>
    private const int TypicalRun = 2;

    private readonly Screen screen = new(path, threshold, topTurn);
    private readonly RunTest runs = new();
    private readonly EdgeTest edges = new();
    private readonly MotionTest motion = new(path);

    /// <summary>Robust spread of the length of one sample's noise, radians.</summary>
    public double Noise => screen.Noise;

    /// <summary>All stories, in order of frames.</summary>
    public List<Story> Run()
    {
        var stories = new List<Story>();
        foreach (var place in screen.Places(Together))
        {
            Explain(place, stories);
        }

        stories.Sort((a, b) => a.First.CompareTo(b.First));
        return Joined(stories);
    }

    /// <summary>
    /// Makes one of spikes so close that the samples between them have no neighbours to vouch for them, where the whole is no longer than a
    /// spike may be.
    /// </summary>
    private List<Story> Joined(List<Story> stories)
    {
        var found = new List<Story>();
        foreach (var story in stories)
        {
            if (story is Story.Spike next && found.Count > 0 && found[^1] is Story.Spike last
                && next.First - last.Last <= Unvouched + 1 && next.Last - last.First < longestSpike)
            {
                var larger = next.Size > last.Size ? next : last;
                found[^1] = larger with { First = last.First, Last = next.Last };
            }
            else
            {
                found.Add(story);
            }
        }

        return found;
    }

    private void Explain((int First, int Last) place, List<Story> stories)
    {
        var (first, last) = place;
        while (first >= 0)
        {
            var spread = new LocalSpread(path, runs, edges, motion, (first, last), screen.Noise);
            var best = Steps(first, last, spread).Concat<Story>(Spikes(first, last, spread)).MinBy(s => s.Cost);
            if (best is null)
            {
                return;
            }

            stories.Add(best);
            Mark(best);
            (first, last) = screen.Striking(place.First, place.Last);
        }
    }

    private IEnumerable<Story.Step> Steps(int first, int last, LocalSpread spread)
    {
        if (spread.Best(0) is not { } look)
        {
            yield break;
        }

        for (var n = first; n <= last + 1 && n < path.Length; n++)
        {
            if (path.Trusted[n] && edges.At(path, n, look) is { } edge && edge.Better is var m
                && spread.OfEdge(m.Pattern) is { } usual && IsFault(m, usual) 
                && (m.Pattern.Run == 0 ? motion.Miss(n) > Roughly(m, spread) : IsSure(n, spread)))
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
    private bool IsSure(int edge, LocalSpread spread)
    {
        foreach (var look in Pattern.AllLooks)
        {
            if (edges.At(path, edge, look) is not { } seen || spread.OfEdge(seen.Better.Pattern) is not { } usual
                || seen.Better.Size < threshold * usual.Size)
            {
                return false;
            }
        }

        return true;
    }

    private IEnumerable<Story.Spike> Spikes(int first, int last, LocalSpread spread)
    {
        if (spread.Best(TypicalRun) is not { } look)
        {
            yield break;
        }

        for (var count = 1; count <= longestSpike; count++)
        {
            for (var n = first; n + count - 1 <= last; n++)
            {
                if (path.Trusted[n] && path.Trusted[n + count - 1] && runs.At(path, n, n + count - 1, look) is { } m
                    && spread.OfRun(m.Pattern) is { } usual && IsFault(m, usual)
                    && !motion.Explains(n, n + count - 1, Near(n, count, m, spread), Roughly(m, spread)))
                {
                    yield return new Story.Spike
                    {
                        First = n,
                        Last = n + count - 1,
                        Size = m.Size,
                        Spreads = m.Size / usual.Size,
                        Cost = Cost(m, usual, count),
                    };
                }
            }
        }
    }

    private double Near(int first, int count, Measure m, LocalSpread spread) => Math.Max(
        MotionSpreads * spread.OfMotion, MotionPart * Math.Min(m.Size, motion.Pace(first, first + count - 1)));

    private static double Roughly(Measure m, LocalSpread spread) => Math.Max(MotionSpreads * spread.OfMotion, MotionPart * m.Size);

    private bool IsFault(Measure m, Measure usual) =>
        m.Size > threshold * usual.Size && m.Misfit < Math.Max(Whole * usual.Misfit, WholeBeside * m.Size);

    private static double Cost(Measure m, Measure usual, int samples) =>
        (m.Misfit / usual.Misfit * (m.Misfit / usual.Misfit)) + (PriceOfSample * samples);

    private void Mark(Story story)
    {
        var last = story.First;
        if (story is Story.Spike spike)
        {
            last = spike.Last;
            path.Trusted.AsSpan(spike.First, spike.Last - spike.First + 1).Clear();
        }
        else
        {
            path.Cut[story.First] = true;
        }

        screen.Refresh(story.First - Together, last + Together);
    }
}
