using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Tests.Cycles;
using FtEstimate.Workloads;

namespace FtEstimate.Tests.Sizing;

/// <summary>Scenarios for tests.</summary>
internal static class Questions
{
    /// <summary>Shared, as the command-line tool shares it: factories are remembered between sizings.</summary>
    private static readonly FactoryCatalogue Catalogue = new();

    public static Method Open { get; } = new(
        "published-fit", "2d^2-1", null, null, null, null, null, null, "joint", "repeat-until-success", 0.5, null);

    public static Goal OnePercent { get; } = new(0.01, Preference.LeastAtomHours, null, null);

    public static Workload Of(double qubits, double tStates, double? layers = null) =>
        new("test", qubits, tStates, 0, 0, null, null, null, layers, 1, []);

    public static Scenario Bench(Workload workload, AtomArray? array = null) => new(
        "test",
        BenchMachine.Machine with { Apparatus = array ?? BenchMachine.Array },
        workload,
        OnePercent,
        Open,
        new InputSet([]));

    public static Scenario Abstract(double error, Workload workload, double roundSeconds = 1e-6) => new(
        "test",
        BenchMachine.Machine with { Apparatus = new AbstractApparatus(error, roundSeconds, 0) },
        workload,
        OnePercent,
        Open with { Law = "textbook" },
        new InputSet([]));

    public static SizingResult Answer(this Scenario scenario) => new MachineSizing(Catalogue).Find(scenario);

    public static double MeasureOf(SizedMachine machine, Preference preference) => preference switch
    {
        Preference.FewestAtoms => machine.Atoms.Total,
        Preference.ShortestRun => machine.RunSeconds,
        _ => machine.AtomHours,
    };

    public static ImmutableArray<Preference> Preferences { get; } =
        [Preference.LeastAtomHours, Preference.FewestAtoms, Preference.ShortestRun];
}
