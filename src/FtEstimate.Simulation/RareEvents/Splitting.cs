using System.Collections.Immutable;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>How far an estimate has come.</summary>
/// <param name="Done">Levels done, of all ladders together.</param>
/// <param name="Total">Levels of all ladders together.</param>
public readonly record struct LadderProgress(int Done, int Total);

/// <summary>
/// Failure probabilities far below what plain Monte Carlo can see, by splitting: plain Monte Carlo where failures are common, then ratios between
/// neighbouring noise levels from chains that stay among the failing sets (Bravyi 2013, arXiv:1308.6270).
/// </summary>
public static class Splitting
{
    /// <summary>Estimates the failure probability at the target noise; the decoder is exact matching with the weights of the target.</summary>
    /// <param name="modelAt">The experiment at a noise level; mechanisms may differ between levels in their probabilities only.</param>
    /// <param name="plan">Levels and amount of work.</param>
    /// <param name="threads">Threads, at least 1; ladders run side by side.</param>
    /// <param name="progress">Told after every level of every ladder, from any thread; null: nobody.</param>
    /// <param name="cancel">Interrupts the estimate.</param>
    /// <exception cref="ArgumentException">The plan is outside its ranges, levels differ in more than probabilities, or atoms may be lost.</exception>
    /// <exception cref="OperationCanceledException">The estimate was interrupted.</exception>
    public static RareEventEstimate Estimate(
        Func<double, MemoryModel> modelAt, LadderPlan plan, int threads, IProgress<LadderProgress>? progress, CancellationToken cancel)
    {
        plan.Check();
        NoiseLadder ladder = new(modelAt, plan);
        int total = plan.Ladders * ladder.Levels.Length;
        int done = 0;
        SplittingTrace[] traces = new SplittingTrace[plan.Ladders];
        int next = 0;
        Parallel.For(0, Math.Min(threads, plan.Ladders), new ParallelOptions { MaxDegreeOfParallelism = threads, CancellationToken = cancel }, _ =>
        {
            for (int number = Interlocked.Increment(ref next) - 1; number < traces.Length; number = Interlocked.Increment(ref next) - 1)
            {
                traces[number] = new SplittingRun(ladder, plan, number, LevelDone, cancel).Run();
            }
        });
        return Combine(ladder, plan, traces);

        void LevelDone() => progress?.Report(new LadderProgress(Interlocked.Increment(ref done), total));
    }

    private static RareEventEstimate Combine(NoiseLadder ladder, LadderPlan plan, SplittingTrace[] traces)
    {
        int last = ladder.Levels.Length - 1;
        ImmutableArray<LevelEstimate> levels =
        [
            .. Enumerable.Range(0, last + 1).Select(level =>
            {
                (double mean, double relativeError) = Mean([.. traces.Select(trace => Math.Exp(trace.LogProbability[level]))]);
                return new LevelEstimate(ladder.Levels[level].Noise, mean, relativeError, traces.Average(trace => trace.Acceptance[level]));
            }),
        ];
        (double forward, double forwardError) = Mean([.. traces.Select(trace => Math.Exp(trace.LogForward[last]))]);
        long startShots = traces.Sum(trace => trace.StartShots);
        long moves = (long)plan.Ladders * (last + 1) * plan.Walkers * plan.SamplesPerLevel * plan.MovesPerSample;
        return new RareEventEstimate(
            levels,
            [.. traces.Select(trace => Math.Exp(trace.LogProbability[last]))],
            forward,
            forwardError,
            startShots,
            startShots + moves,
            traces.Average(trace => trace.SurvivingStarts));
    }

    private static (double Mean, double RelativeError) Mean(double[] values)
    {
        double mean = values.Average();
        double squares = values.Sum(value => (value - mean) * (value - mean));
        return (mean, Math.Sqrt(squares / (values.Length * (values.Length - 1.0))) / mean);
    }
}
