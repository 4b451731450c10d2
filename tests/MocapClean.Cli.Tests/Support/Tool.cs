using System.Diagnostics;

namespace MocapClean.Cli.Tests.Support;

/// <summary>The program as a process of its own.</summary>
internal static class Tool
{
    private const int PatienceMilliseconds = 120_000;

    public static ToolResult Run(params string[] args) => Run([], args);

    /// <summary>Runs to the end with some environment variables set.</summary>
    public static ToolResult Run(Dictionary<string, string> environment, params string[] args)
    {
        using var process = Start(environment, args);
        var error = process.StandardError.ReadToEndAsync();
        var output = process.StandardOutput.ReadToEnd();
        if (!process.WaitForExit(PatienceMilliseconds))
        {
            process.Kill();
            throw new TimeoutException($"mocapclean {string.Join(' ', args)} does not end");
        }

        return new ToolResult(process.ExitCode, output, error.Result);
    }

    /// <summary>Starts and returns the process.</summary>
    public static System.Diagnostics.Process Start(Dictionary<string, string> environment, params string[] args)
    {
        var start = new ProcessStartInfo("dotnet", [Path.Combine(AppContext.BaseDirectory, "mocapclean.dll"), .. args])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        foreach (var (key, value) in environment)
        {
            start.Environment[key] = value;
        }

        return System.Diagnostics.Process.Start(start)!;
    }
}

/// <summary>What a process ended with.</summary>
internal sealed record ToolResult(int Code, string Output, string Error)
{
    public string[] ErrorLines => Error.Split('\n', StringSplitOptions.RemoveEmptyEntries);
}
