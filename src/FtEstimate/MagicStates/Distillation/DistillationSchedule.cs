namespace FtEstimate.MagicStates.Distillation;

/// <summary>A multi-qubit Z rotation by π/8, done by measuring with a T state through an ancilla patch.</summary>
/// <param name="Qubits">The qubits it acts on.</param>
/// <param name="SpansX">How many sides dX the ancilla patch is long.</param>
/// <param name="SpansZ">How many sides dZ it is long besides.</param>
/// <param name="Disturbs">Outputs whose side the ancilla patch runs along, and which can take an extra Z from it.</param>
internal sealed record Rotation(QubitSet Qubits, int SpansX, int SpansZ, QubitSet Disturbs);

/// <summary>One step: rotations done at the same time, then the storage errors of the qubits that live through it.</summary>
/// <param name="Rotations">Rotations of the step; they all commute.</param>
/// <param name="Stored">Qubits that wait for the length of the step.</param>
/// <param name="HandedOver">Outputs that leave the factory, which takes them dm + 2dX rounds.</param>
internal sealed record DistillationStep(Rotation[] Rotations, QubitSet Stored, QubitSet HandedOver);

/// <summary>
/// A distillation protocol as a table: all qubits start in |+⟩, rotations follow step by step, and the batch is accepted when every
/// check measures |+⟩ (Litinski 2019, arXiv:1905.06903).
/// </summary>
/// <param name="Outputs">Number of output qubits, numbered 1 to Outputs.</param>
/// <param name="Qubits">Number of all qubits; the rest are checks.</param>
/// <param name="Steps">The steps in order of time.</param>
/// <param name="OutputInfidelity">
/// What an error on the outputs counts, indexed by x + (z &lt;&lt; Outputs), where bit q−1 of x and z is the X and Z part on output q.
/// </param>
internal sealed record DistillationSchedule(
    int Outputs,
    int Qubits,
    DistillationStep[] Steps,
    double[] OutputInfidelity)
{
    /// <summary>
    /// The infidelity of several T states after a Pauli error: Z turns a T state into the orthogonal one, X or Y leave half the
    /// fidelity, and fidelities multiply.
    /// </summary>
    public static double[] InfidelityOfTStates(int outputs)
    {
        double[] infidelity = new double[1 << (2 * outputs)];
        for (int pattern = 0; pattern < infidelity.Length; pattern++)
        {
            double fidelity = 1;
            for (int output = 0; output < outputs; output++)
            {
                bool hasX = ((pattern >> output) & 1) != 0;
                bool hasZ = ((pattern >> (outputs + output)) & 1) != 0;
                fidelity *= hasX ? 0.5 : hasZ ? 0 : 1;
            }

            infidelity[pattern] = 1 - fidelity;
        }

        return infidelity;
    }
}
