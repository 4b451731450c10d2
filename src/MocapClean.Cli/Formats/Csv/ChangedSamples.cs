using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// Tells which samples of a row must be written anew: those that differ in a bit from the delivered ones, and those whose length was put
/// right. One that is missing now has its delivered text, for it was missing before.
/// </summary>
/// <param name="cleaned">The take after the stages.</param>
/// <param name="joints">Number of joints in a row.</param>
internal sealed class ChangedSamples(Take cleaned, int joints)
{
    private readonly bool[] changed = new bool[joints];
    private readonly Quat[] samples = new Quat[joints];

    /// <summary>The components of the row's changed samples, four for each joint.</summary>
    public ReadOnlySpan<double> Components => MemoryMarshal.Cast<Quat, double>(samples);

    /// <summary>Whether a joint of the row has changed.</summary>
    public bool this[int joint] => changed[joint];

    /// <summary>Compares the samples of a row.</summary>
    /// <param name="first">The take's joint that is the row's first.</param>
    /// <param name="frame">Frame of the row.</param>
    /// <returns>Whether any has changed.</returns>
    /// <exception cref="ArgumentException">A delivered sample was deleted.</exception>
    public bool Find(int first, int frame)
    {
        var any = false;
        for (var joint = 0; joint < joints; joint++)
        {
            var track = cleaned.Tracks[first + joint];
            samples[joint] = track.Samples[frame];
            changed[joint] = Stands(track, frame, in samples[joint]);
            any |= changed[joint];
        }

        return any;
    }

    private static bool Stands(JointTrack track, int frame, in Quat now)
    {
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
    private static bool Same(double a, double b) => BitConverter.DoubleToInt64Bits(a) == BitConverter.DoubleToInt64Bits(b);
}
