using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>How waiting atoms decay.</summary>
public static class CoherenceKeys
{
    /// <summary>Relaxation time.</summary>
    public static readonly KeyDefinition T1 = new(
        "t1_s", ValueKind.Positive, "Relaxation time T1; not limiting when absent.", Better: BetterWhen.Larger);

    /// <summary>Coherence time.</summary>
    public static readonly KeyDefinition T2 = new(
        "t2_s", ValueKind.Positive, "Coherence time T2 under decoupling, at most twice T1.", Required: true, Better: BetterWhen.Larger);

    /// <summary>Echo pulses.</summary>
    public static readonly KeyDefinition EchoPulses = new(
        "echo_pulses_per_round", ValueKind.NotNegative, "Decoupling pulses on each data atom per round; each costs one one-qubit error.", High: 1e6, Default: 0, Better: BetterWhen.Smaller);

    /// <summary>Vacuum lifetime.</summary>
    public static readonly KeyDefinition VacuumLifetime = new(
        "vacuum_lifetime_s", ValueKind.Positive, "Lifetime of a trapped atom; not limiting when absent.", Better: BetterWhen.Larger);

    /// <summary>[coherence].</summary>
    public static readonly TableDefinition Coherence = new(
        "machine.coherence", "How waiting atoms decay.", [T1, T2, EchoPulses, VacuumLifetime]);

    /// <summary>The table.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Coherence];
}
