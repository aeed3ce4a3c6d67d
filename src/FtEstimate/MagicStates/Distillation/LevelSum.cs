using System.Numerics;
using System.Runtime.CompilerServices;

namespace FtEstimate.MagicStates.Distillation;

/// <summary>What one level of distillation delivers.</summary>
/// <param name="Acceptance">Probability that a batch passes its checks.</param>
/// <param name="OutputError">Infidelity of a batch that passed, divided by its number of outputs.</param>
internal readonly record struct LevelResult(double Acceptance, double OutputError);

/// <summary>
/// Sums the error patterns of one level: spreads the distribution of Pauli patterns through the schedule and adds up the bad ones that
/// pass. Never one minus a fidelity, so that 1e-25 is as exact as 1e-5.
/// </summary>
/// <remarks>
/// Z errors of single qubits commute with everything and are merged into one event per qubit at the end, as are X errors of outputs that
/// meet no more rotation. X errors before a rotation are followed in order of time.
/// </remarks>
internal static class LevelSum
{
    private const int MostQubits = 7;

    /// <summary>Acceptance and output error of a level.</summary>
    public static LevelResult Of(LevelPlan plan, in LevelNoise noise)
    {
        int qubits = plan.Schedule.Qubits;
        Span<double> lateZ = stackalloc double[MostQubits];
        Span<double> lateX = stackalloc double[MostQubits];
        lateZ.Clear();
        lateX.Clear();

        // 8 kB for five qubits, 128 kB for seven: fits on any stack and costs no collection
        PauliDistribution patterns = new(stackalloc double[PauliDistribution.Size(qubits)], qubits);
        foreach (StepPlan step in plan.Steps)
        {
            Rotate(step.Rotations, noise, patterns, lateZ);
            Wait(step, noise, patterns, lateX, lateZ);
        }

        return Collect(plan, patterns, lateX, lateZ);
    }

