using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>
/// Numbers that are the same for a seed on every machine and runtime. The generator is SplitMix64 (Steele, Lea and Flood 2014).
/// </summary>
internal sealed class SeededNumbers(ulong seed)
{
    private ulong state = seed;

    /// <summary>A number in [low, high).</summary>
    public double Uniform(double low, double high) => low + ((high - low) * ((Next() >> 11) * (1.0 / (1UL << 53))));

    /// <summary>A whole number from low to high, both included.</summary>
    public int Whole(int low, int high) => low + (int)(Next() % (ulong)(high - low + 1));

    /// <summary>A number of the normal distribution with mean 0 and variance 1, by Box and Muller 1958.</summary>
    public double Normal() => Math.Sqrt(-2 * Math.Log(1 - Uniform(0, 1))) * Math.Cos(2 * Math.PI * Uniform(0, 1));

    /// <summary>One of a list.</summary>
    public T Pick<T>(IReadOnlyList<T> items) => items[Whole(0, items.Count - 1)];

    /// <summary>A unit vector, every direction alike.</summary>
    public Vec3 Direction()
    {
        Vec3 v;
        do
        {
            v = new Vec3(Normal(), Normal(), Normal());
        }
        while (v.Norm < 1e-6);
        return (1 / v.Norm) * v;
    }

    private ulong Next()
    {
        state += 0x9E3779B97F4A7C15;
        var z = state;
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return z ^ (z >> 31);
    }
}
