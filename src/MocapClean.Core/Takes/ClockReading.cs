namespace MocapClean.Core.Takes;

/// <summary>What a column of times says about the rate, within the rounding of its digits.</summary>
internal static class ClockReading
{
    /// <summary>A printed frame time this near to a nominal one means it: .033 is 30 frames a second, .007 is not 150.</summary>
    public const double NearNominal = 0.025;

    // Times that count up a rounded frame time drift from the nominal clock; only a small drift is taken for that.
    private const double NearNominalByCounting = 0.005;

    // No recording device knows its times better than this, and sums of doubles are worse than it in long takes.
    private const double Finest = 1e-9;

    public static Clock Read(ReadOnlySpan<double> times, double rounding)
    {
        Check(times, rounding);
        if (times.Length == 1)
        {
            return new Clock { Delivered = [times[0]], Steady = [times[0]], Rate = 1, Rounding = rounding, IsRegular = true };
        }

        // Seconds since 1970 have digits too few for the finest; one wild time at either end says nothing about them.
        var coarseness = Math.Min(Math.Abs(times[0]), Math.Abs(times[^1]));
        var slack = Math.Max(Math.Max(rounding, Finest), Math.BitIncrement(coarseness) - coarseness);
        var spacing = Spacing.Measure(times, slack);
        var exact = Meant(spacing.Mean, 2 * slack * spacing.Runs / spacing.Count, NearNominal);
        var fitted = exact?.Interval ?? spacing.Mean;
        if (exact is null && spacing.IsConstant)
        {
            exact = Meant(spacing.Mean, slack, NearNominalByCounting) ?? Printed(spacing.Mean, rounding);
        }

        var grid = new SteadyTimes(fitted, exact, slack);
        return new Clock
        {
            Delivered = [.. times],
            Steady = grid.Place(times),
            Rate = exact?.Hertz ?? (1 / spacing.Mean),
            ExactRate = exact,
            Rounding = rounding,
            IsRegular = IsRegular(times, exact?.Interval ?? spacing.Mean, 2 * slack),
        };
    }

    /// <summary>The nominal rate that an interval means: the nearest one, if no further than allowed and near in proportion.</summary>
    public static FrameRate? Meant(double interval, double allowed, double near)
    {
        var rate = FrameRate.NearestNominal(interval);
        var off = Math.Abs(rate.Interval - interval);
        return off <= (allowed * (1 + 1e-6)) + (1e-15 * interval) && off <= near * interval ? rate : null;
    }

    /// <summary>The rate of an interval printed as an exact decimal: .0035 s is 2000/7 frames a second. Null where it was not printed.</summary>
    public static FrameRate? Printed(double interval, double rounding)
    {
        var digits = Math.Round(-Math.Log10(2 * rounding));
        if (!(rounding > 0 && digits is >= 0 and <= 12))
        {
            return null;
        }

        var perSecond = (long)Math.Round(Math.Pow(10, digits));
        var units = Math.Round(interval * perSecond);
        return units is > 0 and < 1e15 && Math.Abs((interval * perSecond) - units) < 1e-3 ? new(perSecond, (long)units) : null;
    }

    /// <summary>The step from one time to the next is nil or back, and more so than rounding explains.</summary>
    public static bool Stalls(double step, double interval, double rounding) => step <= 0 && step < interval - (2 * rounding);

    private static bool IsRegular(ReadOnlySpan<double> times, double interval, double allowed)
    {
        for (var n = 1; n < times.Length; n++)
        {
            if (!(Math.Abs(times[n] - times[n - 1] - interval) <= allowed * (1 + 1e-6)))
            {
                return false;
            }
        }

        return true;
    }

    private static void Check(ReadOnlySpan<double> times, double rounding)
    {
        if (times.IsEmpty)
        {
            throw new ArgumentException("no usable time: there is no frame", nameof(times));
        }

        if (!(rounding >= 0 && double.IsFinite(rounding)))
        {
            throw new ArgumentOutOfRangeException(nameof(rounding), rounding, "Rounding is a number of seconds from 0 up");
        }

        for (var n = 0; n < times.Length; n++)
        {
            if (!double.IsFinite(times[n]))
            {
                throw new ArgumentException($"no usable time: frame {n} is at {times[n]} s", nameof(times));
            }
        }
    }

    /// <summary>The spacings that are about one interval long.</summary>
    private readonly record struct Spacing(double Mean, int Count, int Runs, bool IsConstant)
    {
        public static Spacing Measure(ReadOnlySpan<double> times, double slack)
        {
            var median = Median(times);
            if (!(median > 0 && double.IsFinite(median)))
            {
                throw new ArgumentException($"no usable time: the median spacing is {median} s", nameof(times));
            }

            // Within a run the mean is the way from end to end, so rounding counts once a run, not once a frame.
            var (low, high) = ((0.5 * median) - (2 * slack), (1.5 * median) + (2 * slack));
            var (sum, count, runs, inside) = (0.0, 0, 0, false);
            var (least, most) = (double.PositiveInfinity, double.NegativeInfinity);
            for (var n = 1; n < times.Length; n++)
            {
                var step = times[n] - times[n - 1];
                var isOne = step >= low && step <= high;
                runs += isOne && !inside ? 1 : 0;
                inside = isOne;
                if (isOne)
                {
                    (sum, count) = (sum + step, count + 1);
                    (least, most) = (Math.Min(least, step), Math.Max(most, step));
                }
            }

            return new Spacing(sum / count, count, runs, most - least <= slack / 20);
        }

        private static double Median(ReadOnlySpan<double> times)
        {
            var steps = new double[times.Length - 1];
            for (var n = 0; n < steps.Length; n++)
            {
                steps[n] = times[n + 1] - times[n];
            }

            Array.Sort(steps);
            return steps[steps.Length / 2];
        }
    }
}
