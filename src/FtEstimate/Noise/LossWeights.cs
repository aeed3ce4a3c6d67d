namespace FtEstimate.Noise;

/// <summary>
/// What lost atoms cost, first order: the straight boundary p_loss/a + p_Pauli/b = 1 with a(ℓ) = 0.07/ℓ^{1/3} for a life of ℓ gate slots
/// (Baranes 2026, arXiv:2502.20558; read second-hand). Not scaled with the law: a is a threshold of its own.
/// </summary>
/// <remarks>
/// The rates of that boundary are read as per CZ gate: its Pauli-only threshold of 1 % is one per gate, and the paper turns gate rates into rates of
/// its two atoms. A loss probability per atom therefore counts twice. At ℓ = 4 the threshold is 4.4 % per gate, 2.2 % per atom; others found 2.6 %
/// with a loss check every round (Perrin 2024, arXiv:2412.07841) and 4.15 % per gate for located erasures (Wu 2022, arXiv:2201.03540), in other circuits.
/// </remarks>
public static class LossWeights
{
    private const double AtomsPerGate = 2;

    /// <summary>Loss threshold per CZ gate for atoms that are looked at every ℓ gate slots.</summary>
    public static double Threshold(double lifeInGateSlots) => 0.07 / Math.Cbrt(lifeInGateSlots);

    /// <summary>Strength of a loss probability per atom and gate slot of one kind of atom, told to the decoder after its life; half of the atoms are of each kind.</summary>
    public static NoiseStrength Told(double lossPerGateSlot, double roundsBetweenLooks) =>
        NoiseStrength.Even(AtomsPerGate * lossPerGateSlot / Threshold(4 * roundsBetweenLooks) / 2);
}
