namespace MocapClean.Core.Stages.Outliers;

/// <summary>A jump explained.</summary>
internal abstract record Story
{
    private Story()
    {
    }

    /// <summary>First sample of the run; the first turned one of a step.</summary>
    public required int First { get; init; }

    /// <summary>How far what was delivered lies from what the neighbours predict, radians.</summary>
    public required double Size { get; init; }

    /// <summary>The same in robust spreads.</summary>
    public required double Spreads { get; init; }

    /// <summary>How much it leaves unexplained, and how many samples it gives up: the cheapest story is told.</summary>
    public required double Cost { get; init; }

    /// <summary>A short run without which the path is whole.</summary>
    public sealed record Pop : Story
    {
        /// <summary>Last sample of the run.</summary>
        public required int Last { get; init; }
    }

    /// <summary>From here on all is turned.</summary>
    public sealed record Step : Story
    {
        /// <summary>The turn, told twice.</summary>
        public required EdgeMeasure Edge { get; init; }

        /// <summary>Robust spread of the estimate of the turn, radians.</summary>
        public required double Spread { get; init; }
    }
}
