using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Simulation.Memory;

/// <summary>What is to be run: how many shots, from which seed, and which share of them.</summary>
/// <param name="Shots">Shots of all shards together, at least 1.</param>
/// <param name="Seed">Seed; the same seed gives the same counts whatever the number of threads or shards.</param>
/// <param name="Shard">Which blocks are run here.</param>
/// <param name="RelativeError">Stop early once the standard error of the failure rate is this fraction of it; 0: never.</param>
public sealed record MemoryPlan(long Shots, ulong Seed, Shard Shard, double RelativeError = 0)
{
    /// <summary>Shots drawn from one seed.</summary>
    public const int ShotsPerBlock = 256;

    /// <summary>Blocks of all shards; the last one may be short.</summary>
    public long Blocks => (Shots + ShotsPerBlock - 1) / ShotsPerBlock;

    /// <summary>Blocks of this shard.</summary>
    public long BlocksOfShard => (Blocks - Shard.Index + Shard.Count - 1) / Shard.Count;

    /// <summary>Number of a block of this shard among all blocks.</summary>
    public long BlockNumber(long ofShard) => (ofShard * Shard.Count) + Shard.Index;

    /// <summary>Shots of a block.</summary>
    public int ShotsOfBlock(long number) => (int)Math.Min(ShotsPerBlock, Shots - (number * ShotsPerBlock));
}

/// <summary>One share of the blocks of a run: those whose number leaves the remainder <c>Index</c> on division by <c>Count</c>.</summary>
/// <param name="Index">0 to Count − 1.</param>
/// <param name="Count">Number of shares, at least 1.</param>
public readonly record struct Shard(int Index, int Count)
{
    /// <summary>Everything.</summary>
    public static readonly Shard Whole = new(0, 1);
}

/// <summary>How far a shard has come.</summary>
/// <param name="BlocksDone">Blocks of the shard that are complete, always the first ones.</param>
/// <param name="Count">Their shots and failures.</param>
public readonly record struct MemoryTally(long BlocksDone, ShotCount Count);

/// <summary>Runs memory experiments on several threads.</summary>
public static class MemoryRun
{
    /// <summary>Part of every counts file: raised whenever the same question with the same seed may give other counts.</summary>
    public const int Version = 1;

    /// <summary>Blocks before the first look at the relative error, doubled from look to look, so that neither threads nor interruptions move the end.</summary>
    private const long FirstLook = 64;

    /// <summary>Runs a shard from where it stands to its end, to the wanted accuracy, or to the interruption; blocks begun are finished.</summary>
    /// <param name="experiment">What is run.</param>
    /// <param name="plan">How much of it.</param>
    /// <param name="from">Where the shard stands; default: at its beginning.</param>
    /// <param name="threads">Threads, at least 1.</param>
    /// <param name="progress">Told the state after every block, from any thread; null: nobody.</param>
    /// <param name="cancel">Interrupts the run; what is complete is kept.</param>
    /// <returns>Where the shard stands now.</returns>
    public static MemoryTally Run(
        MemoryExperiment experiment, MemoryPlan plan, MemoryTally from, int threads, IProgress<MemoryTally>? progress, CancellationToken cancel)
    {
        // each thread makes its own, as that takes a while for large patches
        Lazy<Worker>[] workers = [.. Enumerable.Range(0, threads).Select(_ => new Lazy<Worker>(() => new Worker(experiment, plan)))];
        MemoryTally tally = from;
        while (!IsDone(plan, tally) && !cancel.IsCancellationRequested)
        {
            long end = plan.RelativeError > 0 ? Math.Min(NextLook(tally.BlocksDone), plan.BlocksOfShard) : plan.BlocksOfShard;
            tally = RunTo(end, workers, tally, progress, cancel);
        }

        return tally;
    }

    /// <summary>Whether a shard is at its end, or was accurate enough when it was last looked at.</summary>
    public static bool IsDone(MemoryPlan plan, MemoryTally tally) =>
        tally.BlocksDone >= plan.BlocksOfShard || (IsLook(tally.BlocksDone) && IsAccurate(tally.Count, plan.RelativeError));

    /// <summary>Whether the standard error of the failure rate is small enough.</summary>
    public static bool IsAccurate(ShotCount count, double relativeError) =>
        relativeError > 0 && count.Failures * relativeError * relativeError >= 1 - ((double)count.Failures / Math.Max(count.Shots, 1));

    private static bool IsLook(long done) => done >= FirstLook && done % FirstLook == 0 && long.IsPow2(done / FirstLook);

    private static long NextLook(long done)
    {
        long look = FirstLook;
        while (look <= done)
        {
            look *= 2;
        }

        return look;
    }

    private static MemoryTally RunTo(long end, Lazy<Worker>[] workers, MemoryTally from, IProgress<MemoryTally>? progress, CancellationToken cancel)
    {
        long next = from.BlocksDone;
        MemoryTally tally = from;
        Lock gate = new();
        Parallel.ForEach(workers, new ParallelOptions { MaxDegreeOfParallelism = workers.Length }, worker =>
        {
            while (!cancel.IsCancellationRequested)
            {
                long block = Interlocked.Increment(ref next) - 1;
                if (block >= end)
                {
                    return;
                }

                ShotCount count = worker.Value.Run(block);
                lock (gate)
                {
                    tally = new MemoryTally(tally.BlocksDone + 1, tally.Count + count);
                    progress?.Report(tally);
                }
            }
        });
        return tally;
    }

    private sealed class Worker(MemoryExperiment experiment, MemoryPlan plan)
    {
        private readonly MechanismSampler sampler = new(experiment.Model);
        private readonly IDecoder decoder = Decoders.Make(experiment.Decoder, experiment.Model.Graph);

        public ShotCount Run(long blockOfShard)
        {
            long block = plan.BlockNumber(blockOfShard);
            int shots = plan.ShotsOfBlock(block);
            sampler.Begin(plan.Seed, (ulong)block);
            long failures = 0;
            for (int shot = 0; shot < shots; shot++)
            {
                SampledShot sampled = sampler.NextShot();
                failures += decoder.Decode(sampled.Defects, sampled.Told) != sampled.ObservableFlipped ? 1 : 0;
            }

            return new ShotCount(shots, failures);
        }
    }
}
