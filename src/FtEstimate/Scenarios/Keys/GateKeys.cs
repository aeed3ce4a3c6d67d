using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>Gate errors and times. Errors are average gate infidelities, loss is a separate input.</summary>
public static class GateKeys
{
    /// <summary>CZ infidelity without loss.</summary>
    public static readonly KeyDefinition CzError = new(
        "cz_error", ValueKind.Probability, "Average infidelity of CZ gates that lose no atom.", High: 0.75, Better: BetterWhen.Smaller);

    /// <summary>CZ infidelity with loss.</summary>
    public static readonly KeyDefinition CzRawError = new(
        "cz_raw_error", ValueKind.Probability, "Raw average infidelity of CZ gates, loss included; in place of cz_error, which is then raw minus loss.", High: 0.75, Better: BetterWhen.Smaller);

    /// <summary>CZ loss.</summary>
    public static readonly KeyDefinition CzLoss = new(
        "cz_loss", ValueKind.Probability, "Probability that one CZ gate loses either of its atoms.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>CZ duration.</summary>
    public static readonly KeyDefinition CzTime = new(
        "cz_time_us", ValueKind.Positive, "Duration of a CZ pulse.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Parallel CZ gates.</summary>
    public static readonly KeyDefinition CzPairsAtOnce = new(
        "cz_pairs_at_once", ValueKind.Positive, "Pairs that one CZ pulse serves in the whole machine; no limit when absent.", Low: 1, Better: BetterWhen.Larger);

    /// <summary>One-qubit infidelity.</summary>
    public static readonly KeyDefinition OneQubitError = new(
        "one_qubit_error", ValueKind.Probability, "Average infidelity of a one-qubit gate.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>One-qubit duration.</summary>
    public static readonly KeyDefinition OneQubitTime = new(
        "one_qubit_time_us", ValueKind.NotNegative, "Duration of a one-qubit gate.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Parallel one-qubit gates.</summary>
    public static readonly KeyDefinition OneQubitAtOnce = new(
        "one_qubit_at_once", ValueKind.Positive, "Atoms that one one-qubit pulse serves in the whole machine; no limit when absent.", Low: 1, Better: BetterWhen.Larger);

    /// <summary>Reset flip.</summary>
    public static readonly KeyDefinition ResetError = new(
        "reset_error", ValueKind.Probability, "Probability that a reset check starts in the wrong state.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Reset duration.</summary>
    public static readonly KeyDefinition ResetTime = new(
        "reset_time_us", ValueKind.NotNegative, "Duration of a reset.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>CZ infidelity between the species.</summary>
    public static readonly KeyDefinition BetweenSpeciesError = new(
        "between_species_cz_error", ValueKind.Probability, "Average infidelity of CZ gates between a data atom and a check of another species that lose no atom.", High: 0.75, Better: BetterWhen.Smaller);

    /// <summary>CZ loss between the species.</summary>
    public static readonly KeyDefinition BetweenSpeciesLoss = new(
        "between_species_cz_loss", ValueKind.Probability, "Probability that one CZ gate between the species loses either of its atoms.", High: 0.5, Better: BetterWhen.Smaller);

    /// <summary>CZ duration between the species.</summary>
    public static readonly KeyDefinition BetweenSpeciesTime = new(
        "between_species_cz_time_us", ValueKind.Positive, "Duration of a CZ pulse between the species.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>[gates].</summary>
    public static readonly TableDefinition Gates = new(
        "machine.gates",
        "Gate errors (average gate infidelities; loss apart) and times. Give cz_error or cz_raw_error.",
        [
            CzError, CzRawError, CzLoss, CzTime, CzPairsAtOnce, OneQubitError, OneQubitTime, OneQubitAtOnce, ResetError, ResetTime,
            BetweenSpeciesError, BetweenSpeciesLoss, BetweenSpeciesTime,
        ]);

    /// <summary>The table.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Gates];
}
