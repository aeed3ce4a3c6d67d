using FtEstimate.Quantities;

namespace FtEstimate.Noise;

/// <summary>Probabilities of X, Y and Z on one qubit; their sum is at most 1.</summary>
/// <param name="X">Probability of X.</param>
/// <param name="Y">Probability of Y.</param>
/// <param name="Z">Probability of Z.</param>
public readonly record struct PauliChannel(double X, double Y, double Z)
{
    /// <summary>Probability of any error.</summary>
    public double Total => X + Y + Z;

    /// <summary>The channel that spreads a probability evenly over X, Y and Z.</summary>
    public static PauliChannel Depolarising(double probability) => new(probability / 3, probability / 3, probability / 3);

    /// <summary>
    /// Waiting for a time t under relaxation T1 and dephasing T2 (Pauli twirl of amplitude and phase damping, Ghosh 2012, arXiv:1210.5799):
    /// p_x = p_y = (1−e^{−t/T1})/4, p_z = (1−e^{−t/T2})/2 − (1−e^{−t/T1})/4.
    /// The twirl overstates the logical error (Tomita 2014, arXiv:1404.3747).
    /// </summary>
    /// <param name="seconds">Waiting time, at least 0.</param>
    /// <param name="t1Seconds">Relaxation time, may be infinite.</param>
    /// <param name="t2Seconds">Coherence time, at most 2·T1.</param>
    public static PauliChannel Waiting(double seconds, double t1Seconds, double t2Seconds)
    {
        double relaxed = -ElementaryFunctions.ExpMinusOne(-seconds / t1Seconds) / 4;
        double dephased = -ElementaryFunctions.ExpMinusOne(-seconds / t2Seconds) / 2;
        return new(relaxed, relaxed, Math.Max(dephased - relaxed, 0));
    }

    /// <summary>This channel and another one after it.</summary>
    public PauliChannel Then(PauliChannel next)
    {
        double kept = 1 - Total;
        double nextKept = 1 - next.Total;
        return new(
            (X * nextKept) + (kept * next.X) + (Y * next.Z) + (Z * next.Y),
            (Y * nextKept) + (kept * next.Y) + (X * next.Z) + (Z * next.X),
            (Z * nextKept) + (kept * next.Z) + (X * next.Y) + (Y * next.X));
    }

    /// <summary>This channel so many times on average, first order; the sum is cut at three quarters, where nothing is known of the qubit any more.</summary>
    public PauliChannel Times(double count)
    {
        double factor = count * Total <= 0.75 ? count : 0.75 / Total;
        return new(X * factor, Y * factor, Z * factor);
    }
}
