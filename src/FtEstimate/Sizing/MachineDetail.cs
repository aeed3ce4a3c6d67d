using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Scenarios;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Sizing;

/// <summary>Works out in full what the search holds in short, with the factory at the exact noise.</summary>
internal sealed class MachineDetail(SearchSpace space, FactoryChoice factories)
{
    /// <summary>A candidate in full.</summary>
    public SizedMachine Of(Candidate candidate)
    {
        Scenario scenario = space.Scenario;
        LogicLayout layout = candidate.Layout;
        int distance = candidate.Distance;
        double tileAtoms = layout.Tiles * space.Patch.AtomsPerTile(distance);
        double factoryAtoms = (candidate.Factory?.Atoms ?? 0.0) * candidate.FactoryCount;
        double sites = tileAtoms + factoryAtoms;
        OperatingState state = CandidateTrial.StateAt(candidate.Point, layout, distance, sites);
        OperatingState unmoved = candidate.Point.At(MachineLoad.Of(sites, distance));
        Factory? factory = candidate.Factory is { } rounded ? factories.Exactly(rounded, candidate.Point, unmoved) : null;
        NoiseStrength strength = state.Strength * layout.NoiseFactor;
        double perRound = PatchError.PerRound(space.Law, strength, distance);
        TStateDemand demand = TStateDemand.For(
            scenario.Workload, space.Synthesis, candidate.RotationError > 0 ? candidate.RotationError : 0.5);
        double reaction = candidate.Point.ReactionSeconds(distance);
        RunClock clock = RunClock.Of(
            layout, demand, distance, state.Times.RoundSeconds, reaction, factory is null ? 0 : factory.RoundsPerOutput / candidate.FactoryCount, factory?.RoundsPerBatch ?? 0);
        FailureBudget failure = FailureBudget.Of(
            factories.TilesThatCount(layout, candidate.FactoryCount), clock, perRound, demand, factory?.OutputError ?? 0);
        AtomCount atoms = AtomCount.Of(tileAtoms, factoryAtoms, candidate.Point, scenario.Machine.Supply.SpareFraction);
        return new SizedMachine(
            layout,
            distance,
            candidate.Point,
            state,
            strength,
            perRound,
            PatchError.SuppressionFrom(space.Law, strength, distance),
            LedgerOf(candidate.Point, state),
            PhasesOf(candidate.Point, layout, distance, sites, state),
            atoms,
            OpticsNeed.Of(scenario.Machine.Apparatus, atoms.Total),
            demand,
            factory,
            candidate.FactoryCount,
            factory is null ? 0 : factories.Injected(candidate.Point, unmoved),
            clock,
            reaction,
            failure,
            ElapsedTime.Of(clock.RunSeconds, scenario.Workload.Shots, failure.Total, scenario.Machine.Running),
            AtomSupply.DemandPerSecond(sites, candidate.Point, state));
    }

    /// <summary>The ledger of an operating point; an abstract machine has one cause.</summary>
    public static ErrorLedger LedgerOf(OperatingPoint point, in OperatingState state) => point is AtomOperatingPoint atom
        ? atom.Noise.Ledger(state.Times)
        : new ErrorLedger([new ErrorChannel("Uniform error of every location", point.InjectedError(state), 1, state.Strength)]);

    private static ImmutableArray<CyclePhase> PhasesOf(
        OperatingPoint point, LogicLayout layout, int distance, double sites, in OperatingState state)
    {
        if (point is not AtomOperatingPoint atom)
        {
            return [new CyclePhase("Round, as stated", CyclePart.Gates, 0, state.Times.RoundSeconds, 1, DataState.InGates)];
        }

        ImmutableArray<CyclePhase> phases = atom.Noise.Cycle.Phases(MachineLoad.Of(sites, distance));
        double moves = layout.GatesPerRound * point.PatchMoveSeconds(distance);
        return moves > 0
            ? phases.Add(new CyclePhase(
                "Patch moves of transversal gates", CyclePart.Gates, state.Times.RoundSeconds - moves, moves, 1, DataState.Waiting))
            : phases;
    }
}
