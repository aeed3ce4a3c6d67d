using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Noise;

namespace FtEstimate.Sizing;

/// <summary>Says why no machine meets the goal: what stands in the way, by how much, and which cause to blame.</summary>
internal static class NoAnswerFinder
{
    private const int Bisections = 10;

    private const double LowestNoiseFactor = 1e-3;

    /// <summary>The explanation.</summary>
    public static NoAnswer Explain(SearchSpace space, FactoryChoice factories, SearchLimits limits)
    {
        OperatingPoint quietest = space.Points[0];
        OperatingState onePatch = quietest.At(MachineLoad.SinglePatch);
        OperatingState full = quietest.At(space.AtTypicalSize);
        double? factor = FactorNeeded(space, factories, limits);
        SizedMachine? closest = Closest(space, factories, limits.WithoutResources()) is { } candidate
            ? new MachineDetail(space, factories).Of(candidate)
            : null;
        Obstacle reason = closest is not null ? Obstacle.Limits
            : onePatch.Strength.Worse >= 1 ? Obstacle.AboveThreshold
            : Obstacle.FailureProbability;
        ErrorLedger ledger = closest?.Ledger ?? MachineDetail.LedgerOf(quietest, reason == Obstacle.AboveThreshold ? onePatch : full);
        double strength = ledger.Total.Mean;
        return new NoAnswer(
            reason,
            strength,
            factor,
            BlameOf(ledger, strength, factor * strength),
            PaceOf(onePatch),
            PaceOf(full),
            reason == Obstacle.FailureProbability && GroupsStandInTheWay(space, limits),
            closest,
            closest is null ? [] : LimitsInTheWay(closest, space, factories, limits));
    }

    private static PatchPace PaceOf(in OperatingState state) => new(state.Times.RoundSeconds, state.Strength.Mean);

    private static bool GroupsStandInTheWay(SearchSpace space, SearchLimits limits) => WithoutGroups(space) is { } unlimited
        && Closest(unlimited, new FactoryChoice(unlimited, new FactoryCatalogue()), limits.WithoutResources()) is not null;

    /// <summary>The same search with everything served at once; null for an abstract machine.</summary>
    private static SearchSpace? WithoutGroups(SearchSpace space)
    {
        if (space.Scenario.Machine.Apparatus is not AtomArray array)
        {
            return null;
        }

        AtomArray unlimited = array with
        {
            Gates = array.Gates with { CzPairsAtOnce = double.PositiveInfinity, OneQubitAtOnce = double.PositiveInfinity },
            Reach = array.Reach is MovedAtoms moved ? moved with { MovedAtOnce = double.PositiveInfinity } : array.Reach,
            Readout = array.Readout is Shelved shelved ? shelved with { SelectAtOnce = double.PositiveInfinity } : array.Readout,
        };
        return SearchSpace.Of(space.Scenario with { Machine = space.Scenario.Machine with { Apparatus = unlimited } });
    }

    private static ImmutableArray<BlamedChannel> BlameOf(ErrorLedger ledger, double strength, double? needed) =>
    [
        .. ledger.Channels.Select(channel =>
        {
            double excess = strength - (needed ?? 0);
            double left = channel.Strength.Mean - excess;
            double? alone = needed is not null && left >= 0 ? channel.PerLocation * left / channel.Strength.Mean : null;
            return new BlamedChannel(channel.Name, ledger.Share(channel), channel.PerLocation, alone);
        }),
    ];

