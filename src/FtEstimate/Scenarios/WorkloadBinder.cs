using System.Collections.Immutable;
using FtEstimate.Scenarios.Keys;
using FtEstimate.Workloads;

namespace FtEstimate.Scenarios;

/// <summary>Turns the inputs of a workload into its counts.</summary>
public static class WorkloadBinder
{
    private const string Stated = "stated in the file";

    /// <summary>The workload that checked inputs describe, stated or generated.</summary>
    /// <param name="inputs">Inputs of at least the workload.</param>
    /// <exception cref="InvalidOperationException">A needed input is missing: the inputs were not checked.</exception>
    public static Workload Bind(InputSet inputs)
    {
        string name = new TableInputs(inputs, WorkloadKeys.Top.Path).Text(WorkloadKeys.Name);
        TableInputs generate = new(inputs, WorkloadKeys.Factoring.Path);
        return generate.TextOrNull(WorkloadKeys.Family) switch
        {
            null => FromCounts(name, new TableInputs(inputs, WorkloadKeys.Counts.Path)),
            "factoring" => Named(name, generate, new Factoring(generate.Whole(WorkloadKeys.Bits)).Workload()),
            "spin-lattice" => Named(name, generate, SpinLatticeOf(generate).Workload()),
            string other => throw new InvalidOperationException($"unchecked family {other}"),
        };
    }

    private static Workload FromCounts(string name, TableInputs counts)
    {
        ImmutableArray<Derivation>.Builder derivations = ImmutableArray.CreateBuilder<Derivation>();
        return new Workload(
            name,
            Noted(counts, WorkloadKeys.LogicalQubits, "logical qubits", derivations),
            Noted(counts, WorkloadKeys.TStates, "T states", derivations),
            Noted(counts, WorkloadKeys.Toffolis, "Toffolis", derivations),
            Noted(counts, WorkloadKeys.Rotations, "rotations", derivations),
            counts.NumberOrNull(WorkloadKeys.RotationError),
            counts.NumberOrNull(WorkloadKeys.ReactionDepth),
            counts.NumberOrNull(WorkloadKeys.RotationDepth),
            counts.NumberOrNull(WorkloadKeys.LogicalLayers),
            counts.Number(WorkloadKeys.Shots),
            derivations.ToImmutable());
    }

    private static double Noted(TableInputs counts, KeyDefinition key, string quantity, ImmutableArray<Derivation>.Builder derivations)
    {
        double value = counts.Number(key);
        if (counts.Gives(key))
        {
            derivations.Add(new Derivation(quantity, "", value, Stated));
        }

        return value;
    }

    private static Workload Named(string name, TableInputs generate, Workload generated) => generated with
    {
        Name = name,
        RotationError = generate.NumberOrNull(WorkloadKeys.RotationError),
        Shots = generate.Number(WorkloadKeys.Shots),
    };

    private static SpinLattice SpinLatticeOf(TableInputs generate) => new(
        new SquareLattice(
            generate.Whole(WorkloadKeys.Rows),
            generate.Whole(WorkloadKeys.Columns),
            generate.FlagOr(WorkloadKeys.Periodic, false)),
        generate.Number(WorkloadKeys.Coupling),
        generate.Number(WorkloadKeys.Field),
        generate.Number(WorkloadKeys.Time),
        // not read where steps are given
        generate.NumberOr(WorkloadKeys.TrotterError, 1),
        generate.Whole(WorkloadKeys.Order),
        generate.NumberOrNull(WorkloadKeys.Steps));
}
