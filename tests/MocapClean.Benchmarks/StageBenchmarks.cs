using BenchmarkDotNet.Attributes;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Ingest;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Stages.Smooth;
using MocapClean.Core.Stages.Unwrap;
using MocapClean.Core.Takes;

namespace MocapClean.Benchmarks;

/// <summary>Whole stages on one thread.</summary>
public class StageBenchmarks
{
    private const int Joints = 10;
    private const int Samples = Joints * InventedTake.Frames;

    private readonly Take take = InventedTake.Of(Joints, 0.05);

    [Benchmark(OperationsPerInvoke = Samples)]
    public Take Ingest() => Run(new IngestStage(), new());

    [Benchmark(OperationsPerInvoke = Samples)]
    public Take Unwrap() => Run(new UnwrapStage(), new());

    [Benchmark(OperationsPerInvoke = Samples)]
    public Take Outliers() => Run(new OutliersStage(), new());

    [Benchmark(OperationsPerInvoke = Samples)]
    [Arguments(SmoothMethod.Butterworth)]
    [Arguments(SmoothMethod.SavitzkyGolay)]
    [Arguments(SmoothMethod.Whittaker)]
    [Arguments(SmoothMethod.Adaptive)]
    public Take Smooth(SmoothMethod method) => Run(new SmoothStage(), new() { Smooth = new() { Method = method } });

    private Take Run(IStage stage, StageSettings settings) => stage.Run(take, StageContext.Uniform(take, settings));
}
