using System.Diagnostics;
using FtEstimate.Quantities;
using FtEstimate.Simulation.RareEvents;

namespace FtEstimate.Cli;

/// <summary>Tells on a terminal how many levels are done and how long the rest will take.</summary>
/// <param name="error">Standard error.</param>
internal sealed class RareProgress(TextWriter error) : IProgress<LadderProgress>
{
    private readonly bool _isTerminal = ReferenceEquals(error, Console.Error) && !Console.IsErrorRedirected;
    private readonly Stopwatch _sinceStart = Stopwatch.StartNew();
    private readonly Lock _gate = new();

    /// <inheritdoc/>
    public void Report(LadderProgress value)
    {
        if (!_isTerminal)
        {
            return;
        }

        lock (_gate)
        {
            double secondsLeft = _sinceStart.Elapsed.TotalSeconds * (value.Total - value.Done) / value.Done;
            error.Write(value.Done < value.Total
                ? $"\rlevel {value.Done} of {value.Total}, about {Show.Duration(secondsLeft)} left    "
                : "\r                                                  \r");
        }
    }
}
