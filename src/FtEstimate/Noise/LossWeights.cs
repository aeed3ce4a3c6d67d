namespace FtEstimate.Noise;

/// <summary>
/// What lost atoms cost, first order: the straight boundary p_loss/a + p_Pauli/b = 1 with a(ℓ) = 0.07/ℓ^{1/3} for a life of ℓ gate slots
/// (Baranes 2026, arXiv:2502.20558; read second-hand). Not scaled with the law: a is a threshold of its own.
/// </summary>
public static class LossWeights
{
    /// <summary>Loss threshold per gate slot for atoms that are looked at every ℓ gate slots.</summary>
    public static double Threshold(double lifeInGateSlots) => 0.07 / Math.Cbrt(lifeInGateSlots);

    /// <summary>Strength of a loss probability per gate slot of one kind of atom, told to the decoder after its life; half of the atoms are of each kind.</summary>
    public static NoiseStrength Told(double lossPerGateSlot, double roundsBetweenLooks) =>
        NoiseStrength.Even(lossPerGateSlot / Threshold(4 * roundsBetweenLooks) / 2);
}
