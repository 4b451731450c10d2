using System.Collections.Immutable;

namespace MocapClean.Core.Orientation;

/// <summary>
/// The axes that three angles turn about, the outermost first: ZYX is R = Z(a) Y(b) X(c) on column vectors, as in a file that lists the
/// channels Zrotation, Yrotation, Xrotation. Six orders of three axes, six that repeat the first.
/// </summary>
public enum EulerOrder
{
    /// <summary>X, then Y, then Z.</summary>
    XYZ,

    /// <summary>X, then Z, then Y.</summary>
    XZY,

    /// <summary>Y, then X, then Z.</summary>
    YXZ,

    /// <summary>Y, then Z, then X.</summary>
    YZX,

    /// <summary>Z, then X, then Y.</summary>
    ZXY,

    /// <summary>Z, then Y, then X.</summary>
    ZYX,

    /// <summary>X, then Y, then X again.</summary>
    XYX,

    /// <summary>X, then Z, then X again.</summary>
    XZX,

    /// <summary>Y, then X, then Y again.</summary>
    YXY,

    /// <summary>Y, then Z, then Y again.</summary>
    YZY,

    /// <summary>Z, then X, then Z again.</summary>
    ZXZ,

    /// <summary>Z, then Y, then Z again.</summary>
    ZYZ,
}

/// <summary>What follows from an order of axes.</summary>
public static class EulerOrders
{
    private static readonly ImmutableArray<(int First, int Second, int Third)> AxisTable =
        [.. Enum.GetNames<EulerOrder>().Select(name => (name[0] - 'X', name[1] - 'X', name[2] - 'X'))];

    /// <summary>All twelve.</summary>
    public static ImmutableArray<EulerOrder> All { get; } = [.. Enum.GetValues<EulerOrder>()];

    /// <summary>The three axes, outermost first: 0 for x, 1 for y, 2 for z.</summary>
    public static (int First, int Second, int Third) Axes(this EulerOrder order) => AxisTable[(int)order];

    /// <summary>The third axis is the first again, so the middle angle runs from 0 to 180 degrees and not from -90 to 90.</summary>
    public static bool RepeatsFirst(this EulerOrder order) => order >= EulerOrder.XYX;

    /// <summary>The order spelled by three letters, such as ZYX; false where there is none.</summary>
    public static bool TryParse(string letters, out EulerOrder order) =>
        Enum.TryParse(letters, ignoreCase: true, out order) && letters.Length == 3 && char.IsAsciiLetter(letters[0]);
}
