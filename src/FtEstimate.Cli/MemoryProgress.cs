using System.Diagnostics;
using System.Globalization;
using FtEstimate.Quantities;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Cli;

/// <summary>Tells on standard error how far a simulation is and how long it will take.</summary>
internal sealed class MemoryProgress : IProgress<MemoryTally>, IDisposable
{
    private static readonly TimeSpan OnTerminal = TimeSpan.FromSeconds(1);
    private static readonly TimeSpan InLog = TimeSpan.FromSeconds(10);

    // earlier, most of the time went into getting started
    private static readonly TimeSpan Enough = TimeSpan.FromSeconds(2);

    private readonly TextWriter? _error;
    private readonly bool _isTerminal;
    private readonly Lock _gate = new();
    private readonly Stopwatch _sinceStart = new();
    private readonly Stopwatch _sinceLine = new();
    private MemoryCounts? _counts;
    private double[] _work = [];
    private double[] _workBefore = [];
    private bool _mayEndEarly;
    private int _index;
    private MemoryPlan? _plan;
    private int _shown;

    private MemoryProgress(TextWriter? error, bool isTerminal)
    {
        _error = error;
        _isTerminal = isTerminal;
    }

    /// <summary>Progress on standard error where that is a terminal or progress is asked for.</summary>
    public static MemoryProgress To(TextWriter error, bool isAskedFor)
    {
        bool isTerminal = ReferenceEquals(error, Console.Error) && !Console.IsErrorRedirected;
        return new MemoryProgress(isTerminal || isAskedFor ? error : null, isTerminal);
    }

    /// <summary>A run begins.</summary>
    /// <param name="counts">What is counted already.</param>
    /// <param name="mayEndEarly">Whether an accuracy may end experiments early.</param>
    public void Begin(MemoryCounts counts, bool mayEndEarly)
    {
        _counts = counts;
        _mayEndEarly = mayEndEarly;
        _work = [.. counts.Question.Settings.Select(setting => WorkOfBlock(setting) * counts.Question.PlanOf(setting, counts.Shard).BlocksOfShard)];
        _workBefore = [.. counts.Question.Settings.Select((setting, index) => WorkOfBlock(setting) * counts.Experiments[index].Tally.BlocksDone)];
        _sinceStart.Restart();
    }

    /// <summary>An experiment begins.</summary>
    public void BeginExperiment(int index, MemoryPlan plan, MemoryTally from)
    {
        _index = index;
        _plan = plan;
        _sinceLine.Reset();
        _workBefore[index] = WorkOfBlock(_counts!.Question.Settings[index]) * from.BlocksDone;
    }

    /// <inheritdoc/>
    public void Report(MemoryTally value)
    {
        if (_error is null)
        {
            return;
        }

        lock (_gate)
        {
            bool isFirst = !_sinceLine.IsRunning;
            if (isFirst || _sinceLine.Elapsed >= (_isTerminal ? OnTerminal : InLog))
            {
                _sinceLine.Restart();
                Write(LineOf(value));
            }
        }
    }

    /// <summary>Clears the line on a terminal: the report comes next.</summary>
    public void Dispose() => Write("");

    private string LineOf(MemoryTally tally)
    {
        MemorySetting setting = _counts!.Question.Settings[_index];
        long blocks = _plan!.BlocksOfShard;
        string basis = setting.Basis == PauliBasis.X ? "x" : "z";
        return string.Create(
            CultureInfo.InvariantCulture,
            $"distance {setting.Distance}, basis {basis}: {Whole(100.0 * tally.BlocksDone / blocks)} % of its shots, {tally.Count.Failures} failures; {TimeLeft(tally)}");
    }

    private string TimeLeft(MemoryTally tally)
    {
        double unit = WorkOfBlock(_counts!.Question.Settings[_index]);
        double done = (unit * tally.BlocksDone) - _workBefore[_index];
        double left = _work[_index] - (unit * tally.BlocksDone);
        for (int i = 0; i < _work.Length; i++)
        {
            done += i < _index ? _work[i] - _workBefore[i] : 0;
            left += i > _index ? _work[i] - _workBefore[i] : 0;
        }

        double seconds = left / done * _sinceStart.Elapsed.TotalSeconds;
        return done > 0 && double.IsFinite(seconds) && _sinceStart.Elapsed >= Enough
            ? $"{(_mayEndEarly ? "at most" : "about")} {Show.Duration(Math.Max(1, Math.Round(seconds)))} left"
            : "time left not known yet";
    }

    // a block costs as much as errors happen in it: in proportion to atoms times rounds
    private static double WorkOfBlock(MemorySetting setting) => (double)setting.Distance * setting.Distance * setting.Rounds;

    private static string Whole(double value) => Math.Floor(value).ToString(CultureInfo.InvariantCulture);

    private void Write(string line)
    {
        if (_error is null)
        {
            return;
        }

        if (_isTerminal)
        {
            _error.Write($"\r{line.PadRight(_shown)}{(line.Length == 0 ? "\r" : "")}");
            _shown = line.Length;
        }
        else if (line.Length > 0)
        {
            _error.WriteLine(line);
        }
    }
}
