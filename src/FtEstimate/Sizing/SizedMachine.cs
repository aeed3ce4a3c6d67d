using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Sizing;

/// <summary>One machine that meets the goal, in full.</summary>
/// <param name="Layout">Style and block.</param>
/// <param name="Distance">Code distance.</param>
/// <param name="Point">Readout and exposure.</param>
/// <param name="State">Times and noise at its size.</param>
/// <param name="Strength">Noise strength with its transversal gates.</param>
/// <param name="LogicalErrorPerRound">Any logical error of one patch in one round.</param>
/// <param name="Suppression">Λ from its distance to the next.</param>
/// <param name="Ledger">Every cause of error.</param>
/// <param name="Phases">The phases of a round.</param>
/// <param name="Atoms">What the atoms are for.</param>
/// <param name="Optics">Sites, field of view and trap power.</param>
/// <param name="Demand">Magic states and depth.</param>
/// <param name="Factory">The factory at the exact noise; null when no magic states are needed.</param>
/// <param name="FactoryCount">How many.</param>
/// <param name="InjectedError">Pauli probability of an injected T state; 0 when no magic states are needed.</param>
/// <param name="Clock">What sets the pace.</param>
/// <param name="ReactionSeconds">One reaction.</param>
/// <param name="Failure">Where the failure of one shot comes from.</param>
/// <param name="Elapsed">Expected time on the wall clock, all shots.</param>
/// <param name="LossPerSecond">Atoms to be replaced per second.</param>
public sealed record SizedMachine(
    LogicLayout Layout,
    int Distance,
    OperatingPoint Point,
    OperatingState State,
    NoiseStrength Strength,
    double LogicalErrorPerRound,
    Suppression Suppression,
    ErrorLedger Ledger,
    ImmutableArray<CyclePhase> Phases,
    AtomCount Atoms,
    OpticsNeed Optics,
    TStateDemand Demand,
    Factory? Factory,
    int FactoryCount,
    double InjectedError,
    RunClock Clock,
    double ReactionSeconds,
    FailureBudget Failure,
    ElapsedTime Elapsed,
    double LossPerSecond)
{
    /// <summary>Run time of one shot.</summary>
    public double RunSeconds => Clock.RunSeconds;

    /// <summary>Atoms times run time of one shot, in atom hours.</summary>
    public double AtomHours => Atoms.Total * RunSeconds / 3600;
}
