using System.Collections.Concurrent;
using System.Diagnostics;

namespace MocapClean.Cli.Batch;

/// <summary>Seconds spent in each part of the flow, summed over workers.</summary>
public sealed class StageTimes
{
    private readonly ConcurrentDictionary<string, long> ticks = new(StringComparer.Ordinal);

    /// <summary>Runs a part and adds its time.</summary>
    public T Measure<T>(string part, Func<T> work)
    {
        var start = Stopwatch.GetTimestamp();
        try
        {
            return work();
        }
        finally
        {
            var spent = Stopwatch.GetTimestamp() - start;
            ticks.AddOrUpdate(part, spent, (_, before) => before + spent);
        }
    }

    /// <summary>Seconds by part, the longest first.</summary>
    public IReadOnlyList<(string Part, double Seconds)> Seconds() =>
        [.. ticks.Select(t => (t.Key, t.Value / (double)Stopwatch.Frequency)).OrderByDescending(t => t.Item2)];
}
