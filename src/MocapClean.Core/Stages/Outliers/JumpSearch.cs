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
    /// A path counts as whole when its misfit is within this many spreads: healthy motion exceeds it about as rarely as six spreads of
    /// size, since the misfit sums more values.
    /// </summary>
    private const double Whole = 4;

    /// <summary>Or within this part of the jump that was explained away: near another fault nothing fits better.</summary>
    private const double WholeBeside = 0.1;

    /// <summary>What a sample given up must save in squared spreads of misfit: its three numbers.</summary>
    private const double PriceOfSample = 3;

    /// <summary>
    /// The smallest turn that is called a step, radians: 1 degree. Sensors settle anew by some tenths of a degree as markers come and go
    /// or fields change; that is their accuracy, not a fault, and nobody need look at it.
    /// </summary>
    private const double SmallestStep = Math.PI / 180;

    private static readonly Pattern Full = new(Pattern.Side, 0, Pattern.Side);

    private readonly Screen screen = new(path, threshold, topTurn);
    private readonly RunTest runs = new();
    private readonly EdgeTest edges = new();

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
        return stories;
    }

    private void Explain((int First, int Last) place, List<Story> stories)
    {
        var (first, last) = place;
        while (first >= 0)
        {
            var spread = new LocalSpread(path, runs, edges, (first, last), screen.Noise);
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
        for (var n = first; n <= last + 1 && n < path.Length; n++)
        {
            if (path.Trusted[n] && edges.At(path, n, Full) is { } edge && edge.Better is var m && m.Size > SmallestStep
                && spread.OfEdge(m.Pattern) is { } usual && IsFault(m, usual))
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

    private IEnumerable<Story.Spike> Spikes(int first, int last, LocalSpread spread)
    {
        for (var count = 1; count <= longestSpike; count++)
        {
            for (var n = first; n + count - 1 <= last; n++)
            {
                if (path.Trusted[n] && path.Trusted[n + count - 1] && runs.At(path, n, n + count - 1, Full) is { } m
                    && spread.OfRun(m.Pattern) is { } usual && IsFault(m, usual))
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
