using System.Buffers;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Reduce;

/// <summary>
/// The samples that one search works on: an unbroken run, or the part of it between two pinned frames. Each component has an array of its
/// own, so that four frames fill a vector; the arrays are padded with copies of the last frame, so that a vector may start at any frame.
/// </summary>
internal sealed class Stretch : IDisposable
{
    /// <summary>Frames behind the last that may be read.</summary>
    public const int Padding = 4;

    private readonly double[] numbers;
    private readonly int stride;

    /// <summary>Copies samples and times.</summary>
    /// <param name="samples">Unit quaternions, all present, at least one.</param>
    /// <param name="times">Their times in seconds, rising.</param>
    public Stretch(ReadOnlySpan<Quat> samples, ReadOnlySpan<double> times)
    {
        Count = samples.Length;
        stride = Count + Padding;
        numbers = ArrayPool<double>.Shared.Rent(5 * stride);
        Span<double> w = Row(0), x = Row(1), y = Row(2), z = Row(3), time = Row(4);
        for (var n = 0; n < w.Length; n++)
        {
            var from = Math.Min(n, samples.Length - 1);
            var q = samples[from];
            w[n] = q.W;
            x[n] = q.X;
            y[n] = q.Y;
            z[n] = q.Z;
            // Relative to the first frame: a take that starts at ten o'clock loses no digits.
            time[n] = times[from] - times[0];
        }
    }

    /// <summary>Number of frames.</summary>
    public int Count { get; }

    /// <summary>Seconds since the first frame.</summary>
    public ReadOnlySpan<double> Time => Row(4);

    /// <summary>The orientation at a frame.</summary>
    public Quat this[int n] => new(numbers[n], numbers[n + stride], numbers[n + (2 * stride)], numbers[n + (3 * stride)]);

    /// <summary>The orientations at a frame of the stretch and the three after it.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public FourQuats Four(int n) => new(Load(n), Load(n + stride), Load(n + (2 * stride)), Load(n + (3 * stride)));

    /// <summary>The orientations at any four frames.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public FourQuats Four(int a, int b, int c, int d) =>
        new(Gather(0, a, b, c, d), Gather(1, a, b, c, d), Gather(2, a, b, c, d), Gather(3, a, b, c, d));

    /// <summary>Seconds since the first frame, at a frame and the three after it.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Vector256<double> Times(int n) => Load(n + (4 * stride));

    /// <summary>Seconds since the first frame, at any four frames.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public Vector256<double> Times(int a, int b, int c, int d) => Gather(4, a, b, c, d);

    /// <inheritdoc/>
    public void Dispose() => ArrayPool<double>.Shared.Return(numbers);

    private Span<double> Row(int row) => numbers.AsSpan(row * stride, stride);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Vector256<double> Load(int at) => Vector256.LoadUnsafe(ref MemoryMarshal.GetArrayDataReference(numbers), (nuint)at);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Vector256<double> Gather(int row, int a, int b, int c, int d)
    {
        ref var start = ref Unsafe.Add(ref MemoryMarshal.GetArrayDataReference(numbers), row * stride);
        return Vector256.Create(Unsafe.Add(ref start, a), Unsafe.Add(ref start, b), Unsafe.Add(ref start, c), Unsafe.Add(ref start, d));
    }
}
