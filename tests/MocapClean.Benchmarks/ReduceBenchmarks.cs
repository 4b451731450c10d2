using BenchmarkDotNet.Attributes;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Reduce;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Takes;

namespace MocapClean.Benchmarks;

/// <summary>The exact search for the fewest keys, with the replay that measures them.</summary>
public class ReduceBenchmarks
{
    private const int Joints = 4;
    private const int Samples = Joints * InventedTake.Frames;

    private readonly Take smooth = Smoothed(InventedTake.Of(Joints, 0.05));
    private readonly Take still = InventedTake.Of(Joints, 0.3, still: true);

    /// <summary>Smoothed motion.</summary>
    [Benchmark(OperationsPerInvoke = Samples)]
    [Arguments(Playback.Slerp, 0.25)]
    [Arguments(Playback.Slerp, 0.5)]
    [Arguments(Playback.Slerp, 2)]
    [Arguments(Playback.ComponentLinear, 0.5)]
    public Take Motion(Playback playback, double degrees) => Keys(smooth, playback, degrees);

    /// <summary>The hard case: a still joint whose noise comes near the tolerance.</summary>
    [Benchmark(OperationsPerInvoke = Samples)]
    public Take NoiseNearTheTolerance() => Keys(still, Playback.Slerp, 1);

    private static Take Keys(Take take, Playback playback, double degrees)
    {
        var settings = new StageSettings { Reduce = new() { Playback = playback, Tolerance = Angle.FromDegrees(degrees) } };
        return new ReduceStage().Run(take, StageContext.Uniform(take, settings));
    }

    private static Take Smoothed(Take take) => new SmoothStage().Run(take, StageContext.Uniform(take, new()));
}
