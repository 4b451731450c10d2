using System.Collections.Immutable;

namespace MocapClean.Cli.Batch;

/// <summary>What the command line asks of a run, beyond the config.</summary>
public sealed record RunOptions
{
    /// <summary>Output folder; null for the config's.</summary>
    public string? Out { get; init; }

    /// <summary>Takes at the same time.</summary>
    public int Workers { get; init; } = 1;

    /// <summary>Globs on take names; empty for all.</summary>
    public ImmutableArray<string> Only { get; init; } = [];

    /// <summary>Do again what is done.</summary>
    public bool Fresh { get; init; }

    /// <summary>Keep watching for new takes until interrupted.</summary>
    public bool Follow { get; init; }

    /// <summary>Write nothing.</summary>
    public bool DryRun { get; init; }

    /// <summary>A re-shoot verdict makes the exit code 3.</summary>
    public bool Strict { get; init; }

    /// <summary>No line for each take, no progress.</summary>
    public bool Quiet { get; init; }
}
