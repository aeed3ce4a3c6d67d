using System.Runtime.InteropServices;

namespace FtEstimate.Cli;

/// <summary>
/// Turns Ctrl-C and the SIGTERM by which batch systems announce the end of the time into a request to stop; a second signal ends the program at once.
/// </summary>
internal sealed class Interruption : IDisposable
{
    private readonly CancellationTokenSource _source;
    private readonly PosixSignalRegistration _interrupt;
    private readonly PosixSignalRegistration _terminate;

    /// <summary>Listens until it is disposed of.</summary>
    public Interruption(CancellationToken cancel)
    {
        _source = CancellationTokenSource.CreateLinkedTokenSource(cancel);
        _interrupt = PosixSignalRegistration.Create(PosixSignal.SIGINT, Stop);
        _terminate = PosixSignalRegistration.Create(PosixSignal.SIGTERM, Stop);
    }

    /// <summary>Set once a signal came.</summary>
    public CancellationToken Token => _source.Token;

    /// <inheritdoc/>
    public void Dispose()
    {
        _interrupt.Dispose();
        _terminate.Dispose();
        _source.Dispose();
    }

    private void Stop(PosixSignalContext context)
    {
        if (!_source.IsCancellationRequested)
        {
            context.Cancel = true;
            _source.Cancel();
        }
    }
}
