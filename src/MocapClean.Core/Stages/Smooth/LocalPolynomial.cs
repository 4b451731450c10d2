namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Weights of the least-squares polynomial through the samples of a window, evaluated at one place (Savitzky and Golay 1964, with the
/// corrections of Steinier et al. 1972: the weights are computed, not taken from a table). By orthogonal polynomials on the samples' own
/// times, which need not be even.
/// </summary>
internal static class LocalPolynomial
{
    /// <summary>Weight of each sample of the window in the value of the polynomial at a time.</summary>
    /// <param name="times">Times in the window, rising; more of them than the degree.</param>
    /// <param name="degree">Degree of the polynomial.</param>
    /// <param name="at">Where the polynomial is evaluated.</param>
    /// <param name="weights">As many as times.</param>
    public static void Weights(ReadOnlySpan<double> times, int degree, double at, Span<double> weights)
    {
        var n = times.Length;
        var (before, now) = (new double[n], new double[n]);
        Array.Fill(now, 1);
        weights.Clear();
        var (valueBefore, value, normBefore) = (0.0, 1.0, 1.0);
        for (var k = 0; k <= degree; k++)
        {
            var (norm, moment) = (0.0, 0.0);
            for (var i = 0; i < n; i++)
            {
                norm += now[i] * now[i];
                moment += (times[i] - at) * now[i] * now[i];
            }

            for (var i = 0; i < n; i++)
            {
                weights[i] += now[i] * value / norm;
            }

            // Forsythe 1957: p(k+1) = (t - a) p(k) - b p(k-1).
            var (a, b) = (moment / norm, k == 0 ? 0 : norm / normBefore);
            for (var i = 0; i < n; i++)
            {
                (before[i], now[i]) = (now[i], ((times[i] - at - a) * now[i]) - (b * before[i]));
            }

            (valueBefore, value, normBefore) = (value, (-a * value) - (b * valueBefore), norm);
        }
    }
}
