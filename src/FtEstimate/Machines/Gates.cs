namespace FtEstimate.Machines;

/// <summary>A two-qubit gate.</summary>
/// <param name="Infidelity">Average gate infidelity of gates that lose no atom.</param>
/// <param name="Loss">Probability that one gate loses either atom.</param>
/// <param name="Seconds">Duration of the pulse.</param>
public sealed record EntanglingGate(double Infidelity, double Loss, double Seconds)
{
    /// <summary>Pauli probability of the gate: 5/4 of its average infidelity (two qubits, depolarising; exact).</summary>
    public double PauliError => 1.25 * Infidelity;

    /// <summary>Loss per atom and gate: half of the loss of the pair.</summary>
    public double LossPerAtom => Loss / 2;
}

/// <summary>Gate errors (average infidelities) and times.</summary>
/// <param name="Cz">The gate between atoms of the data species.</param>
/// <param name="BetweenSpecies">The gate between a data atom and a check atom of another species; null when not stated.</param>
/// <param name="CzPairsAtOnce">Pairs that one pulse serves, machine-wide; infinite when not limited.</param>
/// <param name="OneQubitInfidelity">Average infidelity of a one-qubit gate.</param>
/// <param name="OneQubitSeconds">Duration of a one-qubit gate.</param>
/// <param name="OneQubitAtOnce">Atoms that one one-qubit pulse serves, machine-wide; infinite when not limited.</param>
/// <param name="ResetFlip">Probability that a reset check starts in the wrong state.</param>
/// <param name="ResetSeconds">Duration of a reset.</param>
public sealed record Gates(
    EntanglingGate Cz,
    EntanglingGate? BetweenSpecies,
    double CzPairsAtOnce,
    double OneQubitInfidelity,
    double OneQubitSeconds,
    double OneQubitAtOnce,
    double ResetFlip,
    double ResetSeconds)
{
    /// <summary>Pauli probability of a one-qubit gate.</summary>
    public double OneQubitPauliError => PauliErrorOfOneQubit(OneQubitInfidelity);

    /// <summary>Pauli probability of a one-qubit operation: 3/2 of its average infidelity (one qubit, depolarising; exact).</summary>
    public static double PauliErrorOfOneQubit(double infidelity) => 1.5 * infidelity;
}
