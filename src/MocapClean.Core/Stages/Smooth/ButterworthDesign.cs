namespace MocapClean.Core.Stages.Smooth;

/// <summary>
/// Second-order Butterworth low-pass by the bilinear transform, for y[n] = b0 (x[n] + 2 x[n-1] + x[n-2]) - a1 y[n-1] - a2 y[n-2].
/// Source: Winter, Biomechanics and Motor Control of Human Movement.
/// </summary>
/// <param name="B0">First coefficient of the input.</param>
/// <param name="A1">First coefficient of the output.</param>
/// <param name="A2">Second coefficient of the output.</param>
internal readonly record struct ButterworthDesign(double B0, double A1, double A2)
{
    /// <summary>
    /// (sqrt 2 - 1)^(1/4): each of two passes must be wider by this, so that both together have a gain of sqrt(1/2) at the cutoff.
    /// It divides the warped frequency tan(pi fc / fs), not fc itself.
    /// </summary>
    public const double TwoPassFactor = 0.8022432629231502;

    /// <summary>One pass, gain sqrt(1/2) at the cutoff.</summary>
    public static ButterworthDesign OnePass(double cutoff, double rate) => Warped(Math.Tan(Math.PI * cutoff / rate));

    /// <summary>One of two passes that together have a gain of sqrt(1/2) at the cutoff.</summary>
    public static ButterworthDesign OneOfTwoPasses(double cutoff, double rate) => Warped(WarpedForTwo(cutoff, rate));

    /// <summary>
    /// The share of white noise that two passes let through: the mean of 1 / (1 + (tan(pi f / fs) / k)^4) over frequency, in closed form.
    /// </summary>
    public static double Passed(double cutoff, double rate)
    {
        var k = WarpedForTwo(cutoff, rate);
        var k4 = k * k * k * k;
        return (k4 + ((k - (k * k * k)) / Math.Sqrt(2))) / (1 + k4);
    }

    private static double WarpedForTwo(double cutoff, double rate) => Math.Tan(Math.PI * cutoff / rate) / TwoPassFactor;

    private static ButterworthDesign Warped(double k)
    {
        var scale = 1 / (1 + (Math.Sqrt(2) * k) + (k * k));
        return new(k * k * scale, 2 * ((k * k) - 1) * scale, (1 - (Math.Sqrt(2) * k) + (k * k)) * scale);
    }
}
