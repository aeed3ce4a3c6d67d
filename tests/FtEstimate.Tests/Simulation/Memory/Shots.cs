using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Simulation.Memory;

/// <summary>Memory runs as tests need them: on two threads, with a fixed seed.</summary>
internal static class Shots
{
    public const int Threads = 2;

    public static ShotCount Run(Circuit circuit, long shots, DecoderKind decoder = DecoderKind.Matching, ulong seed = 1) =>
        Run(MemoryExperiment.Of(circuit, decoder), shots, seed);

    public static ShotCount Run(MemoryExperiment experiment, long shots, ulong seed) =>
        MemoryRun.Run(experiment, new MemoryPlan(shots, seed, Shard.Whole), default, Threads, null, CancellationToken.None).Count;

    public static double Rate(this ShotCount count) => (double)count.Failures / count.Shots;

    /// <summary>Standard error of the rate; with few failures that of one failure more.</summary>
    public static double StandardError(this ShotCount count)
    {
        double rate = Math.Max(count.Failures, 1) / (double)count.Shots;
        return Math.Sqrt(rate * (1 - Math.Min(rate, 0.5)) / count.Shots);
    }
}
