using System.Collections.Immutable;
using FtEstimate.Workloads;

namespace FtEstimate.Files.Scenarios;

/// <summary>The outcome of reading a workload file: the workload, or everything that is wrong with it.</summary>
/// <param name="Workload">The workload; null: there are faults.</param>
/// <param name="Faults">All faults by place; empty: there is a workload.</param>
public sealed record WorkloadReading(Workload? Workload, ImmutableArray<Fault> Faults);
