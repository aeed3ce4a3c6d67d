using System.Collections.Immutable;

namespace FtEstimate.Sizing;

/// <summary>Why no machine meets the goal.</summary>
/// <param name="Reason">The kind of obstacle.</param>
/// <param name="Strength">Noise strength: of the closest machine, of the tiles at the typical distance, or of a single patch, by reason.</param>
/// <param name="NoiseFactor">Factor on all noise at which a machine would meet the goal; null when no noise is low enough.</param>
/// <param name="Blame">Every cause of error with its share and the value it alone would need, largest first.</param>
/// <param name="SinglePatch">A single patch under the quietest readout.</param>
/// <param name="FullSize">The tiles of the first layout at the typical distance.</param>
/// <param name="GroupsStandInTheWay">Whether a machine would do if everything were served at once.</param>
/// <param name="Closest">The machine that would be preferred without limits on atoms, time and supply; null when there is none.</param>
/// <param name="Limits">The limits that stand in the way; empty unless they are the reason.</param>
public sealed record NoAnswer(
    Obstacle Reason,
    double Strength,
    double? NoiseFactor,
    ImmutableArray<BlamedChannel> Blame,
    PatchPace SinglePatch,
    PatchPace FullSize,
    bool GroupsStandInTheWay,
    SizedMachine? Closest,
    ImmutableArray<LimitInTheWay> Limits)
{
    /// <summary>Strength at which a machine would meet the goal; null when no noise is low enough.</summary>
    public double? StrengthNeeded => NoiseFactor * Strength;
}

/// <summary>Round and noise of patches of some number.</summary>
/// <param name="RoundSeconds">Syndrome round.</param>
/// <param name="Strength">Noise strength, mean of both bases.</param>
public readonly record struct PatchPace(double RoundSeconds, double Strength);

/// <summary>A limit that stands in the way.</summary>
/// <param name="Resource">What is limited.</param>
/// <param name="Allowed">The limit, in atoms, seconds or atoms per second.</param>
/// <param name="Preferred">What the preferred machine takes; null: its run does not end.</param>
/// <param name="Enough">What would be enough if the other limits and the noise stayed as they are; null: nothing would.</param>
public sealed record LimitInTheWay(LimitedResource Resource, double Allowed, double? Preferred, double? Enough);

/// <summary>What a goal or a machine limits.</summary>
public enum LimitedResource
{
    /// <summary>Atoms in traps.</summary>
    Atoms,

    /// <summary>Elapsed seconds.</summary>
    ElapsedSeconds,

    /// <summary>Atoms delivered per second.</summary>
    AtomsPerSecond,
}

/// <summary>A cause of error held against the goal.</summary>
/// <param name="Channel">The cause.</param>
/// <param name="Share">Share of the noise strength.</param>
/// <param name="PerLocation">Its probability today.</param>
/// <param name="NeededPerLocation">The probability it alone would need; null when even zero is not enough.</param>
public sealed record BlamedChannel(string Channel, double Share, double PerLocation, double? NeededPerLocation);

/// <summary>What stands in the way.</summary>
public enum Obstacle
{
    /// <summary>The noise is above threshold.</summary>
    AboveThreshold,

    /// <summary>No distance up to the largest, or no factory, reaches the failure probability.</summary>
    FailureProbability,

    /// <summary>A machine would do, but not within the limits on atoms, time or supply.</summary>
    Limits,
}
