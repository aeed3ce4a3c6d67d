using System.Numerics;
using System.Runtime.CompilerServices;

namespace FtEstimate.MagicStates.Distillation;

/// <summary>Where an X error of a waiting qubit goes.</summary>
internal enum StoredXFate
{
    /// <summary>The qubit meets no more rotation and is measured in X: nobody sees it.</summary>
    Unseen,

    /// <summary>It meets no more rotation but stays on an output.</summary>
    OnOutput,

    /// <summary>It meets a later rotation.</summary>
    MeetsRotation,
}

/// <summary>A rotation with everything about it that does not depend on noise.</summary>
/// <param name="Mask">Its qubits as bits of a pattern.</param>
/// <param name="Single">Whether it acts on one qubit alone.</param>
/// <param name="MeetsX">Whether an X error can have come before it.</param>
/// <param name="SpansX">Length of the ancilla patch in dX.</param>
/// <param name="SpansZ">Length of the ancilla patch in dZ, added to that.</param>
/// <param name="Disturbs">Disturbed outputs as bits of a pattern.</param>
/// <param name="Rows">Patterns z are below this number after it.</param>
/// <param name="Columns">Patterns x are below this number before it (at least one vector).</param>
internal readonly record struct RotationPlan(
    int Mask, bool Single, bool MeetsX, int SpansX, int SpansZ, int Disturbs, int Rows, int Columns);

/// <summary>A wait of one qubit.</summary>
/// <param name="Bit">Its bit in a pattern.</param>
/// <param name="Output">Whether it is an output.</param>
/// <param name="HandedOver">Whether it waits while it leaves the factory rather than for one step.</param>
/// <param name="Fate">What becomes of an X error.</param>
internal readonly record struct StoragePlan(int Bit, bool Output, bool HandedOver, StoredXFate Fate);

/// <summary>The rotations of one step, then the waits.</summary>
/// <param name="Rotations">Rotations of the step.</param>
/// <param name="Waits">Waits at its end.</param>
/// <param name="FlipsX">Whether a wait has an X error that meets a later rotation.</param>
/// <param name="Rows">Patterns z are below this number after the rotations.</param>
internal sealed record StepPlan(RotationPlan[] Rotations, StoragePlan[] Waits, bool FlipsX, int Rows);

/// <summary>
/// A schedule prepared for summing: qubits renumbered in the order in which they take part, so that early steps touch few
/// patterns, and the fate of each X error known. Made once per schedule.
/// </summary>
internal sealed class LevelPlan
{
    private const int VectorLanes = 4;

    private readonly int[] _bitOfQubit;

    public LevelPlan(DistillationSchedule schedule)
    {
        Schedule = schedule;
        _bitOfQubit = BitsInOrderOfUse(schedule);
        Steps = new StepPlan[schedule.Steps.Length];
        OutputBits = _bitOfQubit.AsSpan(1, schedule.Outputs).ToArray();
        OutputPattern = OutputPatterns(schedule.Qubits, OutputBits);
        int rows = 1;
        int columns = VectorLanes;
        int maybeX = 0;
        for (int step = 0; step < Steps.Length; step++)
        {
            DistillationStep table = schedule.Steps[step];
            RotationPlan[] rotations = new RotationPlan[table.Rotations.Length];
            for (int i = 0; i < rotations.Length; i++)
            {
                Rotation rotation = table.Rotations[i];
                int mask = Mask(rotation.Qubits);
                bool single = rotation.Qubits.Count == 1;
                bool meetsX = (mask & maybeX) != 0;
                rows = single && !meetsX ? rows : Math.Max(rows, PowerAbove(mask));
                rotations[i] = new RotationPlan(
                    mask, single, meetsX, rotation.SpansX, rotation.SpansZ, Mask(rotation.Disturbs), rows, columns);
            }

            StoragePlan[] waits = new StoragePlan[table.Stored.Count + table.HandedOver.Count];
            int next = 0;
            int flips = 0;
            for (int qubit = 1; qubit <= schedule.Qubits; qubit++)
            {
                StoragePlan wait = new(
                    _bitOfQubit[qubit], Output: qubit <= schedule.Outputs, HandedOver: false, FateOfX(schedule, step, qubit));
                bool stored = table.Stored.Contains(qubit);
                bool handedOver = table.HandedOver.Contains(qubit);
                if (stored)
                {
                    waits[next++] = wait;
                }

                if (handedOver)
                {
                    waits[next++] = wait with { HandedOver = true };
                }

                if ((stored || handedOver) && wait.Fate == StoredXFate.MeetsRotation)
                {
                    flips |= 1 << wait.Bit;
                }
            }

            maybeX |= flips;
            columns = Math.Max(columns, PowerAbove(maybeX));
            Steps[step] = new StepPlan(rotations, waits, FlipsX: flips != 0, rows);
        }
    }

