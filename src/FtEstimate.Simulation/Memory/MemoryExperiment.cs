using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Memory;

/// <summary>One memory experiment: a circuit, what can go wrong in it, and who decodes it.</summary>
/// <param name="Circuit">The circuit.</param>
/// <param name="Model">Its mechanisms and losses.</param>
/// <param name="Decoder">The decoder.</param>
public sealed record MemoryExperiment(Circuit Circuit, MemoryModel Model, DecoderKind Decoder)
{
    /// <summary>Works out what can go wrong in a circuit.</summary>
    public static MemoryExperiment Of(Circuit circuit, DecoderKind decoder) => new(circuit, FaultPropagation.Of(circuit), decoder);
}

/// <summary>How many shots failed of how many.</summary>
/// <param name="Shots">Shots run.</param>
/// <param name="Failures">Shots whose observable was guessed wrongly.</param>
public readonly record struct ShotCount(long Shots, long Failures)
{
    /// <summary>Two runs together.</summary>
    public static ShotCount operator +(ShotCount a, ShotCount b) => new(a.Shots + b.Shots, a.Failures + b.Failures);

    /// <summary>Two runs together.</summary>
    public static ShotCount Add(ShotCount left, ShotCount right) => left + right;
}
