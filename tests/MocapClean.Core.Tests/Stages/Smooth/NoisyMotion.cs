using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Smooth;

/// <summary>Motions in closed form, with noise that is the same for the same seed, and the stage run on them.</summary>
internal static class NoisyMotion
{
    public const double Rate = 1000 / 7.0;

    /// <summary>Every method that smooths.</summary>
    public static TheoryData<SmoothMethod> Methods =>
        [SmoothMethod.Adaptive, SmoothMethod.Whittaker, SmoothMethod.Butterworth, SmoothMethod.SavitzkyGolay];

    /// <summary>To and fro about three axes at three paces, up to half a turn.</summary>
    public static Quat Swing(double seconds, double share = 1) => RotationVector.Exp(share * new Vec3(
        Math.Sin(2 * Math.PI * 0.9 * seconds), 0.5 * Math.Sin((2 * Math.PI * 1.7 * seconds) + 1), 0.2 * Math.Sin(2 * Math.PI * 2.3 * seconds)));

    public static Quat[] Swing(int frames) => [.. Enumerable.Range(0, frames).Select(n => Swing(n / Rate))];

    /// <summary>From rest up to a steady spin within a second.</summary>
    public static Quat[] SpinUp(int frames, double degreesASecond) => [.. Enumerable.Range(0, frames).Select(n =>
    {
        var t = Math.Max(0, (n / Rate) - 1);
        var turned = t < 1 ? degreesASecond * t * t / 2 : degreesASecond * (t - 0.5);
        return Some.About(0, 0.6, 0.8, turned);
    })];

    /// <summary>White noise, degrees RMS an axis.</summary>
    public static Quat[] Noisy(this Quat[] samples, double degrees, int seed)
    {
        var random = new Random(seed);
        return [.. samples.Select(q => q * RotationVector.Exp(Angle.FromDegrees(degrees) * new Vec3(Normal(random), Normal(random), Normal(random))))];
    }

    public static Take Smooth(this Take take, SmoothSettings settings, int workers = 1) =>
        new SmoothStage().Run(take, StageContext.Uniform(take, new StageSettings { Smooth = settings }, workers));

    public static Take Smooth(this Quat[] samples, SmoothSettings settings) => Some.Take(Rate, Some.Track("joint", samples)).Smooth(settings);

    public static Quat[] Smooth(this Quat[] samples, SmoothMethod method) =>
        [.. samples.Smooth(new SmoothSettings { Method = method }).Tracks[0].Samples];

    /// <summary>Degrees between two series, sample by sample.</summary>
    public static double[] Apart(IEnumerable<Quat> a, IEnumerable<Quat> b) => [.. a.Zip(b, (p, q) => Angle.ToDegrees(Angle.Between(p, q)))];

    public static double Rms(IEnumerable<double> values) => Math.Sqrt(values.Average(v => v * v));

    public static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
