using BenchmarkDotNet.Attributes;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Benchmarks;

/// <summary>Whole shots of a memory of distance 17 over 51 rounds with noise at every place at a thousandth; one operation is one shot.</summary>
[MemoryDiagnoser]
public class MemoryBenchmarks
{
    private const int Shots = 40 * MemoryPlan.ShotsPerBlock;

    private readonly MemoryExperiment _unionFind = Experiment(DecoderKind.UnionFind);
    private readonly MemoryExperiment _matching = Experiment(DecoderKind.Matching);
    private readonly MechanismSampler _sampler = new(Experiment(DecoderKind.UnionFind).Model);

    [Benchmark(OperationsPerInvoke = Shots)]
    public int SampleOnly()
    {
        _sampler.Begin(1, 0);
        int defects = 0;
        for (int shot = 0; shot < Shots; shot++)
        {
            defects += _sampler.NextShot().Defects.Length;
        }

        return defects;
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Shots)]
    public MemoryTally UnionFindOnOneThread() => Run(_unionFind, 1);

    [Benchmark(OperationsPerInvoke = Shots)]
    public MemoryTally UnionFindOnTwoThreads() => Run(_unionFind, 2);

    [Benchmark(OperationsPerInvoke = Shots)]
    public MemoryTally MatchingOnOneThread() => Run(_matching, 1);

    [Benchmark(OperationsPerInvoke = Shots)]
    public MemoryTally MatchingOnTwoThreads() => Run(_matching, 2);

    private static MemoryExperiment Experiment(DecoderKind kind) =>
        MemoryExperiment.Of(TextbookCircuit.Of(17, 51, PauliBasis.Z, UniformNoise.EveryPlace(1e-3)), kind);

    private static MemoryTally Run(MemoryExperiment experiment, int threads) =>
        MemoryRun.Run(experiment, new MemoryPlan(Shots, 1, Shard.Whole), default, threads, null, CancellationToken.None);
}
