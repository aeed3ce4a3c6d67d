using FtEstimate.Cycles;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Scenarios;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Sizing;

/// <summary>A layout at one distance before factories: the bounds that every machine built on it keeps.</summary>
/// <param name="Point">Readout and exposure.</param>
/// <param name="Layout">Style and block.</param>
/// <param name="Distance">Code distance.</param>
/// <param name="TileAtoms">Atoms of the tiles.</param>
/// <param name="Atoms">All atoms without factories.</param>
/// <param name="Strength">Noise strength with its transversal gates.</param>
/// <param name="LeastTStates">T states when the rotations may use the whole allowed failure.</param>
/// <param name="RunSeconds">Run time with unlimited supply: no machine is faster.</param>
/// <param name="PatchFailure">Expected logical faults of the tiles then: no machine has fewer.</param>
internal readonly record struct TrialBase(
    OperatingPoint Point,
    LogicLayout Layout,
    int Distance,
    double TileAtoms,
    double Atoms,
    NoiseStrength Strength,
    double LeastTStates,
    double RunSeconds,
    double PatchFailure);

/// <summary>Times, counts and judges one machine after another.</summary>
internal sealed class CandidateTrial(SearchSpace space, FactoryChoice factories, SearchLimits limits)
{
    /// <summary>Rotation errors are powers of two with exponents in halves.</summary>
    private const double RotationBitStep = 0.5;

    private readonly Scenario _scenario = space.Scenario;
    private readonly TStateDemand _leastDemand = TStateDemand.For(
        space.Scenario.Workload, space.Synthesis, FirstRotationError(space.Scenario, limits));

    /// <summary>The bounds of a layout at a distance.</summary>
    public TrialBase WithoutFactories(OperatingPoint point, LogicLayout layout, int distance)
    {
        double tileAtoms = layout.Tiles * space.Patch.AtomsPerTile(distance);
        double atoms = AtomCount.Of(tileAtoms, 0, point, _scenario.Machine.Supply.SpareFraction).Total;
        OperatingState state = StateAt(point, layout, distance, tileAtoms);
        NoiseStrength strength = state.Strength * layout.NoiseFactor;
        RunClock clock = RunClock.Of(
            layout, _leastDemand, distance, state.Times.RoundSeconds, point.ReactionSeconds(distance), 0);
        double perRound = PatchError.PerRound(space.Law, strength, distance);
        return new TrialBase(
            point,
            layout,
            distance,
            tileAtoms,
            atoms,
            strength,
            _leastDemand.TStates,
            clock.RunSeconds,
            FailureComposition.ExpectedFaults(layout.Tiles * clock.Rounds, perRound));
    }

    /// <summary>Shortest run at a given round time, with unlimited supply.</summary>
    public double RunAtLoad(in TrialBase bare, double roundSeconds) => RunClock.Of(
        bare.Layout, _leastDemand, bare.Distance, roundSeconds + ExtraWaiting(bare.Point, bare.Layout, bare.Distance),
        bare.Point.ReactionSeconds(bare.Distance), 0).RunSeconds;

    /// <summary>Round time with so many sites.</summary>
    public static double RoundAtLoad(in TrialBase bare, double sites) =>
        TimesAt(bare.Point, bare.Layout, bare.Distance, sites).RoundSeconds;

