using System.Collections.Immutable;
using FtEstimate.Noise;

namespace FtEstimate.Simulation.Circuits;

/// <summary>How the error rates of the textbook circuit follow from one number p.</summary>
/// <param name="Name">The name used on the command line.</param>
/// <param name="OneQubit">Gates on one atom.</param>
/// <param name="WaitingPerLayer">An atom without a gate in a layer of gates.</param>
/// <param name="WaitingInReadout">A data atom while checks are read and reset.</param>
/// <param name="ResetFlip">Reset to the wrong state.</param>
/// <param name="ReadoutFlip">Wrong result.</param>
/// <param name="Pair">Gates on two atoms.</param>
public sealed record UniformNoise(
    string Name, double OneQubit, double WaitingPerLayer, double WaitingInReadout, double ResetFlip, double ReadoutFlip, double Pair)
{
    /// <summary>Every place errs with probability p; the noise kind SD of O'Rourke 2025 (arXiv:2409.14765).</summary>
    public static UniformNoise EveryPlace(double p) => new("every-place", p, p, p, p, p, p);

    /// <summary>
    /// Readout and reset are slow and bad, one-qubit gates and short waits good: SI of O'Rourke 2025 (arXiv:2409.14765), after Gidney 2021
    /// (arXiv:2108.10457).
    /// </summary>
    public static UniformNoise SlowReadout(double p) => new("slow-readout", p / 10, p / 10, 2 * p, 2 * p, 5 * p, p);
}

/// <summary>
/// The textbook memory circuit: CNOT gates in four layers, Hadamards on the X checks before and after, checks read and reset in one layer; every place errs
/// (O'Rourke 2025, arXiv:2409.14765).
/// </summary>
/// <remarks>
/// X checks take their partners in the order NE, NW, SE, SW, Z checks NE, SE, NW, SW: the last two lie across the logical operator that they could
/// shorten (Dennis 2002, arXiv:quant-ph/0110143). The mirror image does as well but differs by some per cent at small distances.
/// </remarks>
public static class TextbookCircuit
{
    private const int NoAtom = -1;

    private static readonly ImmutableArray<Corner> OrderX = [Corner.NorthEast, Corner.NorthWest, Corner.SouthEast, Corner.SouthWest];
    private static readonly ImmutableArray<Corner> OrderZ = [Corner.NorthEast, Corner.SouthEast, Corner.NorthWest, Corner.SouthWest];

    /// <summary>The circuit of a memory experiment.</summary>
    /// <param name="distance">Code distance, odd, at least 3.</param>
    /// <param name="rounds">Rounds, at least 1.</param>
    /// <param name="basis">Basis of preparation and reading.</param>
    /// <param name="noise">Error rates.</param>
    public static Circuit Of(int distance, int rounds, PauliBasis basis, UniformNoise noise) => Of(distance, rounds, basis, noise, NoAtom);

    /// <summary>The same, where one data atom has no noise while checks are read: reference values of another implementation are of that kind.</summary>
    internal static Circuit Of(int distance, int rounds, PauliBasis basis, UniformNoise noise, int atomThatDoesNotWait)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(rounds, 1);
        RotatedPatch patch = new(distance);
        MemoryCircuitBuilder builder = new(patch, rounds, basis);
        builder.PrepareData(noise.ResetFlip);
        for (int check = 0; check < patch.Checks.Length; check++)
        {
            ResetCheck(builder, check, noise);
        }

        builder.EndLayer();
        for (int round = 0; round < rounds; round++)
        {
            TurnLayer(builder, patch, noise);
            for (int slot = 0; slot < OrderX.Length; slot++)
            {
                PairLayer(builder, patch, slot, noise);
            }

            TurnLayer(builder, patch, noise);
            ReadLayer(builder, patch, noise, atomThatDoesNotWait, resetAgain: round < rounds - 1);
        }

        builder.ReadData(noise.ReadoutFlip);
        return builder.Build();
    }

    private static void ResetCheck(MemoryCircuitBuilder builder, int check, UniformNoise noise)
    {
        builder.Do(OperationKind.ResetZ, builder.CheckAtom(check));
        builder.Noise(builder.CheckAtom(check), MemoryCircuitBuilder.FlipOf(PauliBasis.Z, noise.ResetFlip));
    }

    private static void TurnLayer(MemoryCircuitBuilder builder, RotatedPatch patch, UniformNoise noise)
    {
        PauliChannel gate = PauliChannel.Depolarising(noise.OneQubit);
        PauliChannel waiting = PauliChannel.Depolarising(noise.WaitingPerLayer);
        for (int atom = 0; atom < patch.DataCount; atom++)
        {
            builder.Noise(atom, waiting);
        }

        for (int check = 0; check < patch.Checks.Length; check++)
        {
            bool turned = patch.Checks[check].Basis == PauliBasis.X;
            if (turned)
            {
                builder.Do(OperationKind.Hadamard, builder.CheckAtom(check));
            }

            builder.Noise(builder.CheckAtom(check), turned ? gate : waiting);
        }

        builder.EndLayer();
    }

    private static void PairLayer(MemoryCircuitBuilder builder, RotatedPatch patch, int slot, UniformNoise noise)
    {
        bool[] busy = new bool[builder.AtomCount];
        for (int check = 0; check < patch.Checks.Length; check++)
        {
            PatchCheck place = patch.Checks[check];
            bool isX = place.Basis == PauliBasis.X;
            if (place.DataAt(isX ? OrderX[slot] : OrderZ[slot]) is not { } data)
            {
                continue;
            }

            int atom = builder.CheckAtom(check);
            int control = isX ? atom : data;
            int target = isX ? data : atom;
            builder.Do(OperationKind.ControlledX, control, target);
            builder.PairNoise(control, target, noise.Pair);
            busy[control] = true;
            busy[target] = true;
        }

        for (int atom = 0; atom < busy.Length; atom++)
        {
            if (!busy[atom])
            {
                builder.Noise(atom, PauliChannel.Depolarising(noise.WaitingPerLayer));
            }
        }

        builder.EndLayer();
    }

    private static void ReadLayer(MemoryCircuitBuilder builder, RotatedPatch patch, UniformNoise noise, int atomThatDoesNotWait, bool resetAgain)
    {
        for (int check = 0; check < patch.Checks.Length; check++)
        {
            builder.Noise(builder.CheckAtom(check), MemoryCircuitBuilder.FlipOf(PauliBasis.Z, noise.ReadoutFlip));
            builder.Do(OperationKind.MeasureZ, builder.CheckAtom(check));
        }

        for (int atom = 0; atom < patch.DataCount; atom++)
        {
            builder.Noise(atom, PauliChannel.Depolarising(atom == atomThatDoesNotWait ? 0 : noise.WaitingInReadout));
        }

        if (resetAgain)
        {
            builder.EndLayer();
            for (int check = 0; check < patch.Checks.Length; check++)
            {
                ResetCheck(builder, check, noise);
            }
        }

        builder.EndLayer();
    }
}
