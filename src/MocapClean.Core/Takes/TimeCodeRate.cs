using System.Collections.Immutable;

namespace MocapClean.Core.Takes;

/// <summary>
/// How frames are counted in addresses. Source: SMPTE ST 12-1. The television rates run 1001/1000 slower than they count; drop-frame
/// makes up for it by leaving out the first two numbers of every minute (at 60: four) except the minutes 0, 10, 20, 30, 40 and 50.
/// </summary>
public sealed record TimeCodeRate
{
    private TimeCodeRate(string name, int nominal, bool isSlowed = false, bool dropFrame = false)
    {
        Name = name;
        Nominal = nominal;
        Rate = isSlowed ? new FrameRate(nominal * 1000L, 1001) : new FrameRate(nominal, 1);
        DropFrame = dropFrame;
    }

    /// <summary>The ten rates that have addresses.</summary>
    public static ImmutableArray<TimeCodeRate> All { get; } =
    [
        new("23.976", 24, isSlowed: true), new("24", 24), new("25", 25),
        new("29.97", 30, isSlowed: true), new("29.97 DF", 30, isSlowed: true, dropFrame: true), new("30", 30),
        new("50", 50), new("59.94", 60, isSlowed: true), new("59.94 DF", 60, isSlowed: true, dropFrame: true), new("60", 60),
    ];

    /// <summary>As people write it: "23.976", "25", "29.97 DF".</summary>
    public string Name { get; }

    /// <summary>Frame numbers in a second of an address.</summary>
    public int Nominal { get; }

    /// <summary>Frames in a second of real time.</summary>
    public FrameRate Rate { get; }

    /// <summary>Addresses leave numbers out to keep to the clock on the wall.</summary>
    public bool DropFrame { get; }

    /// <summary>Frames from an address to the same address next day.</summary>
    public long FramesADay => 144 * FramesInTenMinutes;

    /// <summary>Numbers left out at the start of a minute.</summary>
    internal int Dropped => DropFrame ? Nominal / 15 : 0;

    /// <summary>Frames in a minute that leaves numbers out.</summary>
    internal long FramesInShortMinute => (60 * Nominal) - Dropped;

    /// <summary>Frames in ten minutes, one of them whole.</summary>
    internal long FramesInTenMinutes => (600 * Nominal) - (9 * Dropped);

    /// <summary>The rate that a number of hertz means (23.98 is 23.976), with or without drop-frame; null where there is none.</summary>
    public static TimeCodeRate? Find(double hertz, bool dropFrame)
    {
        var found = All.Where(r => r.DropFrame == dropFrame && Math.Abs((r.Rate.Hertz / hertz) - 1) < 2e-4);
        return found.FirstOrDefault();
    }
}
