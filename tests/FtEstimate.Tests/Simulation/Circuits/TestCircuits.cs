using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Tests.Simulation.Circuits;

/// <summary>Circuits with simple noise whose behaviour is known from elsewhere.</summary>
internal static class TestCircuits
{
    /// <summary>Errors at all places of the atom circuit, of comparable size; no loss.</summary>
    public static RoundErrors EverywhereOnAtoms(double p) => new()
    {
        CzGate = p,
        GateOnData = p,
        WaitingInLayer = PauliChannel.Depolarising(p),
        OnData = PauliChannel.Depolarising(p),
        OnCheckOutsideLayers = PauliChannel.Depolarising(p),
        OnCheckBetweenLayers = PauliChannel.Depolarising(p),
        CheckFlip = p,
        CheckReset = p,
    };

    /// <summary>Perfect checks once, then X errors on the data atoms, then perfect reading: code capacity.</summary>
    public static Circuit CodeCapacity(int distance, double p) => BeforeReading(
        distance, atom => new Operation(OperationKind.PauliNoise, atom, Channel: new PauliChannel(p, 0, 0)), null);

    /// <summary>Perfect checks once, then each data atom is erased and the decoder is told.</summary>
    public static Circuit Erasure(int distance, double e) => BeforeReading(
        distance,
        atom => new Operation(OperationKind.LossChance, atom, Probability: e),
        atom => new Operation(OperationKind.ReplaceTold, atom));

    /// <summary>X errors on data atoms and misread checks, equally likely; the final reading errs once more.</summary>
    public static Circuit Phenomenological(int distance, double p) =>
        AtomCircuit.Of(distance, distance, PauliBasis.Z, new RoundErrors { OnData = new PauliChannel(p, 0, 0), CheckFlip = p });

    /// <summary>One operation put in before another one.</summary>
    public static Circuit With(Circuit circuit, int before, Operation operation) =>
        circuit with { Operations = circuit.Operations.Insert(before, operation) };

    /// <summary>A noisy memory circuit of CNOT gates with any order of partners, pair errors only.</summary>
    public static Circuit WithOrder(int distance, PauliBasis basis, ImmutableArray<Corner> orderX, ImmutableArray<Corner> orderZ)
    {
        const int Rounds = 3;
        RotatedPatch patch = new(distance);
        MemoryCircuitBuilder builder = new(patch, Rounds, basis);
        builder.PrepareData(0);
        for (int round = 0; round < Rounds; round++)
        {
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                bool isX = patch.Checks[check].Basis == PauliBasis.X;
                builder.Do(isX ? OperationKind.ResetX : OperationKind.ResetZ, builder.CheckAtom(check));
            }

            for (int layer = 0; layer < 4; layer++)
            {
                AddLayer(patch, builder, orderX[layer], orderZ[layer]);
            }

            for (int check = 0; check < patch.Checks.Length; check++)
            {
                bool isX = patch.Checks[check].Basis == PauliBasis.X;
                builder.Do(isX ? OperationKind.MeasureX : OperationKind.MeasureZ, builder.CheckAtom(check));
            }
        }

        builder.ReadData(0);
        return builder.Build();
    }

    private static void AddLayer(RotatedPatch patch, MemoryCircuitBuilder builder, Corner cornerX, Corner cornerZ)
    {
        for (int check = 0; check < patch.Checks.Length; check++)
        {
            bool isX = patch.Checks[check].Basis == PauliBasis.X;
            if (patch.Checks[check].DataAt(isX ? cornerX : cornerZ) is { } data)
            {
                int atom = builder.CheckAtom(check);
                builder.Do(OperationKind.ControlledX, isX ? atom : data, isX ? data : atom);
                builder.PairNoise(atom, data, 1e-3);
            }
        }
    }

    private static Circuit BeforeReading(int distance, Func<int, Operation> noise, Func<int, Operation>? after)
    {
        Circuit quiet = TextbookCircuit.Of(distance, 1, PauliBasis.Z, UniformNoise.EveryPlace(0));
        int data = distance * distance;
        ImmutableArray<Operation> operations = quiet.Operations.InsertRange(
            quiet.Operations.Length - data, Enumerable.Range(0, data).Select(noise));
        return quiet with { Operations = after is null ? operations : operations.AddRange(Enumerable.Range(0, data).Select(after)) };
    }
}
