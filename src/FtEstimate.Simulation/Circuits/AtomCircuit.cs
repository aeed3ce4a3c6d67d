using System.Collections.Immutable;
using FtEstimate.Noise;

namespace FtEstimate.Simulation.Circuits;

/// <summary>
/// The memory circuit of an atom array: every pair gate is a CZ, checks are turned before the first and after the last layer, data atoms before layers 1,
/// 2 and 4 and after layer 4, where their partner asks for the other frame. Errors and losses come place by place from the ledger.
/// </summary>
/// <remarks>
/// X checks take their partners in the order NW, NE, SW, SE, Z checks NW, SW, NE, SE (hook-safe: Dennis 2002, arXiv:quant-ph/0110143). A lost atom carries a uniformly random
/// Pauli, drawn when it is lost and anew at the start of each round, and its gates go on as if it were there, so that products of
/// checks of one type across it stay as they are; its own readout is random. Checks are looked at in every round, data atoms every few rounds and at the end.
/// </remarks>
public static class AtomCircuit
{
    private const int Layers = 4;

    private static readonly ImmutableArray<Corner> OrderX = [Corner.NorthWest, Corner.NorthEast, Corner.SouthWest, Corner.SouthEast];
    private static readonly ImmutableArray<Corner> OrderZ = [Corner.NorthWest, Corner.SouthWest, Corner.NorthEast, Corner.SouthEast];

    /// <summary>The circuit of a memory experiment.</summary>
    /// <param name="distance">Code distance, odd, at least 3.</param>
    /// <param name="rounds">Rounds, at least 1.</param>
    /// <param name="basis">Basis of preparation and reading.</param>
    /// <param name="errors">Errors of a round.</param>
    public static Circuit Of(int distance, int rounds, PauliBasis basis, RoundErrors errors)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(rounds, 1);
        RotatedPatch patch = new(distance);
        MemoryCircuitBuilder builder = new(patch, rounds, basis);
        Round round = new(patch, builder, errors);
        builder.PrepareData(errors.CheckReset);
        for (int number = 1; number <= rounds; number++)
        {
            round.Add();
            if (number < rounds && number % errors.RoundsBetweenLooks == 0)
            {
                round.LookAtData();
            }
        }

        round.BeforeFinalReading();
        builder.ReadData(errors.CheckFlip);
        if (errors.DataLossTold)
        {
            round.LookAtData();
        }

