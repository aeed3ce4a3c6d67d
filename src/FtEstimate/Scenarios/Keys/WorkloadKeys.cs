using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>The logical size of an algorithm: counts, or the parameters of a generator.</summary>
public static class WorkloadKeys
{
    /// <summary>Name.</summary>
    public static readonly KeyDefinition Name = new(
        "name", ValueKind.Text, "The name printed in reports.", Required: true);

    /// <summary>Logical qubits.</summary>
    public static readonly KeyDefinition LogicalQubits = new(
        "logical_qubits", ValueKind.Positive, "Logical qubits.", Low: 1, Required: true);

    /// <summary>T states.</summary>
    public static readonly KeyDefinition TStates = new(
        "t_states", ValueKind.NotNegative, "T states consumed directly.", Default: 0);

    /// <summary>Toffoli gates.</summary>
    public static readonly KeyDefinition Toffolis = new(
        "toffolis", ValueKind.NotNegative, "Toffoli gates.", Default: 0);

    /// <summary>Rotations.</summary>
    public static readonly KeyDefinition Rotations = new(
        "rotations", ValueKind.NotNegative, "Rotations by arbitrary angles.", Default: 0);

    /// <summary>Error per rotation.</summary>
    public static readonly KeyDefinition RotationError = new(
        "rotation_error", ValueKind.PositiveOrBest, "Error allowed per rotation; \"best\" leaves it to the search.", High: 0.5, DefaultText: "best");

    /// <summary>Sequential reactions.</summary>
    public static readonly KeyDefinition ReactionDepth = new(
        "reaction_depth", ValueKind.Positive, "Sequential reactions, rotations not counted; one per T state and Toffoli when absent.");

    /// <summary>Sequential rotations.</summary>
    public static readonly KeyDefinition RotationDepth = new(
        "rotation_depth", ValueKind.Positive, "Sequential layers of rotations; one per rotation when absent.");

    /// <summary>Layers of logical gates.</summary>
    public static readonly KeyDefinition LogicalLayers = new(
        "logical_layers", ValueKind.Positive, "Layers of logical gates in the transversal style; four per T or Toffoli layer when absent.");

    /// <summary>Shots.</summary>
    public static readonly KeyDefinition Shots = new(
        "shots", ValueKind.Positive, "Complete runs needed.", Low: 1, Default: 1);

    /// <summary>Family of a generator.</summary>
    public static readonly KeyDefinition Family = new(
        "family",
        ValueKind.Text,
        "The algorithm family.",
        Required: true,
        Choices: ["factoring", "spin-lattice"]);

    /// <summary>Bits of the number to factor.</summary>
    public static readonly KeyDefinition Bits = new(
        "bits", ValueKind.Whole, "Bits of the number to factor.", Low: 16, High: 1_000_000, Required: true);

    /// <summary>Rows of the lattice.</summary>
    public static readonly KeyDefinition Rows = new(
        "rows", ValueKind.Whole, "Rows of the lattice.", Low: 1, High: 10_000, Required: true);

    /// <summary>Columns of the lattice.</summary>
    public static readonly KeyDefinition Columns = new(
        "columns", ValueKind.Whole, "Columns of the lattice.", Low: 1, High: 10_000, Required: true);

    /// <summary>Periodic boundary.</summary>
    public static readonly KeyDefinition Periodic = new(
        "periodic", ValueKind.Flag, "Whether opposite edges are joined; false when absent.");

    /// <summary>Coupling.</summary>
    public static readonly KeyDefinition Coupling = new(
        "coupling", ValueKind.Positive, "Strength J of the coupling of neighbours.", Default: 1);

    /// <summary>Field.</summary>
    public static readonly KeyDefinition Field = new(
        "field", ValueKind.NotNegative, "Strength g of the transverse field.", Default: 1);

    /// <summary>Evolution time.</summary>
    public static readonly KeyDefinition Time = new(
        "time_in_inverse_coupling", ValueKind.Positive, "Evolution time in units of 1/J; the coupling is J.", Required: true);

    /// <summary>Product-formula error.</summary>
    public static readonly KeyDefinition TrotterError = new(
        "trotter_error", ValueKind.Positive, "Error of the product formula by its proven bound; give this or steps.", High: 1);

    /// <summary>Steps.</summary>
    public static readonly KeyDefinition Steps = new(
        "steps", ValueKind.Whole, "Steps of the product formula, in place of trotter_error.", Low: 1, High: 1e12);

    /// <summary>Order of the product formula.</summary>
    public static readonly KeyDefinition Order = new(
        "order", ValueKind.Whole, "Order of the product formula, 1 or 2.", Low: 1, High: 2, Default: 2);

    /// <summary>The keys at the top of a workload file.</summary>
    public static readonly TableDefinition Top = new(
        "workload", "The top of a workload file; it holds either [counts] or [generate].", [Name]);

    /// <summary>[counts].</summary>
    public static readonly TableDefinition Counts = new(
        "workload.counts",
        "The counts of an algorithm that was compiled elsewhere.",
        [LogicalQubits, TStates, Toffolis, Rotations, RotationError, ReactionDepth, RotationDepth, LogicalLayers, Shots]);

    /// <summary>[generate] for factoring.</summary>
    public static readonly TableDefinition Factoring = new(
        "workload.generate",
        "Factoring by the counts of Gidney and Ekerå 2021 (arXiv:1905.09749).",
        [Family, Bits, Shots],
        SelectedBy: "family",
        SelectedWhen: "factoring");

    /// <summary>[generate] for spin-lattice dynamics.</summary>
    public static readonly TableDefinition SpinLattice = new(
        "workload.generate",
        "Dynamics of the transverse-field Ising model on a square lattice by a product formula (Childs 2021, arXiv:1912.08854).",
        [Family, Rows, Columns, Periodic, Coupling, Field, Time, TrotterError, Steps, Order, RotationError, Shots],
        SelectedBy: "family",
        SelectedWhen: "spin-lattice");

    /// <summary>The tables.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Top, Counts, Factoring, SpinLattice];
}
