using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Simulation.Sampling;

/// <summary>Runs a circuit for 64 shots at once; bit s of each word belongs to shot s.</summary>
internal sealed class FrameBatch
{
    /// <summary>Shots in a batch.</summary>
    public const int Shots = 64;

    private readonly Circuit circuit;
    private readonly ulong[] x;
    private readonly ulong[] z;
    private readonly ulong[] lost;
    private readonly double[] probabilities;
    private readonly int[] groupOf;
    private readonly int[] next;

    /// <summary>Finds the different probabilities of a circuit.</summary>
    public FrameBatch(Circuit circuit)
    {
        this.circuit = circuit;
        x = new ulong[circuit.AtomCount];
        z = new ulong[circuit.AtomCount];
        lost = new ulong[circuit.AtomCount];
        Results = new ulong[circuit.MeasurementCount];
        LostAtLook = new ulong[circuit.Operations.Count(operation => operation.Kind is OperationKind.ReplaceTold or OperationKind.ReplaceUntold)];
        Dictionary<double, int> groups = [];
        groupOf = new int[circuit.Operations.Length];
        for (int index = 0; index < groupOf.Length; index++)
        {
            double probability = ProbabilityOf(circuit.Operations[index]);
            if (probability > 0)
            {
                groups.TryAdd(probability, groups.Count);
                groupOf[index] = groups[probability];
            }
        }

        probabilities = [.. groups.OrderBy(entry => entry.Value).Select(entry => entry.Key)];
        next = new int[probabilities.Length];
    }

    /// <summary>Whether each result of each shot is wrong.</summary>
    public ulong[] Results { get; }

    /// <summary>Which shots had lost the atom at each look.</summary>
    public ulong[] LostAtLook { get; }

    /// <summary>Starts a stream of batches.</summary>
    public void Begin(ref RandomBits random)
    {
        for (int group = 0; group < next.Length; group++)
        {
            next[group] = Gap(group, ref random);
        }
    }

    /// <summary>Runs 64 shots.</summary>
    public void Run(ref RandomBits random)
    {
        Array.Clear(x);
        Array.Clear(z);
        Array.Clear(lost);
        int result = 0;
        int look = 0;
        ReadOnlySpan<Operation> operations = circuit.Operations.AsSpan();
        for (int index = 0; index < operations.Length; index++)
        {
            ref readonly Operation operation = ref operations[index];
            int a = operation.A;
            int b = operation.B;
            switch (operation.Kind)
            {
                case OperationKind.ResetZ or OperationKind.ResetX:
                    x[a] = 0;
                    z[a] = 0;
                    break;
                case OperationKind.Hadamard:
                    (x[a], z[a]) = (z[a], x[a]);
                    break;
                case OperationKind.ControlledX:
                    x[b] ^= x[a];
                    z[a] ^= z[b];
                    break;
                case OperationKind.ControlledZ:
                    z[a] ^= x[b];
                    z[b] ^= x[a];
                    break;
                case OperationKind.MeasureZ:
                    Results[result++] = x[a];
                    break;
                case OperationKind.MeasureX:
                    Results[result++] = z[a];
                    break;
                case OperationKind.PauliNoise:
                    Strike(a, Drawn(groupOf[index], ref random), operation.Channel, ref random);
                    break;
                case OperationKind.PairDepolarising:
                    StrikePair(a, b, Drawn(groupOf[index], ref random), ref random);
                    break;
                case OperationKind.LossChance:
                    ulong justLost = Drawn(groupOf[index], ref random) & ~lost[a];
                    lost[a] |= justLost;
                    Randomise(a, justLost, ref random);
                    break;
                case OperationKind.RedrawIfLost:
                    Randomise(a, lost[a], ref random);
                    break;
                case OperationKind.ReplaceTold or OperationKind.ReplaceUntold:
                    LostAtLook[look++] = lost[a];
                    lost[a] = 0;
                    break;
            }
        }
    }

    private static double ProbabilityOf(in Operation operation) =>
        operation.Kind == OperationKind.PauliNoise ? operation.Channel.Total : operation.Probability;

    /// <summary>In which of the 64 shots something of this probability happens.</summary>
    private ulong Drawn(int group, ref RandomBits random)
    {
        ulong drawn = 0;
        int position = next[group];
        while (position < Shots)
        {
            drawn |= 1UL << position;
            position += 1 + Gap(group, ref random);
        }

        next[group] = position - Shots;
        return drawn;
    }

    private int Gap(int group, ref RandomBits random) => probabilities[group] >= 1 ? 0 : (int)Math.Min(
        Math.Log(random.NextUnit()) / Quantities.ElementaryFunctions.LogOnePlus(-probabilities[group]), 1 << 29);

    private void Strike(int atom, ulong shots, PauliChannel channel, ref RandomBits random)
    {
        for (; shots != 0; shots &= shots - 1)
        {
            ulong bit = shots & (~shots + 1);
            double chosen = random.NextUnit() * channel.Total;
            x[atom] ^= chosen <= channel.X + channel.Y ? bit : 0;
            z[atom] ^= chosen > channel.X ? bit : 0;
        }
    }

    private void StrikePair(int a, int b, ulong shots, ref RandomBits random)
    {
        for (; shots != 0; shots &= shots - 1)
        {
            ulong bit = shots & (~shots + 1);
            int error = 1 + random.NextBelow(15);
            x[a] ^= (error & 1) != 0 ? bit : 0;
            z[a] ^= (error & 2) != 0 ? bit : 0;
            x[b] ^= (error & 4) != 0 ? bit : 0;
            z[b] ^= (error & 8) != 0 ? bit : 0;
        }
    }

    private void Randomise(int atom, ulong shots, ref RandomBits random)
    {
        if (shots != 0)
        {
            x[atom] ^= random.NextBits() & shots;
            z[atom] ^= random.NextBits() & shots;
        }
    }
}
