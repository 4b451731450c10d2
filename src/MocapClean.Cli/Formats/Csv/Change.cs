using System.Runtime.CompilerServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Tells which samples must be written anew.</summary>
internal static class Change
{
    /// <summary>
    /// The sample differs in a bit from the delivered one, or its length was put right. One that is missing now has its delivered text,
    /// for it was missing before.
    /// </summary>
    /// <exception cref="ArgumentException">A delivered sample was deleted.</exception>
    public static bool Stands(JointTrack track, int frame)
    {
        ref readonly var now = ref track.Samples.ItemRef(frame);
        ref readonly var before = ref track.Delivered.ItemRef(frame);
        if (Same(now.W, before.W) && Same(now.X, before.X) && Same(now.Y, before.Y) && Same(now.Z, before.Z))
        {
            return !track.Renormalised.IsEmpty && !IsMissing(now) && track.Renormalised.AsSpan().BinarySearch(frame) >= 0;
        }

        return !IsMissing(now) || (IsMissing(before) ? false : throw new ArgumentException(
            $"Joint '{track.Name}' lost its delivered sample at frame {frame}", nameof(track)));
    }

    private static bool IsMissing(in Quat q) => double.IsNaN(q.W);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static bool Same(double a, double b) =>
        BitConverter.DoubleToInt64Bits(a) == BitConverter.DoubleToInt64Bits(b);
}
