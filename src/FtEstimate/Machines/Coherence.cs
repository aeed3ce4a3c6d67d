namespace FtEstimate.Machines;

/// <summary>How waiting atoms decay.</summary>
/// <param name="T1Seconds">Relaxation time; infinite when not limiting.</param>
/// <param name="T2Seconds">Coherence time under decoupling, at most twice T1.</param>
/// <param name="EchoPulsesPerRound">Decoupling pulses on each data atom per round; each costs one one-qubit error.</param>
/// <param name="VacuumLifetimeSeconds">Trap lifetime; infinite when not limiting.</param>
/// <param name="LossCheck">How lost data atoms are found.</param>
public sealed record Coherence(
    double T1Seconds,
    double T2Seconds,
    double EchoPulsesPerRound,
    double VacuumLifetimeSeconds,
    DataLossCheck LossCheck);

/// <summary>How lost data atoms are found, and how often.</summary>
/// <param name="Method">The operation that tells.</param>
/// <param name="EveryRounds">Rounds between two looks, at least 1; with no check, the rounds until the run's own readout tells.</param>
public sealed record DataLossCheck(LossCheckMethod Method, double EveryRounds);

/// <summary>The operation that tells whether a data atom is lost.</summary>
public enum LossCheckMethod
{
    /// <summary>Data and checks trade places, so that the data atom is read as a check: one more CZ layer.</summary>
    Swap,

    /// <summary>An extra atom probes each data atom: two more CZ layers and one more readout.</summary>
    ExtraCheck,

    /// <summary>Nothing during the run.</summary>
    None,
}
