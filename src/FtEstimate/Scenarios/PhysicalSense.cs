using System.Collections.Immutable;
using FtEstimate.Scenarios.Sense;

namespace FtEstimate.Scenarios;

/// <summary>One reason why inputs make no scenario.</summary>
/// <param name="Path">The key or table to change.</param>
/// <param name="Message">What is wrong and what was expected.</param>
public sealed record SenseFault(string Path, string Message);

/// <summary>What no single key can tell: inputs that contradict or need each other.</summary>
public static class PhysicalSense
{
    /// <summary>All faults; none: <see cref="ScenarioBinder.Bind"/> may be called.</summary>
    /// <param name="draft">Inputs whose single values are within the bounds of their keys.</param>
    public static ImmutableArray<SenseFault> Check(ScenarioDraft draft) =>
    [
        .. ShapeRules.Check(draft),
        .. ArrayRules.Check(draft),
        .. ReadoutRules.Check(draft),
        .. RunningRules.Check(draft),
        .. CheckWorkload(draft),
        .. FactoryRules.Check(draft),
    ];

    /// <summary>All faults of a workload alone; none: <see cref="WorkloadBinder.Bind"/> may be called.</summary>
    /// <param name="draft">Inputs of at least the workload.</param>
    public static IEnumerable<SenseFault> CheckWorkload(ScenarioDraft draft) => WorkloadRules.Check(draft);
}
