using System.Collections.Immutable;

namespace FtEstimate.Workloads;

/// <summary>The logical size of an algorithm.</summary>
/// <param name="Name">Printed in reports.</param>
/// <param name="LogicalQubits">Logical qubits.</param>
/// <param name="TStates">T states consumed directly.</param>
/// <param name="Toffolis">Toffoli gates.</param>
/// <param name="Rotations">Arbitrary z rotations.</param>
/// <param name="RotationError">Error allowed per rotation; null: chosen by the sizing.</param>
/// <param name="ReactionDepth">Sequential reactions, rotations not counted; null: one per T state and Toffoli.</param>
/// <param name="RotationDepth">Sequential layers of rotations; each costs one reaction per T of its synthesis; null: one per rotation.</param>
/// <param name="LogicalLayers">Layers of logical gates in the transversal style; null: four per T or Toffoli layer.</param>
/// <param name="Shots">Complete runs needed, at least 1.</param>
/// <param name="Derivations">How generated counts came about.</param>
public sealed record Workload(
    string Name,
    double LogicalQubits,
    double TStates,
    double Toffolis,
    double Rotations,
    double? RotationError,
    double? ReactionDepth,
    double? RotationDepth,
    double? LogicalLayers,
    double Shots,
    ImmutableArray<Derivation> Derivations);

/// <summary>One count with the formula and paper behind it.</summary>
/// <param name="Quantity">What is counted.</param>
/// <param name="Formula">The formula with its parameters filled in.</param>
/// <param name="Value">The result.</param>
/// <param name="Source">First author, year and arXiv number, or "stated in the file".</param>
public sealed record Derivation(string Quantity, string Formula, double Value, string Source);
