using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Simulation.Memory;

/// <summary>Size and basis of one memory experiment.</summary>
/// <param name="Distance">Code distance, odd, at least 3.</param>
/// <param name="Rounds">Rounds, at least 1.</param>
/// <param name="Basis">Basis of preparation and reading.</param>
public readonly record struct MemorySetting(int Distance, int Rounds, PauliBasis Basis);

/// <summary>What a set of memory experiments asks: all that decides its counts.</summary>
/// <param name="Noise">Circuit and rates.</param>
/// <param name="Settings">The experiments, each pair of distance and basis once.</param>
/// <param name="Decoder">The decoder.</param>
/// <param name="Shots">Shots of each experiment, all shards together.</param>
/// <param name="Seed">Seed the experiments derive theirs from.</param>
public sealed record MemoryQuestion(
    MemoryNoise Noise, ImmutableArray<MemorySetting> Settings, DecoderKind Decoder, long Shots, ulong Seed)
{
    /// <summary>One of its experiments.</summary>
    public MemoryExperiment ExperimentOf(MemorySetting setting) => MemoryExperiment.Of(Noise.CircuitOf(setting), Decoder);

    /// <summary>How one of its experiments is run.</summary>
    public MemoryPlan PlanOf(MemorySetting setting, Shard shard, double relativeError = 0) => new(Shots, SeedOf(setting), shard, relativeError);

    /// <summary>The seed of one experiment: different for each pair of distance and basis, so that experiments are independent.</summary>
    /// <remarks>SplitMix64 finaliser (Steele 2014, from memory); one to one, so no two experiments of a question share a seed.</remarks>
    public ulong SeedOf(MemorySetting setting) => Mix(Mix(Seed) + (2 * (ulong)setting.Distance) + (setting.Basis == PauliBasis.X ? 1u : 0u));

    private static ulong Mix(ulong value)
    {
        value += 0x9E3779B97F4A7C15UL;
        value = (value ^ (value >> 30)) * 0xBF58476D1CE4E5B9UL;
        value = (value ^ (value >> 27)) * 0x94D049BB133111EBUL;
        return value ^ (value >> 31);
    }
}

/// <summary>Where the noise comes from, and what a scaling law is asked at the same noise.</summary>
/// <param name="Title">Heading of the report.</param>
/// <param name="Sentence">Whose noise it is, one or two sentences.</param>
/// <param name="LawName">Scaling law in use.</param>
/// <param name="Strength">Noise strength in units of its threshold.</param>
public sealed record MemoryOrigin(string Title, string Sentence, string LawName, NoiseStrength Strength);
