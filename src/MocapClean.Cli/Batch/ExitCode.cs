namespace MocapClean.Cli.Batch;

/// <summary>What the process ends with; the one place that decides it.</summary>
public static class ExitCode
{
    /// <summary>Every take was processed.</summary>
    public const int Done = 0;

    /// <summary>At least one take could not be processed.</summary>
    public const int TakesFailed = 1;

    /// <summary>Bad usage or config: nothing was written.</summary>
    public const int Usage = 2;

    /// <summary>With <c>--strict</c>: at least one verdict is re-shoot.</summary>
    public const int Strict = 3;

    /// <summary>Interrupted from the keyboard.</summary>
    public const int Interrupted = 130;

    /// <summary>Asked to end.</summary>
    public const int Terminated = 143;

    /// <summary>The code of a run.</summary>
    public static int Of(bool anyFailed, bool anyReshoot, bool strict, int? signal) =>
        signal ?? (anyFailed ? TakesFailed : strict && anyReshoot ? Strict : Done);
}
