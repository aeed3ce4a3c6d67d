using System.Collections.Immutable;
using FtEstimate.Noise;

namespace FtEstimate.Simulation.Circuits;

/// <summary>Collects the operations of a memory experiment; numbers its results and makes the detectors from them.</summary>
/// <remarks>Results must come in this order: all checks of round 1, of round 2 and so on, then all data atoms. Checks are fresh every round.</remarks>
/// <param name="patch">The patch.</param>
/// <param name="rounds">Syndrome rounds, at least 1.</param>
/// <param name="basis">Basis of preparation and final reading.</param>
internal sealed class MemoryCircuitBuilder(RotatedPatch patch, int rounds, PauliBasis basis)
{
    private readonly ImmutableArray<Operation>.Builder operations = ImmutableArray.CreateBuilder<Operation>();

    /// <summary>Atoms of the patch.</summary>
    public int AtomCount => patch.DataCount + patch.Checks.Length;

    /// <summary>Number of the atom of a check.</summary>
    public int CheckAtom(int check) => patch.DataCount + check;

    /// <summary>Adds a reset, a one-qubit gate, a measurement or a marker.</summary>
    public void Do(OperationKind kind, int atom) => operations.Add(new Operation(kind, atom));

    /// <summary>Adds a gate of two atoms.</summary>
    public void Do(OperationKind kind, int a, int b) => operations.Add(new Operation(kind, a, b));

    /// <summary>Adds Pauli noise; none where its probability is 0.</summary>
    public void Noise(int atom, PauliChannel channel)
    {
        if (channel.Total > 0)
        {
            operations.Add(new Operation(OperationKind.PauliNoise, atom, Channel: channel));
        }
    }

    /// <summary>Adds pair noise; none where its probability is 0.</summary>
    public void PairNoise(int a, int b, double probability)
    {
        if (probability > 0)
        {
            operations.Add(new Operation(OperationKind.PairDepolarising, a, b, Probability: probability));
        }
    }

    /// <summary>Adds a chance of loss; none where its probability is 0.</summary>
    public void Loss(int atom, double probability)
    {
        if (probability > 0)
        {
            operations.Add(new Operation(OperationKind.LossChance, atom, Probability: probability));
        }
    }

    /// <summary>Ends a layer.</summary>
    public void EndLayer() => operations.Add(new Operation(OperationKind.EndOfLayer, -1));

    /// <summary>Prepares the data atoms in the basis of the memory, with a flip.</summary>
    public void PrepareData(double flip)
    {
        for (int atom = 0; atom < patch.DataCount; atom++)
        {
            Do(basis == PauliBasis.Z ? OperationKind.ResetZ : OperationKind.ResetX, atom);
            Noise(atom, FlipOf(basis, flip));
        }
    }

    /// <summary>Reads the data atoms in the basis of the memory, with a flip.</summary>
    public void ReadData(double flip)
    {
        for (int atom = 0; atom < patch.DataCount; atom++)
        {
            Noise(atom, FlipOf(basis, flip));
            Do(basis == PauliBasis.Z ? OperationKind.MeasureZ : OperationKind.MeasureX, atom);
        }
    }

    /// <summary>The finished circuit.</summary>
    public Circuit Build() => new(
        patch.Distance,
        rounds,
        basis,
        AtomCount,
        operations.ToImmutable(),
        (rounds * patch.Checks.Length) + patch.DataCount,
        Detectors(),
        [.. patch.Logical(basis).Select(DataResult)]);

    /// <summary>The error that flips a state or result of a basis.</summary>
    internal static PauliChannel FlipOf(PauliBasis basis, double probability) =>
        basis == PauliBasis.Z ? new PauliChannel(probability, 0, 0) : new PauliChannel(0, 0, probability);

    private int CheckResult(int round, int check) => (round * patch.Checks.Length) + check;

    private int DataResult(int atom) => (rounds * patch.Checks.Length) + atom;

    private ImmutableArray<Detector> Detectors()
    {
        var detectors = ImmutableArray.CreateBuilder<Detector>();
        for (int round = 0; round <= rounds; round++)
        {
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                PauliBasis type = patch.Checks[check].Basis;
                bool known = type == basis;
                if ((round == 0 || round == rounds) && !known)
                {
                    continue;
                }

                var results = ImmutableArray.CreateBuilder<int>();
                if (round > 0)
                {
                    results.Add(CheckResult(round - 1, check));
                }

                if (round < rounds)
                {
                    results.Add(CheckResult(round, check));
                }
                else
                {
                    results.AddRange(Enum.GetValues<Corner>().Select(patch.Checks[check].DataAt).OfType<int>().Select(DataResult));
                }

                detectors.Add(new Detector(type, results.ToImmutable()));
            }
        }

        return detectors.ToImmutable();
    }
}
