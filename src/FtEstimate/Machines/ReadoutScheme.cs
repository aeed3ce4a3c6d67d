namespace FtEstimate.Machines;

/// <summary>A way to read the checks while the data atoms wait.</summary>
/// <param name="Name">The name it has in the machine file.</param>
/// <param name="Detector">How a check atom is seen.</param>
/// <param name="RecoolSeconds">Cooling and repumping of the checks after the exposure.</param>
public abstract record ReadoutScheme(string Name, Detector Detector, double RecoolSeconds)
{
    /// <summary>The kind as written in machine files.</summary>
    public abstract string Kind { get; }

    /// <summary>Sets of checks that take turns, at least 1.</summary>
    public virtual int Banks => 1;

    /// <summary>Sets of checks held in traps, at least 1.</summary>
    public virtual int CheckSets => Banks;

    /// <summary>Atoms that make up one check, at least 1.</summary>
    public virtual int AtomsPerCheck => 1;
}

/// <summary>One species: data atoms are shelved in states the light does not see.</summary>
/// <param name="Name">See <see cref="ReadoutScheme"/>.</param>
/// <param name="Detector">See <see cref="ReadoutScheme"/>.</param>
/// <param name="RecoolSeconds">See <see cref="ReadoutScheme"/>.</param>
/// <param name="ShelveSeconds">Duration of shelving, or unshelving, all atoms.</param>
/// <param name="ShelveInfidelity">Infidelity of one shelving or unshelving pulse.</param>
/// <param name="SelectSeconds">Time to bring one group of checks back into the light.</param>
/// <param name="SelectInfidelity">Infidelity of that pulse on a check.</param>
/// <param name="SelectAtOnce">Checks in one group, machine-wide; infinite when not limited.</param>
/// <param name="SelectCrosstalk">Pauli probability that selecting the checks costs each data atom, per round.</param>
/// <param name="ShelvedT1Seconds">Relaxation time while shelved.</param>
/// <param name="ShelvedT2Seconds">Coherence time while shelved.</param>
/// <param name="ScatterPerSecond">Residual scattering of a shelved atom under the imaging light.</param>
public sealed record Shelved(
    string Name,
    Detector Detector,
    double RecoolSeconds,
    double ShelveSeconds,
    double ShelveInfidelity,
    double SelectSeconds,
    double SelectInfidelity,
    double SelectAtOnce,
    double SelectCrosstalk,
    double ShelvedT1Seconds,
    double ShelvedT2Seconds,
    double ScatterPerSecond) : ReadoutScheme(Name, Detector, RecoolSeconds)
{
    /// <inheritdoc/>
    public override string Kind => "shelved";
}

/// <summary>Checks are another element, singly or as ensembles; data atoms keep their coherence.</summary>
/// <param name="Name">See <see cref="ReadoutScheme"/>.</param>
/// <param name="Detector">See <see cref="ReadoutScheme"/>.</param>
/// <param name="RecoolSeconds">See <see cref="ReadoutScheme"/>.</param>
/// <param name="EnsembleAtoms">Atoms per check.</param>
/// <param name="BankCount">1, or 2 when one set of checks works while the other is read.</param>
/// <param name="DataDisturbancePerSecond">Rate at which the light disturbs a data atom.</param>
public sealed record SecondSpecies(
    string Name,
    Detector Detector,
    double RecoolSeconds,
    int EnsembleAtoms,
    int BankCount,
    double DataDisturbancePerSecond) : ReadoutScheme(Name, Detector, RecoolSeconds)
{
    /// <inheritdoc/>
    public override string Kind => "second_species";

    /// <inheritdoc/>
    public override int Banks => BankCount;

    /// <inheritdoc/>
    public override int AtomsPerCheck => EnsembleAtoms;
}

/// <summary>Checks leave for a readout zone, or are exchanged for a fresh set.</summary>
/// <param name="Name">See <see cref="ReadoutScheme"/>.</param>
/// <param name="Detector">See <see cref="ReadoutScheme"/>.</param>
/// <param name="RecoolSeconds">See <see cref="ReadoutScheme"/>.</param>
/// <param name="DistanceMetres">Way to the readout zone; null when the exchange time is stated.</param>
/// <param name="ExchangeSeconds">Time to exchange the checks for a fresh set; null when they travel and return.</param>
/// <param name="ReadInRound">Whether the round waits for the image; false when checks are imaged later.</param>
/// <param name="BankCount">1, or 2 when one set of checks works while the other is read.</param>
/// <param name="DataDisturbancePerSecond">Rate at which the light disturbs a data atom.</param>
public sealed record MovedApart(
    string Name,
    Detector Detector,
    double RecoolSeconds,
    double? DistanceMetres,
    double? ExchangeSeconds,
    bool ReadInRound,
    int BankCount,
    double DataDisturbancePerSecond) : ReadoutScheme(Name, Detector, RecoolSeconds)
{
    /// <inheritdoc/>
    public override string Kind => "moved_apart";

    /// <inheritdoc/>
    public override int Banks => BankCount;

    /// <summary>An exchange needs the fresh set beside the one in use.</summary>
    public override int CheckSets => ExchangeSeconds is null ? BankCount : Math.Max(2, BankCount);
}

/// <summary>Checks are read where they are and the data atoms are not protected.</summary>
/// <param name="Name">See <see cref="ReadoutScheme"/>.</param>
/// <param name="Detector">See <see cref="ReadoutScheme"/>.</param>
/// <param name="RecoolSeconds">See <see cref="ReadoutScheme"/>.</param>
/// <param name="DataDisturbancePerSecond">Rate at which the light disturbs a data atom.</param>
public sealed record InPlace(
    string Name,
    Detector Detector,
    double RecoolSeconds,
    double DataDisturbancePerSecond) : ReadoutScheme(Name, Detector, RecoolSeconds)
{
    /// <inheritdoc/>
    public override string Kind => "in_place";
}
