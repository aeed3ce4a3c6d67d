using FtEstimate.Noise;

namespace FtEstimate.Simulation.Circuits;

/// <summary>What an operation does.</summary>
public enum OperationKind
{
    /// <summary>Prepares |0⟩.</summary>
    ResetZ,

    /// <summary>Prepares |+⟩.</summary>
    ResetX,

    /// <summary>Exchanges X and Z.</summary>
    Hadamard,

    /// <summary>CNOT from A to B.</summary>
    ControlledX,

    /// <summary>CZ of A and B.</summary>
    ControlledZ,

    /// <summary>Reads Z; results are numbered in the order of the circuit.</summary>
    MeasureZ,

    /// <summary>Reads X.</summary>
    MeasureX,

    /// <summary>X, Y or Z on A with the probabilities of a channel.</summary>
    PauliNoise,

    /// <summary>One of the 15 pairs of Pauli errors on A and B, evenly.</summary>
    PairDepolarising,

    /// <summary>A is lost with a probability; it then carries a uniformly random Pauli.</summary>
    LossChance,

    /// <summary>If A is lost, its Pauli is drawn anew.</summary>
    RedrawIfLost,

    /// <summary>A lost A is replaced, and the decoder is told that it was lost since the last look.</summary>
    ReplaceTold,

    /// <summary>A lost A is replaced, and nobody tells the decoder.</summary>
    ReplaceUntold,

    /// <summary>End of a layer: within a layer no atom takes part in two gates.</summary>
    EndOfLayer,
}

/// <summary>One operation of a circuit.</summary>
/// <param name="Kind">What it does.</param>
/// <param name="A">First atom.</param>
/// <param name="B">Second atom of a pair, else −1.</param>
/// <param name="Channel">Probabilities of Pauli noise on A; default for other kinds.</param>
/// <param name="Probability">Probability of pair noise or of a loss; 0 for other kinds.</param>
public readonly record struct Operation(OperationKind Kind, int A, int B = -1, PauliChannel Channel = default, double Probability = 0)
{
    /// <summary>Whether the operation is a gate, a reset or a measurement, and not noise.</summary>
    public bool IsDone => Kind <= OperationKind.MeasureX;
}
