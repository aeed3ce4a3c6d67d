using System.Collections.Immutable;

namespace FtEstimate.SurfaceCode;

/// <summary>The laws a scenario can choose from.</summary>
public static class ScalingLaws
{
    /// <summary>Fitted to this project's own simulation: the default.</summary>
    public static IScalingLaw Simulated { get; } = new SimulatedLaw();

    /// <summary>The rule of thumb of resource papers.</summary>
    public static IScalingLaw Textbook { get; } = new TextbookLaw();

    /// <summary>Fit and counts of published Monte Carlo.</summary>
    public static IScalingLaw PublishedFit { get; } = new PublishedFitLaw();

    /// <summary>All of them.</summary>
    public static ImmutableArray<IScalingLaw> All { get; } = [Simulated, PublishedFit, Textbook];

    /// <summary>The law of that name, or null.</summary>
    public static IScalingLaw? Named(string name) => All.FirstOrDefault(law => law.Name == name);
}