    /// <summary>Judges one machine and offers it to the unbeaten ones when it meets the goal.</summary>
    public void Try(in TrialBase bare, Factory? factory, int count, UnbeatenSet unbeaten)
    {
        double factoryAtoms = (factory?.Atoms ?? 0.0) * count;
        double atoms = AtomCount.Of(bare.TileAtoms, factoryAtoms, bare.Point, _scenario.Machine.Supply.SpareFraction).Total;
        double supplyRoundsPerT = factory is null ? 0 : factory.RoundsPerOutput / count;
        if (atoms > limits.AtomsAtMost || unbeaten.Beats(atoms, bare.RunSeconds))
        {
            return;
        }

        CycleTimes times = TimesAt(bare.Point, bare.Layout, bare.Distance, bare.TileAtoms + factoryAtoms);
        double reaction = bare.Point.ReactionSeconds(bare.Distance);
        RunClock shortest = RunClock.Of(
            bare.Layout, _leastDemand, bare.Distance, times.RoundSeconds, reaction, supplyRoundsPerT);
        if (unbeaten.Beats(atoms, shortest.RunSeconds))
        {
            return;
        }

        OperatingState state = bare.Point.StateOf(times);

        double perRound = PatchError.PerRound(space.Law, state.Strength * bare.Layout.NoiseFactor, bare.Distance);
        double tiles = bare.Layout.Tiles + (factories.CountsAsTiles ? TileFactory.Tiles * count : 0);
        double rotationError = FirstRotationError(_scenario, limits);
        while (true)
        {
            TStateDemand demand = TStateDemand.For(_scenario.Workload, space.Synthesis, rotationError);
            RunClock clock = RunClock.Of(
                bare.Layout, demand, bare.Distance, state.Times.RoundSeconds, reaction, supplyRoundsPerT);
            FailureBudget failure = new(
                FailureComposition.ExpectedFaults(tiles * clock.Rounds, perRound),
                FailureComposition.ExpectedFaults(demand.TStates, factory?.OutputError ?? 0),
                demand.SynthesisFailure);
            if (failure.Meets(limits.FailureAtMost, limits.Each))
            {
                if (KeepsLimits(bare, state, factoryAtoms, clock.RunSeconds, failure.Total))
                {
                    unbeaten.Offer(new Candidate(
                        bare.Point, bare.Layout, bare.Distance, factory, count, demand.RotationError, atoms, clock.RunSeconds));
                }

                return;
            }

            bool finerHelps = _scenario.Workload is { Rotations: > 0, RotationError: null }
                && failure.Patches + failure.MagicStates < limits.FailureAtMost;
            if (!finerHelps)
            {
                return;
            }

            rotationError *= Math.Pow(2, -RotationBitStep);
        }
    }

    /// <summary>Times and noise of a layout with a number of sites, patch moves included.</summary>
    public static OperatingState StateAt(OperatingPoint point, LogicLayout layout, int distance, double sites) =>
        point.StateOf(TimesAt(point, layout, distance, sites));

    private static CycleTimes TimesAt(OperatingPoint point, LogicLayout layout, int distance, double sites) =>
        point.Times(MachineLoad.Of(sites, distance), ExtraWaiting(point, layout, distance));

    private static double ExtraWaiting(OperatingPoint point, LogicLayout layout, int distance) =>
        layout.GatesPerRound > 0 ? layout.GatesPerRound * point.PatchMoveSeconds(distance) : 0;

    /// <summary>The coarsest rotation error worth trying: all rotations together use the whole allowed failure.</summary>
    private static double FirstRotationError(Scenario scenario, SearchLimits limits)
    {
        if (scenario.Workload.RotationError is { } stated)
        {
            return stated;
        }

        double bits = scenario.Workload.Rotations > 0 ? Math.Log2(scenario.Workload.Rotations / limits.FailureAtMost) : 1;
        return Math.Pow(2, -Math.Ceiling(bits / RotationBitStep) * RotationBitStep);
    }

    private bool KeepsLimits(in TrialBase bare, in OperatingState state, double factoryAtoms, double runSeconds, double failure)
    {
        if (AtomSupply.DemandPerSecond(bare.TileAtoms + factoryAtoms, bare.Point, state) > limits.SupplyPerSecond)
        {
            return false;
        }

        return double.IsPositiveInfinity(limits.ElapsedAtMost)
            || (ElapsedTime.Of(runSeconds, _scenario.Workload.Shots, failure, _scenario.Machine.Running).Seconds is { } elapsed
                && elapsed <= limits.ElapsedAtMost);
    }
}
