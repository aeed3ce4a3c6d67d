using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>How distant atoms are brought to interact.</summary>
public static class ReachKeys
{
    /// <summary>Moved atoms or steered beams.</summary>
    public static readonly KeyDefinition Kind = new(
        "kind",
        ValueKind.Text,
        "Whether the atoms travel or the beams are pointed.",
        Required: true,
        Choices: ["moved-atoms", "steered-beams"]);

    /// <summary>Peak acceleration.</summary>
    public static readonly KeyDefinition PeakAcceleration = new(
        "peak_acceleration_m_s2", ValueKind.Positive, "Largest acceleration during a move.", Required: true, Better: BetterWhen.Larger);

    /// <summary>Move profile.</summary>
    public static readonly KeyDefinition Profile = new(
        "profile",
        ValueKind.Text,
        "How a move of length D accelerates, at peak acceleration a: it lasts √(6D/a), √(2πD/a) or 2√(D/a).",
        DefaultText: "cubic",
        Choices: ["cubic", "adiabatic-sine", "bang-bang"]);

    /// <summary>Hand-off time.</summary>
    public static readonly KeyDefinition HandoffTime = new(
        "handoff_time_us", ValueKind.NotNegative, "Duration of one pick-up or one drop.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Hand-off error.</summary>
    public static readonly KeyDefinition HandoffError = new(
        "handoff_error", ValueKind.Probability, "Average infidelity of one pick-up or one drop.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Loss per move.</summary>
    public static readonly KeyDefinition MoveLoss = new(
        "move_loss", ValueKind.Probability, "Probability to lose an atom in one move with its pick-up and drop.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Parallel moves.</summary>
    public static readonly KeyDefinition MovedAtOnce = new(
        "moved_at_once", ValueKind.Positive, "Atoms that move together in the whole machine; no limit when absent.", Low: 1, Better: BetterWhen.Larger);

    /// <summary>Whether both check grids move at once.</summary>
    public static readonly KeyDefinition CheckGridsMoveTogether = new(
        "check_grids_move_together", ValueKind.Flag, "Whether both kinds of checks can move at once although their ways differ (two deflector pairs); false when absent.");

    /// <summary>Pause between pulses.</summary>
    public static readonly KeyDefinition PulseGap = new(
        "pulse_gap_us", ValueKind.NotNegative, "Pause between two CZ pulses of one layer; 0 when absent.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>Zone refill.</summary>
    public static readonly KeyDefinition ZoneRefill = new(
        "zone_refill_us", ValueKind.NotNegative, "Time to bring the next pairs into the gate zone, in place of pulse_gap_us.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>Beam switching time.</summary>
    public static readonly KeyDefinition BeamSwitch = new(
        "beam_switch_us", ValueKind.NotNegative, "Time to point the beams at the next group of pairs.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Stated duration of a CZ layer.</summary>
    public static readonly KeyDefinition LayerTime = new(
        "layer_time_us", ValueKind.Positive, "Duration of one CZ layer with its moves, in place of the model of moves and pulses.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>[reach] with moved atoms.</summary>
    public static readonly TableDefinition MovedAtoms = new(
        "machine.reach",
        "Checks are carried from data atom to data atom.",
        [Kind, PeakAcceleration, Profile, HandoffTime, HandoffError, MoveLoss, MovedAtOnce, CheckGridsMoveTogether, PulseGap, ZoneRefill],
        SelectedBy: "kind",
        SelectedWhen: "moved-atoms");

    /// <summary>[reach] with steered beams.</summary>
    public static readonly TableDefinition SteeredBeams = new(
        "machine.reach",
        "Atoms stay, beams are steered to the pairs.",
        [Kind, BeamSwitch],
        SelectedBy: "kind",
        SelectedWhen: "steered-beams");

    /// <summary>[cycle].</summary>
    public static readonly TableDefinition Cycle = new(
        "machine.cycle", "Measured times that stand in for a model.", [LayerTime]);

    /// <summary>The tables.</summary>
    public static ImmutableArray<TableDefinition> Tables => [MovedAtoms, SteeredBeams, Cycle];
}
