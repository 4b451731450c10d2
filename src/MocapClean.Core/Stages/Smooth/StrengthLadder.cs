namespace MocapClean.Core.Stages.Smooth;

/// <summary>The strengths that are tried, as logarithms of one over the penalty on third differences.</summary>
internal static class StrengthLadder
{
    /// <summary>A joint that turns to and fro slower than once in four seconds is at rest, as far as noise is concerned.</summary>
    private const double LowestCutoff = 0.25;

    /// <summary>The loosest: at half the rate, where a penalty does most, it takes away 2 %.</summary>
    private const double LogLoosest = 8;

    /// <summary>Rungs of the whole ladder: about a factor of 1.4 in cutoff apart. Finer ladders left the same error.</summary>
    private const int Rungs = 16;

    /// <summary>The whole range for a rate, from rest to nearly nothing.</summary>
    public static double[] Whole(double rate)
    {
        // A penalty of 1 / (2 sin(pi f / fs))^6 halves what turns at f.
        var lowest = 6 * Math.Log(2 * Math.Sin(Math.PI * Math.Min(0.25, LowestCutoff / rate)));
        var step = (LogLoosest - lowest) / (Rungs - 1);
        return [.. Enumerable.Range(0, Rungs).Select(k => lowest + (k * step))];
    }

    /// <summary>The same step up and down from a strength that is there already: cutoffs from a quarter of it to 2.7 times.</summary>
    public static double[] Around => [-8, -6, -4, -2, 0, 2, 4, 6];

    /// <summary>Half as far, for axes that share a local strength.</summary>
    public static double[] Near => [-3, -1, 1, 3];

    /// <summary>Half-gain cutoff in hertz; half the rate where even that passes.</summary>
    public static double Cutoff(double logLooseness, double rate) => rate / Math.PI * Math.Asin(Math.Min(1, Math.Exp(logLooseness / 6) / 2));
}
