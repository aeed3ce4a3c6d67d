using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Circuits;

/// <summary>Plain quantum mechanics: all amplitudes of up to 20 atoms. H, CNOT, CZ, X and Z keep them real.</summary>
internal sealed class StateVector
{
    private readonly double[] amplitudes;

    public StateVector(int atoms)
    {
        amplitudes = new double[1 << atoms];
        amplitudes[0] = 1;
    }

    /// <summary>Results of a circuit without its noise, with an X or a Z put in before one operation.</summary>
    public static bool[] Results(Circuit circuit, int faultBefore, int faultAtom, PauliBasis fault, ref RandomBits random)
    {
        StateVector state = new(circuit.AtomCount);
        List<bool> results = [];
        for (int index = 0; index < circuit.Operations.Length; index++)
        {
            if (index == faultBefore)
            {
                state.Apply(fault, faultAtom);
            }

            Operation operation = circuit.Operations[index];
            switch (operation.Kind)
            {
                case OperationKind.ResetZ:
                    state.Reset(operation.A, ref random);
                    break;
                case OperationKind.ResetX:
                    state.Reset(operation.A, ref random);
                    state.Hadamard(operation.A);
                    break;
                case OperationKind.Hadamard:
                    state.Hadamard(operation.A);
                    break;
                case OperationKind.ControlledX:
                    state.Hadamard(operation.B);
                    state.ControlledZ(operation.A, operation.B);
                    state.Hadamard(operation.B);
                    break;
                case OperationKind.ControlledZ:
                    state.ControlledZ(operation.A, operation.B);
                    break;
                case OperationKind.MeasureZ:
                    results.Add(state.Measure(operation.A, ref random));
                    break;
                case OperationKind.MeasureX:
                    state.Hadamard(operation.A);
                    results.Add(state.Measure(operation.A, ref random));
                    state.Hadamard(operation.A);
                    break;
            }
        }

        return [.. results];
    }

    private void Apply(PauliBasis error, int atom)
    {
        int bit = 1 << atom;
        for (int index = 0; index < amplitudes.Length; index++)
        {
            if ((index & bit) == 0)
            {
                continue;
            }

            if (error == PauliBasis.Z)
            {
                amplitudes[index] = -amplitudes[index];
            }
            else
            {
                (amplitudes[index], amplitudes[index ^ bit]) = (amplitudes[index ^ bit], amplitudes[index]);
            }
        }
    }

    private void Hadamard(int atom)
    {
        int bit = 1 << atom;
        double root = Math.Sqrt(0.5);
        for (int index = 0; index < amplitudes.Length; index++)
        {
            if ((index & bit) == 0)
            {
                double zero = amplitudes[index];
                double one = amplitudes[index | bit];
                amplitudes[index] = (zero + one) * root;
                amplitudes[index | bit] = (zero - one) * root;
            }
        }
    }

    private void ControlledZ(int a, int b)
    {
        int both = (1 << a) | (1 << b);
        for (int index = 0; index < amplitudes.Length; index++)
        {
            if ((index & both) == both)
            {
                amplitudes[index] = -amplitudes[index];
            }
        }
    }

    private bool Measure(int atom, ref RandomBits random)
    {
        int bit = 1 << atom;
        double one = 0;
        for (int index = 0; index < amplitudes.Length; index++)
        {
            one += (index & bit) != 0 ? amplitudes[index] * amplitudes[index] : 0;
        }

        bool result = random.NextUnit() <= one;
        double scale = 1 / Math.Sqrt(result ? one : 1 - one);
        for (int index = 0; index < amplitudes.Length; index++)
        {
            amplitudes[index] = (index & bit) != 0 == result ? amplitudes[index] * scale : 0;
        }

        return result;
    }

    private void Reset(int atom, ref RandomBits random)
    {
        if (Measure(atom, ref random))
        {
            Apply(PauliBasis.X, atom);
        }
    }
}
