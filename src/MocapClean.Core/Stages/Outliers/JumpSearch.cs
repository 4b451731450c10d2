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
    /// Change of speed within one sample that no body part and no prop survives, radians per second: 6000 degrees, twice that of a fist
    /// that is stopped dead. A kink in a path lies a third of its change of speed from the cubic through its neighbours.
    /// </summary>
    private const double HardestBlow = 6000 * Math.PI / 180;

    /// <summary>Samples between two spikes that could as well belong to them.</summary>
    private const int Unvouched = 2;

    private readonly Screen screen = new(path, threshold, topTurn);
    private readonly Tests tests = new(new RunTest(), new EdgeTest());

    /// <summary>Robust spread of the length of one sample's noise, radians.</summary>
    public double Noise => screen.Noise;

    /// <summary>Looks again where samples have lost their trust or a cut has come.</summary>
    public void Refresh(int first, int last) => screen.Refresh(first - Together, last + Together);

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
    /// After the search: runs that jump about beyond what the hardest blow does, with too little healthy motion between to tell a story by.
    /// </summary>
    public List<(int First, int Last, double Size)> Unexplained() => screen.Wild(Together, HardestBlow / path.Rate / 3);

    private void Explain((int First, int Last) place, List<Story> stories)
    {
        var left = place;
        while (left.First >= 0 && new Explanations(path, tests, left, threshold, Noise).Cheapest(longestSpike) is { } story)
        {
            stories.Add(story);
            Mark(story);
            left = screen.Striking(place.First, place.Last);
        }
    }

    private void Mark(Story story)
    {
        var last = story.First;
        if (story is Story.Pop spike)
        {
            last = spike.Last;
            path.Trusted.AsSpan(spike.First, spike.Last - spike.First + 1).Clear();
        }
        else
        {
            path.Cut[story.First] = true;
        }

        Refresh(story.First, last);
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
            if (story is Story.Pop next && found.Count > 0 && found[^1] is Story.Pop last
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
}
