using System.Collections.Immutable;

namespace MocapClean.Cli.Config;

/// <summary>The run cannot start: every problem found, one a line, in order of place.</summary>
public sealed class ConfigException : Exception
{
    /// <summary>For several problems.</summary>
    public ConfigException(ImmutableArray<ConfigProblem> problems)
        : base(string.Join('\n', problems)) => Problems = problems;

    /// <summary>For one problem that lies in no file.</summary>
    public ConfigException(string message)
        : this([new ConfigProblem("", TextPlace.Whole, message)])
    {
    }

    /// <summary>What is wrong.</summary>
    public ImmutableArray<ConfigProblem> Problems { get; }
}
