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
