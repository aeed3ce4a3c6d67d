using System.Collections.Immutable;

namespace FtEstimate.Sizing;

/// <summary>The answer to a scenario, or why there is none.</summary>
/// <param name="Space">What was chosen from.</param>
/// <param name="Best">The preferred machine; null when none meets the goal.</param>
/// <param name="OtherStyle">The preferred machine of the other logic style; null when it is not offered or has none.</param>
/// <param name="Unbeaten">Machines that no other beats in atoms and run time at once, fewest atoms first; the preferred one included.</param>
/// <param name="NoAnswer">Why no machine meets the goal; null when one does.</param>
public sealed record SizingResult(
    SearchSpace Space,
    SizedMachine? Best,
    SizedMachine? OtherStyle,
    ImmutableArray<SizedMachine> Unbeaten,
    NoAnswer? NoAnswer);

/// <summary>Why no machine meets the goal.</summary>
/// <param name="Reason">The kind of obstacle.</param>
/// <param name="Sentence">One sentence for the reader.</param>
/// <param name="Strength">Noise strength of the smallest machine; above 1 no distance helps.</param>
/// <param name="StrengthNeeded">Strength at which a machine would meet the goal; null when no noise is low enough.</param>
/// <param name="Blame">Every cause of error with its share and the value it alone would need, largest first.</param>
/// <param name="Closest">What comes closest when limits on atoms, time and supply are dropped; null when nothing does.</param>
public sealed record NoAnswer(
    Obstacle Reason,
    string Sentence,
    double Strength,
    double? StrengthNeeded,
    ImmutableArray<BlamedChannel> Blame,
    SizedMachine? Closest);

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
