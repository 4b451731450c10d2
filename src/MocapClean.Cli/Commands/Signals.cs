using System.Runtime.InteropServices;
using MocapClean.Cli.Batch;

namespace MocapClean.Cli.Commands;

/// <summary>
/// The first interrupt or request to end lets takes in progress finish and begins no new one; the second ends the process at once, which
/// is safe since files are whole or absent.
/// </summary>
public sealed class Signals : IDisposable
{
    private readonly CancellationTokenSource stop = new();
    private readonly PosixSignalRegistration interrupt;
    private readonly PosixSignalRegistration terminate;
    private int code;

    /// <summary>Begins to listen.</summary>
    public Signals()
    {
        interrupt = PosixSignalRegistration.Create(PosixSignal.SIGINT, c => Take(c, ExitCode.Interrupted));
        terminate = PosixSignalRegistration.Create(PosixSignal.SIGTERM, c => Take(c, ExitCode.Terminated));
    }

    /// <summary>Set by the first signal.</summary>
    public CancellationToken Stop => stop.Token;

    /// <summary>The exit code that the signal asks for; null where there was none.</summary>
    public int? Code => code == 0 ? null : code;

    /// <inheritdoc/>
    public void Dispose()
    {
        interrupt.Dispose();
        terminate.Dispose();
        stop.Dispose();
    }

    private void Take(PosixSignalContext context, int asked)
    {
        if (Interlocked.CompareExchange(ref code, asked, 0) != 0)
        {
            return;
        }

        context.Cancel = true;
        stop.Cancel();
    }
}
