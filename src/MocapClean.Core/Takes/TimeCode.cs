namespace MocapClean.Core.Takes;

/// <summary>An SMPTE ST 12-1 address: the number of a frame since midnight, written as hours, minutes, seconds and frames.</summary>
public sealed record TimeCode
{
    private const string Form = "an address is two digits each of hours, minutes, seconds and frames";

    /// <summary>The address of a frame counted from midnight; whole days fall away.</summary>
    public TimeCode(TimeCodeRate rate, long frame)
    {
        ArgumentNullException.ThrowIfNull(rate);
        Rate = rate;
        var rest = frame % rate.FramesADay;
        Frame = rest < 0 ? rest + rate.FramesADay : rest;
    }

    /// <summary>How frames are counted.</summary>
    public TimeCodeRate Rate { get; }

    /// <summary>Frames since midnight.</summary>
    public long Frame { get; }

    /// <summary>The four numbers of the address.</summary>
    public (int Hours, int Minutes, int Seconds, int Frames) Parts
    {
        get
        {
            // As a count that leaves no number out.
            var (tens, rest) = Math.DivRem(Frame, Rate.FramesInTenMinutes);
            var shortMinutes = rest < Rate.Dropped ? 0 : (rest - Rate.Dropped) / Rate.FramesInShortMinute;
            var number = Frame + (Rate.Dropped * ((9 * tens) + shortMinutes));
            var (seconds, frames) = Math.DivRem(number, Rate.Nominal);
            return ((int)(seconds / 3600), (int)(seconds / 60 % 60), (int)(seconds % 60), (int)frames);
        }
    }

    /// <summary>Reads "01:02:03:04", drop-frame addresses with a semicolon before the frames; anything else is refused.</summary>
    /// <exception cref="FormatException">Not an address at this rate; the message says why.</exception>
    public static TimeCode Parse(string text, TimeCodeRate rate) =>
        TryParse(text, rate, out var problem) ?? throw new FormatException(problem);

    /// <summary>Reads an address; null where it is none, and then what is wrong with it.</summary>
    public static TimeCode? TryParse(string text, TimeCodeRate rate, out string problem)
    {
        ArgumentNullException.ThrowIfNull(text);
        ArgumentNullException.ThrowIfNull(rate);
        problem = Problem(text, rate);
        if (problem.Length > 0)
        {
            return null;
        }

        var (hours, minutes, seconds, frames) = (Two(text, 0), Two(text, 3), Two(text, 6), Two(text, 9));
        var all = (60L * hours) + minutes;
        var number = (((60 * all) + seconds) * rate.Nominal) + frames;
        return new TimeCode(rate, number - (rate.Dropped * (all - (all / 10))));
    }

    /// <summary>The address so many frames of time code later, or earlier; midnight is passed in either direction.</summary>
    public TimeCode Plus(long frames) => new(Rate, Frame + (frames % Rate.FramesADay));

    /// <summary>
    /// The address that runs when so many frames have been captured since this one began: in exact fractions, rounded down, since the
    /// doubles' product falls short of whole numbers.
    /// </summary>
    public TimeCode After(long captured, FrameRate capture)
    {
        var top = (Int128)captured * capture.Denominator * Rate.Rate.Numerator;
        var bottom = (Int128)capture.Numerator * Rate.Rate.Denominator;
        var (whole, rest) = Int128.DivRem(top, bottom);
        return Plus((long)((rest < 0 ? whole - 1 : whole) % Rate.FramesADay));
    }

    /// <summary>The address that runs so many seconds after this one began, rounded down; the seconds count as the decimal they print as.</summary>
    public TimeCode After(double seconds)
    {
        var frames = Math.Floor((decimal)seconds * Rate.Rate.Numerator / Rate.Rate.Denominator);
        return Plus((long)(frames % Rate.FramesADay));
    }

    /// <summary>The address as text.</summary>
    public override string ToString()
    {
        var (hours, minutes, seconds, frames) = Parts;
        return $"{hours:00}:{minutes:00}:{seconds:00}{Mark(Rate)}{frames:00}";
    }

    private static char Mark(TimeCodeRate rate) => rate.DropFrame ? ';' : ':';

    private static string Problem(string text, TimeCodeRate rate)
    {
        if (text.Length != 11 || !IsTwo(text, 0) || !IsTwo(text, 3) || !IsTwo(text, 6) || !IsTwo(text, 9) || text[2] != ':' || text[5] != ':')
        {
            return $"'{text}' is no time code: {Form}, as 01:00:00{Mark(rate)}00";
        }

        if (text[8] != Mark(rate))
        {
            return text[8] is ':' or ';'
                ? $"'{text}' is {(rate.DropFrame ? "not " : "")}a drop-frame address, but the rate is {rate.Name}"
                : $"'{text}' is no time code: {Form}, as 01:00:00{Mark(rate)}00";
        }

        if (Two(text, 0) > 23 || Two(text, 3) > 59 || Two(text, 6) > 59 || Two(text, 9) >= rate.Nominal)
        {
            return $"'{text}' is out of range: the last address of a day is 23:59:59{Mark(rate)}{rate.Nominal - 1}";
        }

        var isLeftOut = Two(text, 6) == 0 && Two(text, 9) < rate.Dropped && Two(text, 3) % 10 != 0;
        return isLeftOut ? $"'{text}' does not exist: drop-frame leaves it out" : "";
    }

    private static bool IsTwo(string text, int at) => char.IsAsciiDigit(text[at]) && char.IsAsciiDigit(text[at + 1]);

    private static int Two(string text, int at) => (10 * (text[at] - '0')) + text[at + 1] - '0';
}