    /// <summary>The factor on all noise at which some machine meets the goal, to one per cent; null when none does.</summary>
    private static double? FactorNeeded(SearchSpace space, FactoryChoice factories, SearchLimits limits)
    {
        if (!Feasible(LowestNoiseFactor))
        {
            return null;
        }

        double low = LowestNoiseFactor;
        double high = 1;
        for (int i = 0; i < Bisections; i++)
        {
            double middle = Math.Sqrt(low * high);
            if (Feasible(middle))
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return low;

        bool Feasible(double factor)
        {
            SearchSpace quieter = space with { Points = [.. space.Points.Select(point => new QuieterPoint(point, factor))] };
            return Closest(quieter, factories, limits) is not null;
        }
    }

    private static Candidate? Closest(SearchSpace space, FactoryChoice factories, SearchLimits limits)
    {
        List<Candidate> found = AllOf(space, factories, limits);
        return found.Count > 0 ? MachineSizing.Preferred(found, space.Scenario.Goal.Prefer, space.Scenario.Machine.Running) : null;
    }

    private static List<Candidate> AllOf(SearchSpace space, FactoryChoice factories, SearchLimits limits) =>
    [
        .. new MachineSearch(space, factories, limits, LogicStyle.LatticeSurgery).Run(),
        .. new MachineSearch(space, factories, limits, LogicStyle.Transversal).Run(),
    ];

    /// <summary>The limits that the preferred machine breaks, or without which some machine would do; each relaxed while the others stay.</summary>
    private static ImmutableArray<LimitInTheWay> LimitsInTheWay(
        SizedMachine preferred, SearchSpace space, FactoryChoice factories, SearchLimits limits)
    {
        MachineDetail detail = new(space, factories);
        var inTheWay = ImmutableArray.CreateBuilder<LimitInTheWay>();
        Consider(LimitedResource.Atoms, limits.AtomsAtMost, limits with { AtomsAtMost = double.PositiveInfinity });
        Consider(LimitedResource.ElapsedSeconds, limits.ElapsedAtMost, limits with { ElapsedAtMost = double.PositiveInfinity });
        Consider(LimitedResource.AtomsPerSecond, limits.SupplyPerSecond, limits with { SupplyPerSecond = double.PositiveInfinity });
        return inTheWay.ToImmutable();

        void Consider(LimitedResource resource, double allowed, SearchLimits relaxed)
        {
            if (double.IsPositiveInfinity(allowed))
            {
                return;
            }

            double least = double.PositiveInfinity;
            foreach (Candidate candidate in AllOf(space, factories, relaxed))
            {
                least = Math.Min(least, Taken(resource, detail.Of(candidate)) ?? double.PositiveInfinity);
            }

            double? enough = double.IsFinite(least) && least > allowed ? least : null;
            double? taken = Taken(resource, preferred);
            if (enough is not null || !(taken <= allowed))
            {
                inTheWay.Add(new LimitInTheWay(resource, allowed, taken, enough));
            }
        }
    }

    private static double? Taken(LimitedResource resource, SizedMachine machine) => resource switch
    {
        LimitedResource.Atoms => machine.Atoms.Total,
        LimitedResource.ElapsedSeconds => machine.Elapsed.Seconds,
        LimitedResource.AtomsPerSecond => machine.LossPerSecond,
        _ => throw new ArgumentOutOfRangeException(nameof(resource)),
    };

    /// <summary>An operating point with all noise scaled.</summary>
    private sealed class QuieterPoint(OperatingPoint point, double factor) : OperatingPoint
    {
        public override int CheckAtomsPerSite => point.CheckAtomsPerSite;

        public override int CheckAtomsInUse => point.CheckAtomsInUse;

        public override CycleTimes Times(in MachineLoad load, double extraWaitingSeconds = 0) =>
            point.Times(load, extraWaitingSeconds);

        public override OperatingState StateOf(in CycleTimes times)
        {
            OperatingState state = point.StateOf(times);
            return state with
            {
                Strength = state.Strength * factor,
                Loss = new AtomLoss(state.Loss.PerGateSlot * factor, state.Loss.DataPerRound * factor, state.Loss.CheckPerRound * factor),
            };
        }

        public override double InjectedError(in OperatingState state) => point.InjectedError(state) * factor;

        public override double ReactionSeconds(int distance) => point.ReactionSeconds(distance);

        public override double PatchMoveSeconds(int distance) => point.PatchMoveSeconds(distance);
    }
}
