using System.Collections.Immutable;

namespace FtEstimate.Simulation.Memory;

/// <summary>What one run of a question has counted so far.</summary>
/// <param name="Question">The question.</param>
/// <param name="Origin">Where the noise comes from.</param>
/// <param name="Shard">Which share of the blocks.</param>
/// <param name="Experiments">How far each setting of the question has come, in its order.</param>
public sealed record MemoryCounts(MemoryQuestion Question, MemoryOrigin Origin, Shard Shard, ImmutableArray<ExperimentCount> Experiments)
{
    /// <summary>Nothing counted yet.</summary>
    public static MemoryCounts Begin(MemoryQuestion question, MemoryOrigin origin, Shard shard) =>
        new(question, origin, shard, [.. question.Settings.Select(_ => default(ExperimentCount))]);

    /// <summary>With one experiment further on.</summary>
    public MemoryCounts With(int index, ExperimentCount experiment) => this with { Experiments = Experiments.SetItem(index, experiment) };
}

/// <summary>How far one experiment has come.</summary>
/// <param name="Tally">Blocks, shots and failures.</param>
/// <param name="Seconds">Time spent on it.</param>
public readonly record struct ExperimentCount(MemoryTally Tally, double Seconds);

/// <summary>Which shards can be added up.</summary>
public static class Shards
{
    /// <summary>Whether two shards have blocks in common: exact for endless runs (remainders modulo the common divisor).</summary>
    public static bool Overlap(Shard one, Shard other)
    {
        int divisor = Divisor(one.Count, other.Count);
        return one.Index % divisor == other.Index % divisor;
    }

    private static int Divisor(int a, int b) => b == 0 ? a : Divisor(b, a % b);
}
