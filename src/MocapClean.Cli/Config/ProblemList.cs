namespace MocapClean.Cli.Config;

/// <summary>Gathers what is wrong with one file, so that all of it is told at once.</summary>
/// <param name="file">The file, as the user named it.</param>
internal sealed class ProblemList(string file)
{
    /// <summary>A file that is no config may be quoted whole otherwise.</summary>
    private const int LongestMessage = 300;

    private readonly List<ConfigProblem> problems = [];

    /// <summary>The file, as the user named it.</summary>
    public string File => file;

    /// <summary>Adds one.</summary>
    public void Add(TextPlace at, string message) =>
        problems.Add(new(file, at, message.Length <= LongestMessage ? message : message[..LongestMessage] + " ..."));

    /// <summary>Ends here when anything was wrong.</summary>
    /// <exception cref="ConfigException">Something was.</exception>
    public void ThrowIfAny()
    {
        if (problems.Count > 0)
        {
            throw new ConfigException([.. problems.OrderBy(p => p.At.Line).ThenBy(p => p.At.Column)]);
        }
    }
}
