using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>The readout schemes a machine file describes, and the one in use.</summary>
public static class ReadoutKeys
{
    /// <summary>The path of the table that holds the schemes.</summary>
    public const string Path = "machine.readout";

    /// <summary>The scheme in use.</summary>
    public static readonly KeyDefinition Use = new(
        "use", ValueKind.Text, "Name of the scheme in use; the others are for comparison.", Required: true);

    /// <summary>The kind of a scheme.</summary>
    public static readonly KeyDefinition Kind = new(
        "kind",
        ValueKind.Text,
        "How the data atoms are kept from the light.",
        Required: true,
        Choices: ["shelved", "second_species", "moved_apart", "in_place"]);

    /// <summary>Recooling.</summary>
    public static readonly KeyDefinition RecoolTime = new(
        "recool_time_us", ValueKind.NotNegative, "Cooling and repumping of the checks after the exposure.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Shelving time.</summary>
    public static readonly KeyDefinition ShelveTime = new(
        "shelve_time_us", ValueKind.NotNegative, "Duration of shelving, or unshelving, all atoms.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Shelving error.</summary>
    public static readonly KeyDefinition ShelveError = new(
        "shelve_error", ValueKind.Probability, "Average infidelity of one shelving or unshelving pulse.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Selection time.</summary>
    public static readonly KeyDefinition SelectTime = new(
        "select_time_us", ValueKind.NotNegative, "Time to bring one group of checks back into the light.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Selection error.</summary>
    public static readonly KeyDefinition SelectError = new(
        "select_error", ValueKind.Probability, "Average infidelity of that pulse on a check.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Parallel selection.</summary>
    public static readonly KeyDefinition SelectAtOnce = new(
        "select_at_once", ValueKind.Positive, "Checks selected together in the whole machine; no limit when absent.", Low: 1, Better: BetterWhen.Larger);

    /// <summary>Selection crosstalk.</summary>
    public static readonly KeyDefinition SelectCrosstalk = new(
        "select_crosstalk_probability", ValueKind.Probability, "Pauli probability that selecting the checks costs each data atom per round.", High: 0.5, Default: 0, Better: BetterWhen.Smaller);

    /// <summary>T1 while shelved.</summary>
    public static readonly KeyDefinition ShelvedT1 = new(
        "shelved_t1_s", ValueKind.Positive, "Relaxation time while shelved; not limiting when absent.", Better: BetterWhen.Larger);

    /// <summary>T2 while shelved.</summary>
    public static readonly KeyDefinition ShelvedT2 = new(
        "shelved_t2_s", ValueKind.Positive, "Coherence time while shelved, at most twice shelved_t1_s.", Required: true, Better: BetterWhen.Larger);

    /// <summary>Residual scattering.</summary>
    public static readonly KeyDefinition ResidualScatter = new(
        "residual_scatter_per_ms", ValueKind.NotNegative, "Scattering of a shelved atom under the imaging and cooling light.", ToSi: Units.PerMillisecond, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Atoms per check.</summary>
    public static readonly KeyDefinition EnsembleAtoms = new(
        "ensemble_atoms", ValueKind.Whole, "Atoms that make up one check.", Low: 1, High: 1000, Default: 1);

    /// <summary>Sets of checks.</summary>
    public static readonly KeyDefinition Banks = new(
        "banks", ValueKind.Whole, "Sets of checks: with 2, one set works while the other is read.", Low: 1, High: 2, Default: 1);

    /// <summary>Disturbance of data atoms.</summary>
    public static readonly KeyDefinition DataDisturbance = new(
        "data_disturbance_per_ms", ValueKind.NotNegative, "Rate at which exposure and recooling disturb a data atom.", ToSi: Units.PerMillisecond, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Way to the readout zone.</summary>
    public static readonly KeyDefinition Distance = new(
        "distance_um", ValueKind.Positive, "Way of the checks to the readout zone; give this or exchange_time_us.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>Exchange time.</summary>
    public static readonly KeyDefinition ExchangeTime = new(
        "exchange_time_us", ValueKind.Positive, "Time to exchange the checks for a fresh set, which stay away; in place of distance_um.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>Whether the round waits for the image.</summary>
    public static readonly KeyDefinition ReadInRound = new(
        "read_in_round", ValueKind.Flag, "Whether the round waits for the image; false when the checks are imaged later; true when absent.");

    /// <summary>[readout].</summary>
    public static readonly TableDefinition Readout = new(
        Path, "The scheme in use; each scheme is a table [readout.NAME] beside it.", [Use]);

    /// <summary>A scheme that shelves the data atoms.</summary>
    public static readonly TableDefinition Shelved = Scheme(
        "shelved",
        "One species: all atoms are shelved in states that the light does not see, then the checks are selected and read.",
        [ShelveTime, ShelveError, SelectTime, SelectError, SelectAtOnce, SelectCrosstalk, ShelvedT1, ShelvedT2, ResidualScatter, RecoolTime]);

    /// <summary>A scheme with checks of another species.</summary>
    public static readonly TableDefinition SecondSpecies = Scheme(
        "second_species",
        "Checks are another element, singly or as ensembles; it must state its own detection, and [gates] the gate between the species.",
        [EnsembleAtoms, Banks, DataDisturbance, RecoolTime]);

    /// <summary>A scheme that moves the checks away.</summary>
    public static readonly TableDefinition MovedApart = Scheme(
        "moved_apart",
        "Checks travel to a readout zone and back, or are exchanged for a fresh set.",
        [Distance, ExchangeTime, ReadInRound, DataDisturbance, RecoolTime, Banks]);

    /// <summary>A scheme without protection.</summary>
    public static readonly TableDefinition InPlace = Scheme(
        "in_place",
        "Checks are read where they are, and the data atoms are not protected.",
        [DataDisturbance, RecoolTime]);

    /// <summary>The tables.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Readout, Shelved, SecondSpecies, MovedApart, InPlace];

    private static TableDefinition Scheme(string kind, string meaning, ImmutableArray<KeyDefinition> keys) =>
        new(Path + ".*", meaning, [Kind, .. keys, .. DetectionKeys.All], SelectedBy: "kind", SelectedWhen: kind);
}
