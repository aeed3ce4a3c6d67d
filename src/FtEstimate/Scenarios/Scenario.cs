using FtEstimate.Machines;
using FtEstimate.Workloads;

namespace FtEstimate.Scenarios;

/// <summary>One question to the tool: this machine, this workload, this goal, these conventions.</summary>
/// <param name="Title">Printed at the top of the report.</param>
/// <param name="Machine">The machine at its likely values.</param>
/// <param name="Workload">The workload.</param>
/// <param name="Goal">What the run must achieve.</param>
/// <param name="Method">Conventions that are fixed instead of searched.</param>
/// <param name="Inputs">Every input that was given, with its range and source.</param>
public sealed record Scenario(
    string Title,
    Machine Machine,
    Workload Workload,
    Goal Goal,
    Method Method,
    InputSet Inputs);

/// <summary>What the run must achieve.</summary>
/// <param name="FailureProbability">Largest failure probability of one complete run, all causes, in (0, 1).</param>
/// <param name="Prefer">Which of the unbeaten machines is picked.</param>
/// <param name="AtomsAtMost">Limit on the atoms; null: none.</param>
/// <param name="RunSecondsAtMost">Limit on the elapsed time with stops and repeats; null: none.</param>
public sealed record Goal(double FailureProbability, Preference Prefer, double? AtomsAtMost, double? RunSecondsAtMost);

/// <summary>Which of the unbeaten machines is picked.</summary>
public enum Preference
{
    /// <summary>Least atoms times run time.</summary>
    LeastAtomHours,

    /// <summary>Fewest atoms.</summary>
    FewestAtoms,

    /// <summary>Shortest run.</summary>
    ShortestRun,
}

/// <summary>Conventions that are fixed instead of searched; null: searched, or the default.</summary>
/// <param name="Law">Name of the scaling law.</param>
/// <param name="Patch">Atoms per tile: "2d^2-1", "2d^2" or "2(d+1)^2".</param>
/// <param name="Style">"lattice-surgery" or "transversal"; null: both.</param>
/// <param name="Block">"compact", "intermediate" or "fast"; null: all.</param>
/// <param name="Factory">"tile-15-to-1", or a design such as "15-to-1:17,7,7"; null: the catalogue.</param>
/// <param name="FactoryCount">Number of factories; null: searched.</param>
/// <param name="Patches">Tiles of a fixed floor plan, factories excluded; null: the block's formula.</param>
/// <param name="InjectedError">Pauli probability of an injected T state; null: from the ledger.</param>
/// <param name="FailureSplit">"joint": all causes together; "each": every contribution on its own.</param>
/// <param name="Synthesis">Name of the rotation synthesis method.</param>
/// <param name="RoutingFraction">Patches for routing per logical patch in the transversal style.</param>
/// <param name="GatesPerRound">Transversal gates per round; null: searched.</param>
public sealed record Method(
    string Law,
    string Patch,
    string? Style,
    string? Block,
    string? Factory,
    int? FactoryCount,
    double? Patches,
    double? InjectedError,
    string FailureSplit,
    string Synthesis,
    double RoutingFraction,
    double? GatesPerRound);
