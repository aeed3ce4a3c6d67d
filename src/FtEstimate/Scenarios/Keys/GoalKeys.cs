using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>The top of a scenario file, and what the run must achieve.</summary>
public static class GoalKeys
{
    /// <summary>Title.</summary>
    public static readonly KeyDefinition Title = new(
        "title", ValueKind.Text, "Printed at the top of the report.", Required: true);

    /// <summary>The machine, when it stands in a file of its own.</summary>
    public static readonly KeyDefinition Machine = new(
        "machine", ValueKind.Text, "Path of the machine file, seen from this file; or the machine itself as a table.", Required: true);

    /// <summary>The workload, when it stands in a file of its own.</summary>
    public static readonly KeyDefinition Workload = new(
        "workload", ValueKind.Text, "Path of the workload file, seen from this file; or the workload itself as a table.", Required: true);

    /// <summary>Largest failure probability.</summary>
    public static readonly KeyDefinition FailureProbability = new(
        "failure_probability", ValueKind.Positive, "Largest failure probability of one complete run, all causes together.", High: 0.99, Required: true);

    /// <summary>Preference among the machines that would do.</summary>
    public static readonly KeyDefinition Prefer = new(
        "prefer",
        ValueKind.Text,
        "Which of the machines that meet the goal is picked.",
        DefaultText: "least-atom-hours",
        Choices: ["least-atom-hours", "fewest-atoms", "shortest-run"]);

    /// <summary>Limit on the atoms.</summary>
    public static readonly KeyDefinition AtomsAtMost = new(
        "atoms_at_most", ValueKind.Positive, "Limit on the atoms in traps; none when absent.", Low: 1);

    /// <summary>Limit on the elapsed time.</summary>
    public static readonly KeyDefinition RunAtMostDays = new(
        "run_at_most_days", ValueKind.Positive, "Limit on the elapsed time with all shots, stops and repeats; none when absent.", ToSi: Units.Day);

    /// <summary>The keys at the top of a scenario file.</summary>
    public static readonly TableDefinition Top = new(
        "", "The top of a scenario file.", [Title, Machine, Workload]);

    /// <summary>[goal].</summary>
    public static readonly TableDefinition Goal = new(
        "goal", "What the run must achieve.", [FailureProbability, Prefer, AtomsAtMost, RunAtMostDays]);

    /// <summary>Both tables.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Top, Goal];
}
