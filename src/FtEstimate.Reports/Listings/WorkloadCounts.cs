using System.Collections.Immutable;
using FtEstimate.Reports.Figures;
using FtEstimate.Sizing;
using FtEstimate.Workloads;

namespace FtEstimate.Reports.Listings;

/// <summary>The figures of a workload.</summary>
internal static class WorkloadCounts
{
    private static readonly FigureKind Qubits = new("logical_qubits", "Logical qubits", FigureUnit.Count);
    private static readonly FigureKind TStates = new("t_states", "T states used directly", FigureUnit.Count);
    private static readonly FigureKind Toffolis = new("toffolis", "Toffoli gates", FigureUnit.Count);
    private static readonly FigureKind Rotations = new("rotations", "Rotations by arbitrary angles", FigureUnit.Count);
    private static readonly FigureKind RotationError = new("rotation_error", "Error allowed per rotation", FigureUnit.Probability);
    private static readonly FigureKind Depth = new("reaction_depth", "Decisions in sequence, rotations apart", FigureUnit.Count);
    private static readonly FigureKind RotationDepth = new("rotation_depth", "Layers of rotations in sequence", FigureUnit.Count);
    private static readonly FigureKind Layers = new("logical_layers", "Layers of logical gates", FigureUnit.Count);
    private static readonly FigureKind Shots = new("shots", "Complete runs needed", FigureUnit.Count);

    /// <summary>The counts as given or generated.</summary>
    public static ImmutableArray<Figure> Of(Workload workload) =>
    [
        new(Qubits, workload.LogicalQubits),
        new(TStates, workload.TStates),
        new(Toffolis, workload.Toffolis),
        new(Rotations, workload.Rotations),
        new(RotationError, workload.RotationError, Words: "chosen by the sizing"),
        new(Depth, workload.ReactionDepth, Words: "one per T state and Toffoli"),
        new(RotationDepth, workload.RotationDepth, Words: "one per rotation"),
        new(Layers, workload.LogicalLayers, Words: "not stated"),
        new(Shots, workload.Shots),
    ];
}

/// <summary>What the rotations of a workload cost by one method of synthesis.</summary>
/// <param name="Method">The method.</param>
/// <param name="RotationError">Error of one rotation.</param>
/// <param name="TPerRotation">T states of one rotation.</param>
/// <param name="TStates">T states of the whole workload.</param>
internal sealed record SynthesisCost(RotationSynthesis Method, double RotationError, double TPerRotation, double TStates)
{
    /// <summary>Error of all rotations together at which the methods are compared when the workload states none.</summary>
    public const double ComparedAt = 0.01;

    /// <summary>One row per method; none without rotations.</summary>
    public static ImmutableArray<SynthesisCost> Of(Workload workload)
    {
        if (!(workload.Rotations > 0))
        {
            return [];
        }

        double error = workload.RotationError ?? Math.Min(ComparedAt / workload.Rotations, ComparedAt);
        var costs = ImmutableArray.CreateBuilder<SynthesisCost>(RotationSynthesis.All.Length);
        foreach (RotationSynthesis method in RotationSynthesis.All)
        {
            TStateDemand demand = TStateDemand.For(workload, method, error);
            costs.Add(new SynthesisCost(method, error, demand.TPerRotation, demand.TStates));
        }

        return costs.ToImmutable();
    }
}
