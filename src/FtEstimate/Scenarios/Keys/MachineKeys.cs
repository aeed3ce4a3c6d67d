using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>The top of a machine file, its geometry, and the abstract figures that may stand in for the bench tables.</summary>
public static class MachineKeys
{
    /// <summary>Name.</summary>
    public static readonly KeyDefinition Name = new(
        "name", ValueKind.Text, "The name printed in reports.", Required: true);

    /// <summary>Pitch.</summary>
    public static readonly KeyDefinition Pitch = new(
        "pitch_um", ValueKind.Positive, "Distance of neighbouring data atoms; a check sits half a diagonal away.", ToSi: Units.Micro, Required: true);

    /// <summary>Block spacing.</summary>
    public static readonly KeyDefinition BlockSpacing = new(
        "block_spacing_um", ValueKind.Positive, "Distance of the centres of neighbouring patches that a transversal gate brings together; distance times pitch when absent.", ToSi: Units.Micro);

    /// <summary>Optical field.</summary>
    public static readonly KeyDefinition FieldDiameter = new(
        "field_diameter_um", ValueKind.Positive, "Diameter of the optical field; not checked when absent.", ToSi: Units.Micro, Better: BetterWhen.Larger);

    /// <summary>Trap power.</summary>
    public static readonly KeyDefinition TrapPower = new(
        "trap_power_mw", ValueKind.Positive, "Optical power per trap at the atoms; no power is printed when absent.", ToSi: Units.Milli, Better: BetterWhen.Smaller);

    /// <summary>Traps per stored atom.</summary>
    public static readonly KeyDefinition TrapsPerStoredAtom = new(
        "traps_per_stored_atom", ValueKind.Positive, "Traps held for each stored atom.", Low: 1, High: 1000, Default: 1, Better: BetterWhen.Smaller);

    /// <summary>Uniform error of an abstract machine.</summary>
    public static readonly KeyDefinition UniformError = new(
        "uniform_error", ValueKind.Positive, "Pauli probability of every location of the textbook circuit.", High: 0.5, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Round time of an abstract machine.</summary>
    public static readonly KeyDefinition RoundTime = new(
        "round_time_us", ValueKind.Positive, "Duration of one syndrome round.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>Reaction time of an abstract machine.</summary>
    public static readonly KeyDefinition ReactionTime = new(
        "reaction_time_us", ValueKind.NotNegative, "From a logical measurement to the operation that depends on it.", ToSi: Units.Micro, Required: true, Better: BetterWhen.Smaller);

    /// <summary>The keys at the top of a machine file.</summary>
    public static readonly TableDefinition Top = new(
        "machine", "The top of a machine file. Its tables describe the bench, or [abstract] stands in for all of them but [running].", [Name]);

    /// <summary>[array].</summary>
    public static readonly TableDefinition Array = new(
        "machine.array", "Spacings, optical field and traps.", [Pitch, BlockSpacing, FieldDiameter, TrapPower, TrapsPerStoredAtom]);

    /// <summary>[abstract].</summary>
    public static readonly TableDefinition Abstract = new(
        "machine.abstract", "A machine without physics, to reproduce a published study; excludes the bench tables.", [UniformError, RoundTime, ReactionTime]);

    /// <summary>The tables.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Top, Abstract, Array];
}
