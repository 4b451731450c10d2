namespace MocapClean.Core.Takes;

/// <summary>Frames per second as an exact fraction in lowest terms, so that time codes never depend on rounding.</summary>
public readonly record struct FrameRate
{
    // What cameras, suits and game engines run at; 1001 in the denominator marks the television rates.
    private static readonly FrameRate[] Nominal =
    [
        new(24000, 1001), new(24, 1), new(25, 1), new(30000, 1001), new(30, 1), new(48000, 1001), new(48, 1), new(50, 1),
        new(60000, 1001), new(60, 1), new(90, 1), new(100, 1), new(120000, 1001), new(120, 1), new(125, 1), new(150, 1), new(180, 1),
        new(200, 1), new(240000, 1001), new(240, 1), new(250, 1), new(300, 1), new(360, 1), new(480, 1), new(500, 1), new(1000, 1),
    ];

    /// <summary>The fraction, brought to lowest terms.</summary>
    /// <param name="numerator">Frames, above 0.</param>
    /// <param name="denominator">In so many seconds, above 0.</param>
    public FrameRate(long numerator, long denominator)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(numerator);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(denominator);
        var (a, b) = (numerator, denominator);
        while (b != 0)
        {
            (a, b) = (b, a % b);
        }

        (Numerator, Denominator) = (numerator / a, denominator / a);
    }

    /// <summary>Frames.</summary>
    public long Numerator { get; }

    /// <summary>In so many seconds.</summary>
    public long Denominator { get; }

    /// <summary>Frames per second as a double.</summary>
    public double Hertz => (double)Numerator / Denominator;

    /// <summary>Seconds between frames as a double.</summary>
    public double Interval => (double)Denominator / Numerator;

    /// <summary>The time of a frame in seconds, rounded once: the product is exact below 2^53, which is ages.</summary>
    public double TimeOf(long frame) => (double)frame * Denominator / Numerator;

    /// <summary>
    /// The fraction that a person means by a number of hertz: a whole number, a television rate where it agrees with one to six digits
    /// (119.88 is 120000/1001), else the decimal as it is printed.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">Not between 0.001 and a million.</exception>
    public static FrameRate FromHertz(double hertz)
    {
        if (!(hertz is >= 1e-3 and <= 1e6))
        {
            throw new ArgumentOutOfRangeException(nameof(hertz), hertz, "A rate lies between 0.001 and 1000000 frames a second");
        }

        var nearest = NearestNominal(1 / hertz);
        return Math.Abs((nearest.Hertz / hertz) - 1) <= 2e-6 ? nearest : new((long)Math.Round(hertz * 1e9), 1_000_000_000);
    }

    /// <summary>The nominal rate whose interval is nearest to the given one, in seconds.</summary>
    public static FrameRate NearestNominal(double interval)
    {
        var best = Nominal[0];
        foreach (var rate in Nominal)
        {
            best = Math.Abs(rate.Interval - interval) < Math.Abs(best.Interval - interval) ? rate : best;
        }

        return best;
    }

    /// <summary>The fraction, as "24000/1001" or "25".</summary>
    public override string ToString() => Denominator == 1 ? $"{Numerator}" : $"{Numerator}/{Denominator}";
}
