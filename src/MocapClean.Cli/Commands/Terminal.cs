using Serilog;
using Serilog.Core;
using Serilog.Events;
using Serilog.Formatting.Compact;
using Serilog.Formatting.Display;
using Serilog.Sinks.SystemConsole.Themes;
using Spectre.Console;

namespace MocapClean.Cli.Commands;

/// <summary>
/// What goes where: results to standard output; progress and log to standard error. A moving bar and colour only on a terminal that is not
/// a CI machine; <c>NO_COLOR</c> is respected.
/// </summary>
public sealed class Terminal
{
    private readonly Lock gate = new();

    /// <summary>Looks at the process's streams once.</summary>
    public Terminal()
    {
        Progress = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(Console.Error) });
        IsLive = !Console.IsErrorRedirected && Progress.Profile.Capabilities.Ansi
            && string.IsNullOrEmpty(Environment.GetEnvironmentVariable("CI"));
    }

    /// <summary>The console that progress is drawn on: standard error.</summary>
    public IAnsiConsole Progress { get; }

    /// <summary>A bar may be drawn.</summary>
    public bool IsLive { get; }

    /// <summary>Prints a result line. While a bar is on the same terminal, the line goes above it.</summary>
    public void Result(string line)
    {
        lock (gate)
        {
            if (IsLive && !Console.IsOutputRedirected)
            {
                Progress.WriteLine(line);
            }
            else
            {
                Console.Out.WriteLine(line);
            }
        }
    }

    /// <summary>Prints an error line.</summary>
    public static void Error(string line) => Console.Error.WriteLine(line);

    /// <summary>The log: to standard error, and to a file where one is given.</summary>
    public Logger CreateLogger(string? file, bool quiet)
    {
        // What is only information goes to the file: results tell the same on standard output.
        var level = quiet ? LogEventLevel.Error : LogEventLevel.Warning;
        var log = new LoggerConfiguration().MinimumLevel.Information();
        log = IsLive
            ? log.WriteTo.Sink(new LiveSink(Progress), level)
            : log.WriteTo.Console(level, "{Message:lj}{NewLine}", standardErrorFromLevel: LogEventLevel.Verbose, theme: ConsoleTheme.None);
        return file is null ? log.CreateLogger() : log.WriteTo.File(new CompactJsonFormatter(), file).CreateLogger();
    }

    /// <summary>Runs work under a bar that tells how many takes are left and how long they may last.</summary>
    public void WithProgress(int takes, bool quiet, Action<Action> work)
    {
        if (!IsLive || quiet)
        {
            work(() => { });
            return;
        }

        Progress.Progress().AutoClear(enabled: true)
            .Columns(new TaskDescriptionColumn(), new ProgressBarColumn(), new PercentageColumn(), new RemainingTimeColumn())
            .Start(context =>
            {
                var task = context.AddTask("takes", maxValue: Math.Max(1, takes));
                work(() => task.Increment(1));
            });
    }

    /// <summary>Log lines during a bar must go through the same console, or they tear it.</summary>
    private sealed class LiveSink(IAnsiConsole console) : ILogEventSink
    {
        private readonly MessageTemplateTextFormatter text = new("{Message:lj}");

        public void Emit(LogEvent logEvent)
        {
            using var line = new StringWriter();
            text.Format(logEvent, line);
            console.WriteLine(line.ToString());
        }
    }
}
