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
    public static ImmutableArray<SenseFault> Check(ScenarioDraft draft)
    {
        List<SenseFault> faults = [];
        ShapeRules.Check(draft, faults);
        ArrayRules.Check(draft, faults);
        ReadoutRules.Check(draft, faults);
        RunningRules.Check(draft, faults);
        WorkloadRules.Check(draft, faults);
        FactoryRules.Check(draft, faults);
        LogicRules.Check(draft, faults);
        return [.. faults];
    }

    /// <summary>All faults of a workload alone; none: <see cref="WorkloadBinder.Bind"/> may be called.</summary>
    /// <param name="draft">Inputs of at least the workload.</param>
    public static ImmutableArray<SenseFault> CheckWorkload(ScenarioDraft draft)
    {
        List<SenseFault> faults = [];
        WorkloadRules.Check(draft, faults);
        return [.. faults];
    }
}
