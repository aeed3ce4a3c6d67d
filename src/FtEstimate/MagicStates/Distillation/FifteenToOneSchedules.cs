using static FtEstimate.MagicStates.Distillation.QubitSet;

namespace FtEstimate.MagicStates.Distillation;

/// <summary>The step tables of 15-to-1 at both levels (Litinski 2019, arXiv:1905.06903): qubit 1 is the output, 2 to 5 are checks.</summary>
internal static class FifteenToOneSchedules
{
    private static readonly QubitSet Output = Of(1);
    private static readonly QubitSet Checks = Range(2, 5);
    private static readonly QubitSet All = Range(1, 5);

    /// <summary>Fed with injected states: six steps of dm rounds. Rotations of one qubit need no ancilla patch.</summary>
    public static DistillationSchedule FirstLevel { get; } = Schedule(
        Step(Of(2, 3, 4), Turn(Of(2), 0, 0), Turn(Of(3), 0, 0), Turn(Of(4), 0, 0), Turn(Of(2, 3, 4), 0, 3)),
        Step(Range(1, 4), Turn(Of(1, 2, 3), 1, 2), Turn(Of(1, 2, 4), 1, 3)),
        Step(All, Turn(Of(1, 3, 4), 1, 3), Turn(Of(1, 4, 5), 1, 4), Turn(Of(5), 0, 0)),
        Step(All, Turn(Of(1, 2, 5), 1, 4), Turn(Of(1, 3, 5), 1, 4)),
        LastOfOutput(Turn(All, 1, 4), Turn(Of(3, 4, 5), 0, 3)),
        Step(Checks, Turn(Of(2, 4, 5), 0, 4), Turn(Of(2, 3, 5), 0, 4)));

    /// <summary>Fed by level-1 factories: eight steps; the paper counts 7.5 step times per batch.</summary>
    public static DistillationSchedule SecondLevel { get; } = Schedule(
        Step(Of(2, 3), Turn(Of(2), 1, 1), Turn(Of(3), 0, 3)),
        Step(Checks, Turn(Of(4), 1, 3), Turn(Of(5), 0, 1)),
        Step(All, Turn(Of(1, 2, 3), 1, 2), Turn(Of(2, 3, 4), 0, 4)),
        Step(All, Turn(Of(1, 3, 4), 1, 3), Turn(Of(1, 2, 4), 1, 4)),
        Step(All, Turn(Of(1, 2, 5), 1, 4), Turn(Of(1, 4, 5), 1, 4)),
        Step(All, Turn(Of(1, 3, 5), 1, 4), Turn(All, 1, 4)),
        // the ancilla of {2,4,5} passes along the output while that is handed over
        LastOfOutput(Turn(Of(2, 4, 5), 1, 4) with { Disturbs = Output }, Turn(Of(3, 4, 5), 0, 3)),
        Step(Of(2, 3, 5), Turn(Of(2, 3, 5), 0, 4)));

    private static DistillationSchedule Schedule(params DistillationStep[] steps) =>
        new(Outputs: 1, Qubits: 5, steps, DistillationSchedule.InfidelityOfTStates(1));

    private static DistillationStep Step(QubitSet stored, params Rotation[] rotations) => new(rotations, stored, None);

    private static DistillationStep LastOfOutput(params Rotation[] rotations) => new(rotations, Checks, Output);

    private static Rotation Turn(QubitSet qubits, int spansX, int spansZ) =>
        new(qubits, spansX, spansZ, qubits.Overlaps(Output) ? Output : None);
}
