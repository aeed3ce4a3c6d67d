using FtEstimate.Workloads;

namespace FtEstimate.Sizing;

/// <summary>How many T states a workload consumes, once the error of its rotations is chosen.</summary>
/// <param name="TStates">T states in all: stated ones, four per Toffoli (Jones 2013, arXiv:1212.5069), and those of the rotations.</param>
/// <param name="ReactionDepth">Sequential reactions.</param>
/// <param name="LogicalLayers">Layers of logical gates, for the transversal style.</param>
/// <param name="StatedLayers">Layers of logical gates that the workload states; 0: none, Clifford gates are absorbed by lattice surgery.</param>
/// <param name="RotationError">Error per rotation; 0 when there are none.</param>
/// <param name="TPerRotation">T states per rotation; 0 when there are none.</param>
/// <param name="SynthesisFailure">Error of all rotations together.</param>
public readonly record struct TStateDemand(
    double TStates,
    double ReactionDepth,
    double LogicalLayers,
    double StatedLayers,
    double RotationError,
    double TPerRotation,
    double SynthesisFailure)
{
    /// <summary>T states per Toffoli gate as long as no factory delivers CCZ states.</summary>
    public const double TPerToffoli = 4;

    /// <summary>Layers of logical gates per reaction when the workload does not say: an assumption that reports name.</summary>
    public const double AssumedLayersPerReaction = 4;

    /// <summary>Demand when each rotation may err by so much.</summary>
    public static TStateDemand For(Workload workload, RotationSynthesis synthesis, double rotationError)
    {
        double perRotation = workload.Rotations > 0 ? Math.Max(synthesis.TPerRotation(rotationError), 0) : 0;
        double tStates = workload.TStates + (TPerToffoli * workload.Toffolis) + (perRotation * workload.Rotations);
        double sequentialRotations = workload.RotationDepth ?? workload.Rotations;
        double depth = (workload.ReactionDepth ?? (workload.TStates + workload.Toffolis)) + (perRotation * sequentialRotations);
        return new TStateDemand(
            tStates,
            depth,
            workload.LogicalLayers ?? (AssumedLayersPerReaction * depth),
            workload.LogicalLayers ?? 0,
            workload.Rotations > 0 ? rotationError : 0,
            perRotation,
            workload.Rotations * (workload.Rotations > 0 ? rotationError : 0));
    }

    /// <summary>T states that can be consumed side by side on average; it hardly depends on the precision of rotations, taken as 1e-9.</summary>
    public static double Parallelism(Workload workload, RotationSynthesis synthesis)
    {
        const double anyPrecision = 1e-9;
        TStateDemand demand = For(workload, synthesis, anyPrecision);
        return demand.ReactionDepth > 0 ? demand.TStates / demand.ReactionDepth : 1;
    }
}