    public DistillationSchedule Schedule { get; }

    public StepPlan[] Steps { get; }

    /// <summary>The bit of each output in a pattern, first output first.</summary>
    public int[] OutputBits { get; }

    /// <summary>For every pattern of all qubits the pattern on the outputs, first output in the lowest bit.</summary>
    public int[] OutputPattern { get; }

    /// <summary>Whether a bit of a pattern belongs to an output.</summary>
    public bool IsOutput(int bit) => OutputPattern[1 << bit] != 0;

    /// <summary>The least probability with which any rotation of the schedule fails.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public double LeastRotationError(in LevelNoise noise)
    {
        double least = 0.5;
        foreach (StepPlan step in Steps)
        {
            foreach (RotationPlan rotation in step.Rotations)
            {
                least = Math.Min(least, noise.RotationError(rotation.Single, rotation.SpansX, rotation.SpansZ));
            }
        }

        return least;
    }

    private static int[] OutputPatterns(int qubits, int[] outputBits)
    {
        int[] patterns = new int[1 << qubits];
        for (int pattern = 0; pattern < patterns.Length; pattern++)
        {
            for (int output = 0; output < outputBits.Length; output++)
            {
                patterns[pattern] |= ((pattern >> outputBits[output]) & 1) << output;
            }
        }

        return patterns;
    }

    private static int PowerAbove(int mask) => mask == 0 ? 1 : 2 << BitOperations.Log2((uint)mask);

    private static StoredXFate FateOfX(DistillationSchedule schedule, int step, int qubit)
    {
        for (int later = step + 1; later < schedule.Steps.Length; later++)
        {
            foreach (Rotation rotation in schedule.Steps[later].Rotations)
            {
                if (rotation.Qubits.Contains(qubit))
                {
                    return StoredXFate.MeetsRotation;
                }
            }
        }

        return qubit <= schedule.Outputs ? StoredXFate.OnOutput : StoredXFate.Unseen;
    }

    private static int[] BitsInOrderOfUse(DistillationSchedule schedule)
    {
        int[] bits = new int[schedule.Qubits + 1];
        QubitSet seen = QubitSet.None;
        int next = 0;
        foreach (DistillationStep step in schedule.Steps)
        {
            QubitSet used = step.Stored;
            foreach (Rotation rotation in step.Rotations)
            {
                used |= rotation.Qubits;
            }

            for (int qubit = 1; qubit <= schedule.Qubits; qubit++)
            {
                if (used.Contains(qubit) && !seen.Contains(qubit))
                {
                    bits[qubit] = next++;
                }
            }

            seen |= used;
        }

        return bits;
    }

    private int Mask(QubitSet qubits)
    {
        int mask = 0;
        for (int qubit = 1; qubit < _bitOfQubit.Length; qubit++)
        {
            mask |= qubits.Contains(qubit) ? 1 << _bitOfQubit[qubit] : 0;
        }

        return mask;
    }
}