    /// <summary>
    /// A floor of the output error of a level with one output, from its last-minute errors and a protocol error.
    /// </summary>
    /// <remarks>
    /// Z errors of the output, and X errors after its last rotation, are independent of the checks, so the output is at least as bad as
    /// they make it, whatever else happened. The protocol error must come from rotations at most as faulty as the true ones: by the second
    /// Griffiths inequality (Griffiths 1967) an error conditioned on even checks only grows with each flip probability below one half.
    /// </remarks>
    /// <param name="plan">The schedule; one output.</param>
    /// <param name="noise">Its noise.</param>
    /// <param name="protocolError">Z error of the output if nothing but the rotations failed, each with the least probability of all.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static double OutputErrorFloor(LevelPlan plan, in LevelNoise noise, double protocolError)
    {
        double x = 0;
        double z = protocolError;
        int output = 1 << plan.OutputBits[0];
        foreach (StepPlan step in plan.Steps)
        {
            foreach (RotationPlan rotation in step.Rotations)
            {
                if ((rotation.Disturbs & output) != 0)
                {
                    z = EventProbability.EitherOr(z, DisturbanceOf(rotation, noise));
                }
            }

            foreach (StoragePlan wait in step.Waits)
            {
                if (wait.Output)
                {
                    double stored = OutputWait(wait, noise);
                    z = EventProbability.EitherOr(z, stored);
                    x = wait.Fate == StoredXFate.OnOutput ? EventProbability.EitherOr(x, stored) : x;
                }
            }
        }

        return z + x * (0.5 - z);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Rotate(RotationPlan[] rotations, in LevelNoise noise, PauliDistribution patterns, Span<double> lateZ)
    {
        foreach (RotationPlan rotation in rotations)
        {
            double error = EventProbability.Bounded(noise.RotationError(rotation.Single, rotation.SpansX, rotation.SpansZ));
            if (rotation.Single && !rotation.MeetsX)
            {
                Merge(ref lateZ[BitOperations.TrailingZeroCount(rotation.Mask)], error);
            }
            else
            {
                patterns.Rotate(rotation.Mask, error, rotation.Rows, rotation.Columns);
            }

            for (int disturbed = rotation.Disturbs; disturbed != 0; disturbed &= disturbed - 1)
            {
                Merge(ref lateZ[BitOperations.TrailingZeroCount(disturbed)], DisturbanceOf(rotation, noise));
            }
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Wait(
        StepPlan step, in LevelNoise noise, PauliDistribution patterns, Span<double> lateX, Span<double> lateZ)
    {
        double checkX = EventProbability.Bounded(noise.CheckStoredX);
        double checkZ = EventProbability.Bounded(noise.CheckStoredZ);
        Span<double> flips = stackalloc double[MostQubits];
        flips.Clear();
        foreach (StoragePlan wait in step.Waits)
        {
            double x = wait.Output ? OutputWait(wait, noise) : checkX;
            Merge(ref lateZ[wait.Bit], wait.Output ? x : checkZ);
            switch (wait.Fate)
            {
                case StoredXFate.MeetsRotation:
                    Merge(ref flips[wait.Bit], x);
                    break;
                case StoredXFate.OnOutput:
                    Merge(ref lateX[wait.Bit], x);
                    break;
                default:
                    break;
            }
        }

        if (step.FlipsX)
        {
            patterns.FlipX(flips, step.Rows);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static LevelResult Collect(LevelPlan plan, PauliDistribution patterns, ReadOnlySpan<double> lateX, ReadOnlySpan<double> lateZ)
    {
        DistillationSchedule schedule = plan.Schedule;
        int outputs = schedule.Outputs;
        int rows = 1 << schedule.Qubits;
        int columns = patterns.Columns;
        Span<double> infidelity = stackalloc double[1 << (2 * outputs)];
        OutputInfidelity(plan, lateX, lateZ, infidelity);

        // the same numbers, laid out for whole rows: one weight per x for every z of the outputs
        Span<double> weights = stackalloc double[columns << outputs];
        ReadOnlySpan<int> outputPattern = plan.OutputPattern;
        for (int z = 0; z < 1 << outputs; z++)
        {
            Span<double> row = weights.Slice(z * columns, columns);
            row.Clear();
            for (int x = 0; x < outputPattern.Length; x++)
            {
                row[x] = infidelity[outputPattern[x] + (z << outputs)];
            }
        }

        double accepted = 0;
        double bad = 0;
        for (int row = 0; row < rows; row++)
        {
            // the check passes if late Z errors undo those of the pattern
            double passes = 1;
            for (int bit = 0; bit < schedule.Qubits; bit++)
            {
                if (!plan.IsOutput(bit))
                {
                    passes *= ((row >> bit) & 1) != 0 ? lateZ[bit] : 1 - lateZ[bit];
                }
            }

            accepted += passes * patterns.Row(row);
            bad += passes * patterns.WeightedRow(row, weights.Slice(outputPattern[row] * columns, columns));
        }

        return new LevelResult(Math.Min(1, accepted), bad / accepted / outputs);
    }

    // What each pattern on the outputs counts once the late errors have struck.
    private static void OutputInfidelity(
        LevelPlan plan, ReadOnlySpan<double> lateX, ReadOnlySpan<double> lateZ, Span<double> infidelity)
    {
        int outputs = plan.Schedule.Outputs;
        plan.Schedule.OutputInfidelity.CopyTo(infidelity);

        for (int output = 0; output < outputs; output++)
        {
            Mix(infidelity, 1 << output, lateX[plan.OutputBits[output]]);
            Mix(infidelity, 1 << (outputs + output), lateZ[plan.OutputBits[output]]);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Mix(Span<double> values, int bit, double probability)
    {
        for (int i = 0; i < values.Length; i++)
        {
            if ((i & bit) == 0)
            {
                double moved = probability * (values[i | bit] - values[i]);
                values[i] += moved;
                values[i | bit] -= moved;
            }
        }
    }

    private static double OutputWait(in StoragePlan wait, in LevelNoise noise) =>
        EventProbability.Bounded(wait.HandedOver ? noise.OutputHandedOver : noise.OutputStored);

    private static double DisturbanceOf(in RotationPlan rotation, in LevelNoise noise) =>
        EventProbability.Bounded(noise.Disturbance(rotation.SpansX, rotation.SpansZ));

    private static void Merge(ref double total, double probability) => total = EventProbability.EitherOr(total, probability);
}
