using FtEstimate.Quantities;
using FtEstimate.Scenarios;

namespace FtEstimate.Sizing;

/// <summary>What every machine must keep to.</summary>
/// <param name="FailureAtMost">Failure probability of one shot.</param>
/// <param name="Each">Whether each contribution may use all of it.</param>
/// <param name="AtomsAtMost">Atoms; infinite when not limited.</param>
/// <param name="ElapsedAtMost">Elapsed seconds; infinite when not limited.</param>
/// <param name="SupplyPerSecond">Atoms delivered per second; infinite when not limited.</param>
internal sealed record SearchLimits(
    double FailureAtMost,
    bool Each,
    double AtomsAtMost,
    double ElapsedAtMost,
    double SupplyPerSecond)
{
    /// <summary>Expected faults at which the failure probability is just kept: −ln(1 − P).</summary>
    public double FaultsAtMost { get; } = FailureComposition.ExpectedFaults(1, FailureAtMost);

    /// <summary>The limits of a scenario.</summary>
    public static SearchLimits Of(Scenario scenario) => new(
        scenario.Goal.FailureProbability,
        scenario.Method.FailureSplit == "each",
        scenario.Goal.AtomsAtMost ?? double.PositiveInfinity,
        scenario.Goal.RunSecondsAtMost ?? double.PositiveInfinity,
        scenario.Machine.Supply.AtomsPerSecond ?? double.PositiveInfinity);

    /// <summary>The same goal without limits on atoms, time and supply.</summary>
    public SearchLimits WithoutResources() => this with
    {
        AtomsAtMost = double.PositiveInfinity,
        ElapsedAtMost = double.PositiveInfinity,
        SupplyPerSecond = double.PositiveInfinity,
    };
}
