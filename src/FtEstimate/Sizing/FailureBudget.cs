using FtEstimate.Quantities;

namespace FtEstimate.Sizing;

/// <summary>Where the failure of one shot comes from; each part as the expected number of faults.</summary>
/// <param name="Patches">Logical errors of tiles.</param>
/// <param name="MagicStates">Faulty magic states.</param>
/// <param name="Synthesis">Inexact rotations.</param>
public readonly record struct FailureBudget(double Patches, double MagicStates, double Synthesis)
{
    /// <summary>Failure probability of one shot: 1 − exp(−sum), since the parts are independent and each fault is rare.</summary>
    public double Total => FailureComposition.OfExpected(Patches + MagicStates + Synthesis);

    /// <summary>Whether a goal is met.</summary>
    /// <param name="allowed">Failure probability allowed.</param>
    /// <param name="each">Whether each part may use all of it on its own, as some papers count.</param>
    public bool Meets(double allowed, bool each) => each
        ? FailureComposition.OfExpected(Math.Max(Patches, Math.Max(MagicStates, Synthesis))) <= allowed
        : Total <= allowed;

    /// <summary>The budget of one machine.</summary>
    /// <param name="tiles">Tiles whose logical errors count.</param>
    /// <param name="clock">Its clock.</param>
    /// <param name="errorPerRound">Any logical error of one tile in one round.</param>
    /// <param name="demand">Magic states and rotations.</param>
    /// <param name="errorPerState">Error of one magic state.</param>
    public static FailureBudget Of(double tiles, in RunClock clock, double errorPerRound, in TStateDemand demand, double errorPerState) => new(
        FailureComposition.ExpectedFaults(tiles * clock.Rounds, errorPerRound),
        FailureComposition.ExpectedFaults(demand.TStates, errorPerState),
        demand.SynthesisFailure);
}
