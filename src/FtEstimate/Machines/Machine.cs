namespace FtEstimate.Machines;

/// <summary>A machine as the user describes it: what holds the qubits, and what surrounds it. All values in SI units.</summary>
/// <param name="Name">The name printed in reports.</param>
/// <param name="Apparatus">The atoms and optics, or the abstract figures that stand in for them.</param>
/// <param name="Control">Decoding and feed-forward.</param>
/// <param name="Supply">Delivery of fresh atoms.</param>
/// <param name="Running">Stops, restarts and calibration.</param>
public sealed record Machine(string Name, Apparatus Apparatus, Control Control, Supply Supply, Running Running);

/// <summary>What the qubits live in: an atom array known from the bench, or an abstract machine of a published study.</summary>
public abstract record Apparatus
{
    private protected Apparatus()
    {
    }
}

/// <summary>A machine without physics, to reproduce a published study: one error rate and two times.</summary>
/// <param name="UniformError">Pauli probability of every location of the textbook circuit, in (0, 1).</param>
/// <param name="RoundSeconds">Duration of one syndrome round.</param>
/// <param name="ReactionSeconds">From a logical measurement to the operation that depends on it.</param>
public sealed record AbstractApparatus(double UniformError, double RoundSeconds, double ReactionSeconds) : Apparatus;

/// <summary>A neutral-atom array described by bench numbers.</summary>
/// <param name="Geometry">Spacings, optical field and traps.</param>
/// <param name="Gates">Gate errors and times.</param>
/// <param name="Reach">How distant atoms are brought to interact.</param>
/// <param name="Coherence">How waiting atoms decay.</param>
/// <param name="Readout">The readout scheme in use.</param>
/// <param name="OtherReadouts">Schemes the machine file also describes.</param>
public sealed record AtomArray(
    ArrayGeometry Geometry,
    Gates Gates,
    Reach Reach,
    Coherence Coherence,
    ReadoutScheme Readout,
    System.Collections.Immutable.ImmutableArray<ReadoutScheme> OtherReadouts) : Apparatus;

/// <summary>Spacings, optical field and traps.</summary>
/// <param name="PitchMetres">Distance of neighbouring data atoms; a check sits half a diagonal away.</param>
/// <param name="BlockSpacingMetres">Distance of the centres of neighbouring patches that a transversal gate brings together; null: distance times pitch.</param>
/// <param name="FieldDiameterMetres">Diameter of the optical field; null when not stated.</param>
/// <param name="TrapPowerWatts">Optical power per trap at the atoms; null when not stated.</param>
/// <param name="TrapsPerStoredAtom">Traps held for each stored atom, at least 1.</param>
public sealed record ArrayGeometry(
    double PitchMetres,
    double? BlockSpacingMetres,
    double? FieldDiameterMetres,
    double? TrapPowerWatts,
    double TrapsPerStoredAtom);

/// <summary>Decoding and feed-forward.</summary>
/// <param name="DecodeSecondsPerRound">Time the decoder takes per round of its window.</param>
/// <param name="FeedForwardSeconds">From the decoder's answer to the changed operation.</param>
public sealed record Control(double DecodeSecondsPerRound, double FeedForwardSeconds);

/// <summary>Delivery of fresh atoms.</summary>
/// <param name="AtomsPerSecond">Atoms delivered into the register; null when not stated, and then not limiting.</param>
/// <param name="SpareFraction">Spare atoms as a fraction of all data and check atoms, at least 0.</param>
public sealed record Supply(double? AtomsPerSecond, double SpareFraction);

/// <summary>Stops, restarts and calibration.</summary>
/// <param name="MeanSecondsBetweenStops">Mean time between stops that lose the run; null: none.</param>
/// <param name="RestartSeconds">Time to get going again after a stop.</param>
/// <param name="StartSeconds">Time to load and prepare, per shot.</param>
/// <param name="CalibrationFraction">Share of the time spent calibrating, in [0, 1).</param>
public sealed record Running(
    double? MeanSecondsBetweenStops,
    double RestartSeconds,
    double StartSeconds,
    double CalibrationFraction);
