using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>What surrounds the atoms: control, supply, and the running of the machine.</summary>
public static class OperationKeys
{
    /// <summary>Decoding time.</summary>
    public static readonly KeyDefinition DecodePerRound = new(
        "decode_us_per_round", ValueKind.NotNegative, "Time the decoder takes per round of its window.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Feed-forward time.</summary>
    public static readonly KeyDefinition FeedForward = new(
        "feed_forward_us", ValueKind.NotNegative, "From the decoder's answer to the changed operation.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Atom supply.</summary>
    public static readonly KeyDefinition AtomsPerSecond = new(
        "atoms_per_s", ValueKind.Positive, "Atoms delivered into the register; not limiting when absent.", Better: BetterWhen.Larger);

    /// <summary>Spare atoms.</summary>
    public static readonly KeyDefinition SpareFraction = new(
        "spare_fraction", ValueKind.NotNegative, "Spare atoms as a fraction of all data and check atoms.", High: 100, Default: 0);

    /// <summary>Mean time between stops.</summary>
    public static readonly KeyDefinition MeanHoursBetweenStops = new(
        "mean_hours_between_stops", ValueKind.Positive, "Mean time between stops that lose the shot; no stops when absent.", ToSi: Units.Hour, Better: BetterWhen.Larger);

    /// <summary>Restart time.</summary>
    public static readonly KeyDefinition HoursToRestart = new(
        "hours_to_restart", ValueKind.NotNegative, "Time to get going again after a stop; needed with mean_hours_between_stops.", ToSi: Units.Hour, Better: BetterWhen.Smaller);

    /// <summary>Start of a shot.</summary>
    public static readonly KeyDefinition Start = new(
        "start_s", ValueKind.NotNegative, "Time to load and prepare, per shot.", Default: 0, Better: BetterWhen.Smaller);

    /// <summary>Calibration.</summary>
    public static readonly KeyDefinition CalibrationFraction = new(
        "calibration_fraction", ValueKind.NotNegative, "Share of the time spent calibrating.", High: 0.99, Default: 0, Better: BetterWhen.Smaller);

    /// <summary>How loss of data atoms is found.</summary>
    public static readonly KeyDefinition DataLossCheck = new(
        "data_loss_check",
        ValueKind.Text,
        "How lost data atoms are found: data and checks trade places, or an extra atom probes each one, or not at all; needed as soon as anything loses atoms.",
        Choices: ["swap", "extra-check", "none"]);

    /// <summary>How often.</summary>
    public static readonly KeyDefinition DataLossCheckEvery = new(
        "data_loss_check_every_rounds", ValueKind.Positive, "Rounds between two such looks; with \"none\", rounds until the run's own readout tells.", Low: 1);

    /// <summary>[control].</summary>
    public static readonly TableDefinition Control = new(
        "machine.control", "Decoding and feed-forward.", [DecodePerRound, FeedForward]);

    /// <summary>[supply].</summary>
    public static readonly TableDefinition Supply = new(
        "machine.supply", "Delivery of fresh atoms; may be left out.", [AtomsPerSecond, SpareFraction]);

    /// <summary>[running].</summary>
    public static readonly TableDefinition Running = new(
        "machine.running",
        "Stops, restarts, calibration and the search for lost atoms; may be left out when nothing loses atoms.",
        [MeanHoursBetweenStops, HoursToRestart, Start, CalibrationFraction, DataLossCheck, DataLossCheckEvery]);

    /// <summary>The tables.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Control, Supply, Running];
}
