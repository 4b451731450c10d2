namespace MocapClean.Core.Stages.Outliers;

/// <summary>The trusted samples nearest to a run on both sides, nearest first.</summary>
internal readonly ref struct TrustedNeighbours
{
    private readonly Pattern most;

    private TrustedNeighbours(ReadOnlySpan<int> before, ReadOnlySpan<int> after, Pattern most)
    {
        this.most = most;
        Before = before;
        After = after;
    }

    /// <summary>Those before the run.</summary>
    public ReadOnlySpan<int> Before { get; }

    /// <summary>Those after it.</summary>
    public ReadOnlySpan<int> After { get; }

    /// <summary>How many there are.</summary>
    public int Count => Before.Length + After.Length;

    /// <summary>Enough on both sides to tell anything.</summary>
    public bool Suffice => !Before.IsEmpty && !After.IsEmpty && Count >= Pattern.Fewest;

    /// <summary>What can be seen with them.</summary>
    public Pattern Pattern => new(Before.Length, After[0] - Before[0] - 1, After.Length, most.Degree);

    /// <summary>All neighbours are there, with nothing missing between them.</summary>
    public bool AreRegular => Before.Length == most.Before && After.Length == most.After
        && After[^1] - Before[^1] == Pattern.Run + Count - 1;

    /// <summary>The neighbour of the given index, those before the run first.</summary>
    public int this[int index] => index < Before.Length ? Before[index] : After[index - Before.Length];

    /// <summary>Finds the neighbours of a run, none where something cuts the run.</summary>
    /// <param name="path">The series.</param>
    /// <param name="first">First sample of the run.</param>
    /// <param name="last">Its last; one less than the first for an edge between two samples.</param>
    /// <param name="most">Limits on both sides.</param>
    /// <param name="room">Place for twice <see cref="Pattern.Most"/> frames.</param>
    public static TrustedNeighbours Of(MotionPath path, int first, int last, Pattern most, Span<int> room)
    {
        if (first < 1 || last + 1 >= path.Length || !path.IsUncut(first - 1, last + 1))
        {
            return default;
        }

        var before = room[..most.Before];
        var after = room.Slice(Pattern.Most, most.After);
        return new(before[..path.Before(first - 1, before)], after[..path.After(last + 1, after)], most);
    }

    /// <summary>Their places, counted from the middle between the nearest two.</summary>
    public void Times(Span<double> times)
    {
        var middle = (Before[0] + After[0]) / 2.0;
        for (var i = 0; i < times.Length; i++)
        {
            times[i] = this[i] - middle;
        }
    }
}
