using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Report;

/// <summary>Radians as the degrees that go into reports: a millionth of a degree is finer than any capture.</summary>
public static class ReportDegrees
{
    /// <summary>Rounded degrees, or null for NaN.</summary>
    public static double? Of(double radians) => double.IsNaN(radians) ? null : Math.Round(Angle.ToDegrees(radians), 6);

    /// <summary>Rounded degrees, or null.</summary>
    public static double? Of(double? radians) => radians is { } r ? Of(r) : null;
}
