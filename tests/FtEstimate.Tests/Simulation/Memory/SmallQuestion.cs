using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Simulation.Memory;

/// <summary>Questions that are answered in milliseconds.</summary>
internal static class SmallQuestion
{
    public static MemorySubject Subject { get; } = MemorySubject.Of(UniformNoise.EveryPlace(0.01), 0.01);

    public static MemoryQuestion Of(long shots = 2000, ulong seed = 7) => new(
        Subject.Noise, [new(3, 3, PauliBasis.Z), new(3, 3, PauliBasis.X), new(5, 3, PauliBasis.Z), new(5, 3, PauliBasis.X)], DecoderKind.UnionFind, shots, seed);

    public static MemoryCounts Counted(MemoryQuestion question, Shard shard, int threads = 1, double relativeError = 0)
    {
        MemoryCounts counts = MemoryCounts.Begin(question, Subject.Origin, shard);
        for (int i = 0; i < question.Settings.Length; i++)
        {
            MemorySetting setting = question.Settings[i];
            MemoryTally tally = MemoryRun.Run(
                question.ExperimentOf(setting), question.PlanOf(setting, shard, relativeError), default, threads, null, CancellationToken.None);
            counts = counts.With(i, new ExperimentCount(tally, 0.25));
        }

        return counts;
    }

    public static ShotCount[] CountsOf(MemoryResults results) => [.. results.Experiments.Select(experiment => experiment.Count)];
}
