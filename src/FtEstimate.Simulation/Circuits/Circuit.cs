using System.Collections.Immutable;

namespace FtEstimate.Simulation.Circuits;

/// <summary>A parity of results that is even unless an error happened.</summary>
/// <param name="Basis">Type of its check.</param>
/// <param name="Measurements">Numbers of the results.</param>
public sealed record Detector(PauliBasis Basis, ImmutableArray<int> Measurements);

/// <summary>A memory experiment as a list of operations with noise at every place, and what is made of its results.</summary>
/// <param name="Distance">Code distance.</param>
/// <param name="Rounds">Syndrome rounds.</param>
/// <param name="Basis">Basis of preparation and final reading.</param>
/// <param name="AtomCount">Atoms: data first, then checks.</param>
/// <param name="Operations">In order of time.</param>
/// <param name="MeasurementCount">Number of results.</param>
/// <param name="Detectors">Detectors of both types, round by round.</param>
/// <param name="Observable">Numbers of the results whose parity is the logical observable.</param>
public sealed record Circuit(
    int Distance,
    int Rounds,
    PauliBasis Basis,
    int AtomCount,
    ImmutableArray<Operation> Operations,
    int MeasurementCount,
    ImmutableArray<Detector> Detectors,
    ImmutableArray<int> Observable);
