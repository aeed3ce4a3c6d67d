using System.Collections.Immutable;
using FtEstimate.SurfaceCode;
using FtEstimate.Workloads;

namespace FtEstimate.Scenarios.Keys;

/// <summary>Conventions that a scenario fixes instead of leaving them to the search.</summary>
public static class MethodKeys
{
    /// <summary>Scaling law.</summary>
    public static readonly KeyDefinition Law = new(
        "law",
        ValueKind.Text,
        "The law from physical to logical errors.",
        DefaultText: "simulated",
        Choices: [.. ScalingLaws.All.Select(law => law.Name)]);

    /// <summary>Atoms per tile.</summary>
    public static readonly KeyDefinition Patch = new(
        "patch",
        ValueKind.Text,
        "Atoms of a tile of code distance d: bare, as in Litinski 2019, or with spacing.",
        DefaultText: "2d^2-1",
        Choices: [.. PatchLayout.All.Select(layout => layout.Name)]);

    /// <summary>How logic is done.</summary>
    public static readonly KeyDefinition Style = new(
        "style",
        ValueKind.Text,
        "How logical gates are done; both are tried when absent.",
        Choices: ["lattice-surgery", "transversal"]);

    /// <summary>Floor plan.</summary>
    public static readonly KeyDefinition Block = new(
        "block",
        ValueKind.Text,
        "Floor plan of the logical qubits for lattice surgery (Litinski 2019, arXiv:1808.02892); all are tried when absent.",
        Choices: ["compact", "intermediate", "fast"]);

    /// <summary>Magic-state factory.</summary>
    public static readonly KeyDefinition Factory = new(
        "factory",
        ValueKind.Text,
        "The magic-state factory: \"tile-15-to-1\" or a design such as \"15-to-1:17,7,7\"; searched when absent.");

    /// <summary>Number of factories.</summary>
    public static readonly KeyDefinition FactoryCount = new(
        "factory_count", ValueKind.Whole, "Number of factories; searched when absent.", Low: 1, High: 1_000_000);

    /// <summary>Tiles of a fixed floor plan.</summary>
    public static readonly KeyDefinition Patches = new(
        "patches", ValueKind.Positive, "Tiles outside the factories, in place of the formula of the floor plan.", Low: 1);

    /// <summary>Error of an injected state.</summary>
    public static readonly KeyDefinition InjectedError = new(
        "injected_error", ValueKind.Probability, "Pauli probability of an injected magic state; from the machine's errors when absent.", High: 0.5);

    /// <summary>How failures add up.</summary>
    public static readonly KeyDefinition FailureSplit = new(
        "failure_split",
        ValueKind.Text,
        "Whether all causes of failure share the goal, or each one must meet it on its own.",
        DefaultText: "joint",
        Choices: ["joint", "each"]);

    /// <summary>Rotation synthesis.</summary>
    public static readonly KeyDefinition Synthesis = new(
        "synthesis",
        ValueKind.Text,
        "How rotations are made from T gates.",
        DefaultText: "repeat-until-success",
        Choices: [.. RotationSynthesis.All.Select(method => method.Name)]);

    /// <summary>Routing patches in the transversal style.</summary>
    public static readonly KeyDefinition RoutingFraction = new(
        "routing_fraction", ValueKind.NotNegative, "Patches for routing per logical patch in the transversal style.", High: 100, Default: 0.5);

    /// <summary>Transversal gates per round.</summary>
    public static readonly KeyDefinition GatesPerRound = new(
        "gates_per_round", ValueKind.Positive, "Transversal gates per syndrome round; searched when absent.", High: 100);

    /// <summary>[method].</summary>
    public static readonly TableDefinition Method = new(
        "method",
        "Conventions that are fixed instead of searched.",
        [Law, Patch, Style, Block, Factory, FactoryCount, Patches, InjectedError, FailureSplit, Synthesis, RoutingFraction, GatesPerRound]);

    /// <summary>The table.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Method];
}
