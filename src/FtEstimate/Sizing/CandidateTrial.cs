using FtEstimate.Cycles;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Scenarios;
using FtEstimate.SurfaceCode;
using FtEstimate.Workloads;

namespace FtEstimate.Sizing;

/// <summary>A layout at one distance before factories: the bounds that every machine built on it keeps.</summary>
/// <param name="Point">Readout and exposure.</param>
/// <param name="Layout">Style and block.</param>
/// <param name="Distance">Code distance.</param>
/// <param name="TileAtoms">Atoms of the tiles.</param>
/// <param name="Atoms">All atoms without factories.</param>
/// <param name="Strength">Noise strength with its transversal gates.</param>
/// <param name="LeastTStates">T states when the rotations may use what the patches leave of the allowed failure: no machine needs fewer.</param>
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
    private TStateDemand? _leastDemand;

    /// <summary>Demand when the rotations may use the whole allowed failure: no machine needs less.</summary>
    private TStateDemand LeastDemand => _leastDemand ??= TStateDemand.For(
        _scenario.Workload, space.Synthesis, RotationErrorWithin(limits.FaultsAtMost));

    /// <summary>T states that every machine needs at least.</summary>
    public double LeastTStates => LeastDemand.TStates;

    /// <summary>The bounds of a layout at a distance.</summary>
    public TrialBase WithoutFactories(OperatingPoint point, LogicLayout layout, int distance)
    {
        double tileAtoms = layout.Tiles * space.Patch.AtomsPerTile(distance);
        double atoms = AtomCount.Of(tileAtoms, 0, point, _scenario.Machine.Supply.SpareFraction).Total;
        OperatingState state = StateAt(point, layout, distance, tileAtoms);
        NoiseStrength strength = state.Strength * layout.NoiseFactor;
        RunClock clock = RunClock.Of(
            layout, LeastDemand, distance, state.Times.RoundSeconds, point.ReactionSeconds(distance), 0);
        double perRound = PatchError.PerRound(space.Law, strength, distance);
        double patchFailure = FailureComposition.ExpectedFaults(layout.Tiles * clock.Rounds, perRound);
        return new TrialBase(
            point,
            layout,
            distance,
            tileAtoms,
            atoms,
            strength,
            TStatesBeside(patchFailure),
            clock.RunSeconds,
            patchFailure);
    }

    /// <summary>T states when the rotations may use what the patches leave of the allowed failure.</summary>
    private double TStatesBeside(double patchFailure)
    {
        double left = limits.Each ? limits.FaultsAtMost : limits.FaultsAtMost - patchFailure;
        return left <= 0
            ? LeastDemand.TStates
            : TStateDemand.For(_scenario.Workload, space.Synthesis, RotationErrorWithin(left)).TStates;
    }

    /// <summary>Shortest run at a given round time, patch moves included, with unlimited supply.</summary>
    public double RunAtRound(in TrialBase bare, double roundSeconds) => RunClock.Of(
        bare.Layout, LeastDemand, bare.Distance, roundSeconds, bare.Point.ReactionSeconds(bare.Distance), 0).RunSeconds;

    /// <summary>Round time with so many sites.</summary>
    public static double RoundAtLoad(in TrialBase bare, double sites) =>
        TimesAt(bare.Point, bare.Layout, bare.Distance, sites).RoundSeconds;

    /// <summary>Judges one machine and offers it to the unbeaten ones when it meets the goal.</summary>
    public void Try(in TrialBase bare, Factory? factory, int count, UnbeatenSet unbeaten)
    {
        double factoryAtoms = (factory?.Atoms ?? 0.0) * count;
        double atoms = AtomCount.Of(bare.TileAtoms, factoryAtoms, bare.Point, _scenario.Machine.Supply.SpareFraction).Total;
        double leastFaultyStates = FailureComposition.ExpectedFaults(bare.LeastTStates, factory?.OutputError ?? 0);
        double leftForRotations = limits.Each ? limits.FaultsAtMost : limits.FaultsAtMost - bare.PatchFailure - leastFaultyStates;
        if (atoms > limits.AtomsAtMost || leftForRotations <= 0 || leastFaultyStates > limits.FaultsAtMost)
        {
            return;
        }

        CycleTimes times = TimesAt(bare.Point, bare.Layout, bare.Distance, bare.TileAtoms + factoryAtoms);
        Pacing pacing = new(
            bare, times.RoundSeconds, bare.Point.ReactionSeconds(bare.Distance), factory is null ? 0 : factory.RoundsPerOutput / count, factory?.RoundsPerBatch ?? 0);
        TStateDemand demand = TStateDemand.For(_scenario.Workload, space.Synthesis, RotationErrorWithin(leftForRotations));
        if (unbeaten.Beats(atoms, pacing.Clock(demand).RunSeconds))
        {
            return;
        }

        OperatingState state = bare.Point.StateOf(times);
        if (AtomSupply.DemandPerSecond(bare.TileAtoms + factoryAtoms, bare.Point, state) > limits.SupplyPerSecond)
        {
            return;
        }

        double tiles = factories.TilesThatCount(bare.Layout, count);
        double perRound = PatchError.PerRound(space.Law, state.Strength * bare.Layout.NoiseFactor, bare.Distance);
        if (CoarsestRotations(pacing, demand, tiles, perRound, factory?.OutputError ?? 0) is { } found
            && KeepsElapsed(found.Clock.RunSeconds, found.Failure.Total))
        {
            unbeaten.Offer(new Candidate(
                bare.Point, bare.Layout, bare.Distance, factory, count, found.RotationError, atoms, found.Clock.RunSeconds));
        }
    }

    /// <summary>The coarsest rotations, and so the fewest T states, with which the goal is met; null when none are fine enough.</summary>
    private MetGoal? CoarsestRotations(in Pacing pacing, TStateDemand demand, double tiles, double errorPerRound, double errorPerState)
    {
        while (true)
        {
            RunClock clock = pacing.Clock(demand);
            FailureBudget failure = FailureBudget.Of(tiles, clock, errorPerRound, demand, errorPerState);
            if (failure.Meets(limits.FailureAtMost, limits.Each))
            {
                return new MetGoal(clock, failure, demand.RotationError);
            }

            bool finerHelps = _scenario.Workload is { Rotations: > 0, RotationError: null }
                && failure.Patches + failure.MagicStates < limits.FaultsAtMost;
            if (!finerHelps)
            {
                return null;
            }

            demand = TStateDemand.For(_scenario.Workload, space.Synthesis, demand.RotationError * Math.Pow(2, -RotationBitStep));
        }
    }

    /// <summary>Times and noise of a layout with a number of sites, patch moves included.</summary>
    public static OperatingState StateAt(OperatingPoint point, LogicLayout layout, int distance, double sites) =>
        point.StateOf(TimesAt(point, layout, distance, sites));

    /// <summary>Durations of a layout with a number of sites, patch moves included.</summary>
    public static CycleTimes TimesAt(OperatingPoint point, LogicLayout layout, int distance, double sites) =>
        point.Times(MachineLoad.Of(sites, distance), ExtraWaiting(point, layout, distance));

    private static double ExtraWaiting(OperatingPoint point, LogicLayout layout, int distance) =>
        layout.GatesPerRound > 0 ? layout.GatesPerRound * point.PatchMoveSeconds(distance) : 0;

    /// <summary>The coarsest rotation error on the grid with which all rotations together keep to a number of faults.</summary>
    private double RotationErrorWithin(double faults)
    {
        Workload workload = _scenario.Workload;
        if (workload.RotationError is { } stated)
        {
            return stated;
        }

        double bits = workload.Rotations > 0 ? Math.Max(1, Math.Log2(workload.Rotations / faults)) : 1;
        return Math.Pow(2, -Math.Ceiling(bits / RotationBitStep) * RotationBitStep);
    }

    private bool KeepsElapsed(double runSeconds, double failure) =>
        double.IsPositiveInfinity(limits.ElapsedAtMost)
        || (ElapsedTime.Of(runSeconds, _scenario.Workload.Shots, failure, _scenario.Machine.Running).Seconds is { } elapsed
            && elapsed <= limits.ElapsedAtMost);

    /// <summary>What sets the clock of one machine, whatever its rotations cost.</summary>
    private readonly record struct Pacing(
        TrialBase Bare, double RoundSeconds, double ReactionSeconds, double SupplyRoundsPerT, double BatchRounds)
    {
        public RunClock Clock(in TStateDemand demand) =>
            RunClock.Of(Bare.Layout, demand, Bare.Distance, RoundSeconds, ReactionSeconds, SupplyRoundsPerT, BatchRounds);
    }

    private readonly record struct MetGoal(RunClock Clock, FailureBudget Failure, double RotationError);
}
