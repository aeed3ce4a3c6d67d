using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Simulation.Calibration;

/// <summary>One memory experiment of the calibration.</summary>
/// <param name="Mix">Name of the mixture of errors.</param>
/// <param name="UniformError">Error of every place of the textbook circuit; 0: the atom circuit.</param>
/// <param name="Errors">Errors of a round of the atom circuit.</param>
/// <param name="Distance">Code distance.</param>
/// <param name="Basis">Basis of the memory.</param>
public sealed record CalibrationCell(string Mix, double UniformError, RoundErrors Errors, int Distance, PauliBasis Basis)
{
    /// <summary>Begins the name of an experiment that is not fitted: one cause and nothing else, which no machine has.</summary>
    public const string AloneMark = "alone: ";

    /// <summary>Whether the law is fitted to it.</summary>
    public bool IsFitted => !Mix.StartsWith(AloneMark, StringComparison.Ordinal);

    /// <summary>Rounds of every experiment, as in the published simulations it is compared with.</summary>
    public int Rounds => 3 * Distance;

    /// <summary>The experiment, decoded by exact matching.</summary>
    public MemoryExperiment Experiment() => MemoryExperiment.Of(
        UniformError > 0
            ? TextbookCircuit.Of(Distance, Rounds, Basis, UniformNoise.EveryPlace(UniformError))
            : AtomCircuit.Of(Distance, Rounds, Basis, Errors),
        DecoderKind.Matching);
}

/// <summary>What a cell gave.</summary>
/// <param name="Cell">The cell.</param>
/// <param name="Seed">Its seed.</param>
/// <param name="Count">Shots and failures.</param>
public sealed record CalibrationResult(CalibrationCell Cell, ulong Seed, ShotCount Count);
