using System.Collections.Immutable;
using FtEstimate.Scenarios;

namespace FtEstimate.Files.Scenarios;

/// <summary>The outcome of reading a scenario: the scenario, or everything that is wrong with it.</summary>
/// <param name="Scenario">The scenario; null: there are faults.</param>
/// <param name="Faults">All faults of all files, by file and place; empty: there is a scenario.</param>
/// <param name="Files">The files that were opened, the scenario file first.</param>
public sealed record ScenarioReading(Scenario? Scenario, ImmutableArray<Fault> Faults, ImmutableArray<string> Files);
