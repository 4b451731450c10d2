using BenchmarkDotNet.Attributes;
using MocapClean.Core.Orientation;

namespace MocapClean.Benchmarks;

/// <summary>The smallest kernels: what one product, one logarithm, one step costs.</summary>
public class OrientationBenchmarks
{
    private readonly Quat[] samples = InventedTake.Samples(1, 0.05, still: false);
    private readonly Quat[] products = new Quat[InventedTake.Frames];

    /// <summary>Hamilton product with a fixed rotation.</summary>
    [Benchmark(OperationsPerInvoke = InventedTake.Frames)]
    public Quat[] Product()
    {
        var turn = samples[0];
        for (var n = 0; n < samples.Length; n++)
        {
            products[n] = turn * samples[n];
        }

        return products;
    }

    /// <summary>Angle from each sample to the next.</summary>
    [Benchmark(OperationsPerInvoke = InventedTake.Frames)]
    public double StepAngles()
    {
        var sum = 0.0;
        for (var n = 1; n < samples.Length; n++)
        {
            sum += Angle.Between(samples[n - 1], samples[n]);
        }

        return sum;
    }

    /// <summary>Rotation vector from each sample to the next.</summary>
    [Benchmark(OperationsPerInvoke = InventedTake.Frames)]
    public Vec3 StepVectors()
    {
        var sum = Vec3.Zero;
        for (var n = 1; n < samples.Length; n++)
        {
            sum += RotationVector.From(samples[n - 1], samples[n]);
        }

        return sum;
    }
}
