using System.Diagnostics;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Cli;

/// <summary>Runs the experiments of a question one after another and takes the time.</summary>
/// <param name="question">The question.</param>
/// <param name="threads">Threads, at least 1.</param>
/// <param name="relativeError">Where an experiment ends early; 0: it does not.</param>
/// <param name="progress">Is told how far it is.</param>
internal sealed class MemorySession(MemoryQuestion question, int threads, double relativeError, MemoryProgress progress)
{
    /// <summary>Continues the counts to their end or to the interruption.</summary>
    public MemoryCounts Run(MemoryCounts counts, CancellationToken cancel)
    {
        progress.Begin(counts, relativeError > 0);
        for (int index = 0; index < question.Settings.Length && !cancel.IsCancellationRequested; index++)
        {
            MemorySetting setting = question.Settings[index];
            MemoryPlan plan = question.PlanOf(setting, counts.Shard, relativeError);
            ExperimentCount before = counts.Experiments[index];
            progress.BeginExperiment(index, plan, before.Tally);
            if (!MemoryRun.IsDone(plan, before.Tally))
            {
                Stopwatch watch = Stopwatch.StartNew();
                MemoryTally tally = MemoryRun.Run(question.ExperimentOf(setting), plan, before.Tally, threads, progress, cancel);
                counts = counts.With(index, new ExperimentCount(tally, before.Seconds + watch.Elapsed.TotalSeconds));
            }
        }

        return counts;
    }

    /// <summary>Whether nothing is left to run.</summary>
    public bool IsDone(MemoryCounts counts) => question.Settings
        .Select((setting, index) => MemoryRun.IsDone(question.PlanOf(setting, counts.Shard, relativeError), counts.Experiments[index].Tally))
        .All(done => done);
}
