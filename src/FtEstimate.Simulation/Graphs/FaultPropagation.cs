using System.Collections.Immutable;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Simulation.Graphs;

/// <summary>
/// From a noisy circuit to its mechanisms: walks the circuit backwards and keeps for each atom which detectors an X or a Z error at this instant would flip
/// (exact; Clifford circuits carry Pauli errors to Pauli errors).
/// </summary>
public static class FaultPropagation
{
    /// <summary>What can go wrong, as seen by the detectors of the circuit's own basis, which alone bear on its observable.</summary>
    /// <exception cref="InvalidOperationException">An error flips more than two detectors of one type.</exception>
    public static MemoryModel Of(Circuit circuit) => Of(circuit, circuit.Basis);

    /// <summary>What can go wrong, as seen by the detectors of one type.</summary>
    /// <exception cref="InvalidOperationException">An error flips more than two detectors of one type.</exception>
    internal static MemoryModel Of(Circuit circuit, PauliBasis type)
    {
        Walk walk = new(circuit, type);
        for (int index = circuit.Operations.Length - 1; index >= 0; index--)
        {
            walk.Back(circuit.Operations[index]);
        }

        return walk.Model();
    }

    private sealed class Walk
    {
        private readonly Circuit circuit;
        private readonly Symptom[] ofX;
        private readonly Symptom[] ofZ;
        private readonly Symptom[] ofResult;
        private readonly int detectorCount;
        private readonly MechanismTable mechanisms = new();
        private readonly LossBook losses;
        private int result;

        public Walk(Circuit circuit, PauliBasis type)
        {
            this.circuit = circuit;
            ofX = new Symptom[circuit.AtomCount];
            ofZ = new Symptom[circuit.AtomCount];
            Array.Fill(ofX, Symptom.None);
            Array.Fill(ofZ, Symptom.None);
            result = circuit.MeasurementCount;
            ofResult = new Symptom[result];
            Array.Fill(ofResult, Symptom.None);
            foreach (Detector detector in circuit.Detectors)
            {
                if (detector.Basis != type)
                {
                    continue;
                }

                foreach (int measurement in detector.Measurements)
                {
                    ofResult[measurement] ^= Symptom.Of(detectorCount);
                }

                detectorCount++;
            }

            if (type == circuit.Basis)
            {
                foreach (int measurement in circuit.Observable)
                {
                    ofResult[measurement] = ofResult[measurement] with { Observable = true };
                }
            }

            losses = new LossBook(circuit, mechanisms);
        }

        public void Back(in Operation operation)
        {
            int a = operation.A;
            int b = operation.B;
            switch (operation.Kind)
            {
                case OperationKind.ResetZ or OperationKind.ResetX:
                    ofX[a] = Symptom.None;
                    ofZ[a] = Symptom.None;
                    break;
                case OperationKind.Hadamard:
                    (ofX[a], ofZ[a]) = (ofZ[a], ofX[a]);
                    break;
                case OperationKind.ControlledX:
                    ofX[a] ^= ofX[b];
                    ofZ[b] ^= ofZ[a];
                    break;
                case OperationKind.ControlledZ:
                    (ofX[a], ofX[b]) = (ofX[a] ^ ofZ[b], ofX[b] ^ ofZ[a]);
                    break;
                case OperationKind.MeasureZ:
                    ofX[a] ^= ofResult[--result];
                    break;
                case OperationKind.MeasureX:
                    ofZ[a] ^= ofResult[--result];
                    break;
                case OperationKind.PauliNoise:
                    mechanisms.AddChannel(ofX[a], ofZ[a], operation.Channel);
                    break;
                case OperationKind.PairDepolarising:
                    AddPair(operation);
                    break;
                case OperationKind.LossChance or OperationKind.RedrawIfLost:
                    losses.Step(a, operation.Probability, Seen(a));
                    break;
                case OperationKind.ReplaceTold or OperationKind.ReplaceUntold:
                    losses.Look(a, operation.Kind == OperationKind.ReplaceTold);
                    break;
            }
        }

        public MemoryModel Model()
        {
            ImmutableArray<LossWindow> windows = losses.Close();
            ImmutableArray<double> pauli = [.. mechanisms.Probabilities];
            return new MemoryModel(
                new DetectorGraph(detectorCount, mechanisms.Edges(LossBook.WithUntold(pauli, windows))), pauli, windows);
        }

        /// <summary>Of the four parts of a pair error (X and Z of each atom) one of each atom can be seen; each is flipped by 8 of the 15 errors.</summary>
        private void AddPair(in Operation operation)
        {
            double each = operation.Probability * 4 / 15;
            mechanisms.AddExclusive(Seen(operation.A), Seen(operation.B), each, each, each);
        }

        /// <summary>The error of an atom that one type of detectors can see: X or Z, never both in a circuit of X and Z checks.</summary>
        private Symptom Seen(int atom)
        {
            if (!ofX[atom].IsNone && !ofZ[atom].IsNone)
            {
                throw new InvalidOperationException("one type of detectors sees X and Z of the same atom at once");
            }

            return ofX[atom].IsNone ? ofZ[atom] : ofX[atom];
        }
    }
}