        return builder.Build();
    }

    /// <summary>Mean number of one-qubit gates on a data atom in a round.</summary>
    internal static double GatesPerDataAtom(RotatedPatch patch) =>
        (double)new Round(patch, new MemoryCircuitBuilder(patch, 1, PauliBasis.Z), new RoundErrors()).TurnsOfData / patch.DataCount;

    private sealed class Round
    {
        private readonly RotatedPatch patch;
        private readonly MemoryCircuitBuilder builder;
        private readonly RoundErrors errors;
        private readonly (int Data, int CheckAtom)[][] pairs;

        // data atoms turned before layers 1, 2, 3 and 4 and after the last; the third list is empty, see docs/method.md
        private readonly List<int>[] turns;

        public Round(RotatedPatch patch, MemoryCircuitBuilder builder, RoundErrors errors)
        {
            this.patch = patch;
            this.builder = builder;
            this.errors = errors;
            pairs = [.. Enumerable.Range(0, Layers).Select(layer => PairsOf(layer).ToArray())];
            turns = [.. Enumerable.Range(0, Layers + 1).Select(_ => new List<int>())];
            FindTurns();
        }

        public int TurnsOfData => turns.Sum(atoms => atoms.Count);

        public void Add()
        {
            for (int data = 0; data < patch.DataCount; data++)
            {
                RedrawIfMayBeLost(data, errors.DataLossPerSlot);
            }

            for (int check = 0; check < patch.Checks.Length; check++)
            {
                builder.Do(OperationKind.ResetZ, builder.CheckAtom(check));
                builder.Noise(builder.CheckAtom(check), MemoryCircuitBuilder.FlipOf(PauliBasis.Z, errors.CheckReset));
            }

            builder.EndLayer();
            TurnChecks();
            for (int layer = 0; layer < Layers; layer++)
            {
                TurnData(layer);
                OnChecks(errors.OnCheckBetweenLayers);
                AddLayer(layer);
            }

            OnChecks(errors.OnCheckBetweenLayers);
            TurnData(Layers);
            TurnChecks();
            for (int data = 0; data < patch.DataCount; data++)
            {
                builder.Noise(data, errors.OnData);
            }

            ReadChecks();
            builder.EndLayer();
        }

        public void LookAtData()
        {
            for (int data = 0; data < patch.DataCount && errors.DataLossPerSlot > 0; data++)
            {
                builder.Do(errors.DataLossTold ? OperationKind.ReplaceTold : OperationKind.ReplaceUntold, data);
            }
        }

        public void BeforeFinalReading()
        {
            for (int data = 0; data < patch.DataCount; data++)
            {
                RedrawIfMayBeLost(data, errors.DataLossPerSlot);
            }
        }

        private void AddLayer(int layer)
        {
            foreach ((int data, int checkAtom) in pairs[layer])
            {
                builder.Do(OperationKind.ControlledZ, data, checkAtom);
                builder.PairNoise(data, checkAtom, errors.CzGate);
            }

            for (int atom = 0; atom < builder.AtomCount; atom++)
            {
                builder.Noise(atom, errors.WaitingInLayer);
                builder.Loss(atom, atom < patch.DataCount ? errors.DataLossPerSlot : errors.CheckLossPerSlot);
            }

            builder.EndLayer();
        }

        private void TurnChecks()
        {
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                builder.Do(OperationKind.Hadamard, builder.CheckAtom(check));
            }

            OnChecks(errors.OnCheckOutsideLayers);
            builder.EndLayer();
        }

        private void OnChecks(PauliChannel channel)
        {
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                builder.Noise(builder.CheckAtom(check), channel);
            }
        }

        private void TurnData(int instant)
        {
            foreach (int data in turns[instant])
            {
                builder.Do(OperationKind.Hadamard, data);
                builder.Noise(data, PauliChannel.Depolarising(errors.GateOnData));
            }

            builder.EndLayer();
        }

        private void ReadChecks()
        {
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                int atom = builder.CheckAtom(check);
                builder.Noise(atom, MemoryCircuitBuilder.FlipOf(PauliBasis.Z, errors.CheckFlip));
                RedrawIfMayBeLost(atom, errors.CheckLossPerSlot);
                builder.Do(OperationKind.MeasureZ, atom);
                if (errors.CheckLossPerSlot > 0)
                {
                    builder.Do(errors.CheckLossTold ? OperationKind.ReplaceTold : OperationKind.ReplaceUntold, atom);
                }
            }
        }

        private void RedrawIfMayBeLost(int atom, double lossPerSlot)
        {
            if (lossPerSlot > 0)
            {
                builder.Do(OperationKind.RedrawIfLost, atom);
            }
        }

        private IEnumerable<(int Data, int CheckAtom)> PairsOf(int layer)
        {
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                PatchCheck place = patch.Checks[check];
                if (place.DataAt(place.Basis == PauliBasis.X ? OrderX[layer] : OrderZ[layer]) is { } data)
                {
                    yield return (data, builder.CheckAtom(check));
                }
            }
        }

        /// <summary>Every data atom keeps its frame until a partner asks for the other one, and ends as it began.</summary>
        private void FindTurns()
        {
            bool[] turned = new bool[patch.DataCount];
            for (int layer = 0; layer < Layers; layer++)
            {
                foreach ((int data, int checkAtom) in pairs[layer])
                {
                    bool wanted = patch.Checks[checkAtom - patch.DataCount].Basis == PauliBasis.X;
                    if (turned[data] != wanted)
                    {
                        // layers 2 and 3 share their turns: an atom without a partner in layer 2 turns with the others
                        turns[layer == 2 ? 1 : layer].Add(data);
                        turned[data] = wanted;
                    }
                }
            }

            for (int data = 0; data < turned.Length; data++)
            {
                if (turned[data])
                {
                    turns[Layers].Add(data);
                }
            }
        }
    }
}
