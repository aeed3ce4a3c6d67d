using System.Collections.Immutable;
using FtEstimate.Reports.Estimate;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Figures;

/// <summary>The figures of the answer table.</summary>
internal static class AnswerFigures
{
    private static readonly FigureKind Atoms = new(
        "atoms", "Atoms in traps", FigureUnit.Atoms, "Everything held at once: data, checks, factories and spares.");

    private static readonly FigureKind Run = new(
        "run_s", "Run time of one shot", FigureUnit.Seconds, "One complete run of the algorithm, if nothing interrupts it.");

    private static readonly FigureKind Elapsed = new(
        "elapsed_s", "Expected elapsed time", FigureUnit.Seconds, "On the wall clock: all shots, with calibration, stops and repeats.");

    private static readonly FigureKind Failure = new(
        "failure_probability", "Failure probability", FigureUnit.Probability, "Chance that one shot that ran to its end is wrong, all causes.");

    private static readonly FigureKind Distance = new(
        "code_distance", "Code distance", FigureUnit.Count, "Data atoms along one side of a patch, which holds one logical qubit. Larger is safer.");

    private static readonly FigureKind Suppression = new(
        "suppression", "Suppression Λ", FigureUnit.Number, "How many times rarer logical errors become at the next larger distance.");

    private static readonly FigureKind Noise = new(
        "noise_strength", "Noise strength", FigureUnit.Number, "All physical errors together. At 1 (the threshold) no patch size helps.");

    private static readonly FigureKind Round = new(
        "round_s", "Syndrome round", FigureUnit.Seconds, "One cycle in which all checks are measured once.");

    private static readonly FigureKind Readout = new(
        "readout", "Readout", FigureUnit.Words, "How the checks are read while the data atoms wait.");

    private static readonly FigureKind Surgery = new(
        "style", "Style of logic", FigureUnit.Words, "How logical gates are done: patches are merged and split.");

    private static readonly FigureKind Transversal = new(
        "style", "Style of logic", FigureUnit.Words, "Patches are moved onto each other; a T lane takes in one magic state at a time.");

    private static readonly FigureKind LimitedBy = new(
        "limited_by", "Pace set by", FigureUnit.Words, "What would have to be faster for a shorter run.");

    private static readonly FigureKind Loss = new(
        "lost_atoms_per_s", "Atoms lost", FigureUnit.PerSecond, "Atoms to be replaced while the machine runs.");

    /// <summary>The figures of a machine, the most important first.</summary>
    public static ImmutableArray<Figure> Of(SearchSpace space, SizedMachine machine) =>
    [
        new(Atoms, machine.Atoms.Total),
        new(Run, machine.RunSeconds),
        new(Elapsed, machine.Elapsed.Seconds, Words: "does not finish", Note: ElapsedNote(machine)),
        new(Failure, machine.Failure.Total, Note: $"({Quantities.Show.Probability(space.Scenario.Goal.FailureProbability)} allowed)"),
        new(Distance, machine.Distance),
        new(Suppression, machine.Suppression.Factor, Note: $"from distance {machine.Suppression.FromDistance} to {machine.Suppression.ToDistance}"),
        new(Noise, machine.Strength.Mean, Note: "of the threshold"),
        new(Round, machine.Clock.RoundSeconds),
        Figure.Of(Readout, Words.Readout(machine.Point)),
        Figure.Of(machine.Layout.Style == LogicStyle.LatticeSurgery ? Surgery : Transversal, Words.Style(machine.Layout)),
        Figure.Of(LimitedBy, machine.RunSeconds > 0 ? Words.Pace(machine) : "nothing: no timed work is stated"),
        new(Loss, machine.LossPerSecond, Note: DeliveryNote(space)),
    ];

    private static string ElapsedNote(SizedMachine machine) =>
        machine.Elapsed.Seconds is not null && !machine.Elapsed.FinishesInPractice ? "(does not finish in practice)" : "";

    private static string DeliveryNote(SearchSpace space) => space.Scenario.Machine.Supply.AtomsPerSecond is { } delivered
        ? $"({Quantities.Show.Atoms(delivered)} delivered)"
        : "(delivery not stated)";
}
