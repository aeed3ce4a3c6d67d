using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Quantities;

namespace FtEstimate.Sizing;

/// <summary>Says why no machine meets the goal: what stands in the way, by how much, and which cause to blame.</summary>
internal static class NoAnswerFinder
{
    private const int Bisections = 10;

    private const double LowestNoiseFactor = 1e-3;

    private const double SecondsPerDay = 86_400;

    /// <summary>The explanation.</summary>
    public static NoAnswer Explain(SearchSpace space, FactoryChoice factories, SearchLimits limits)
    {
        OperatingPoint quietest = space.Points[0];
        OperatingState onePatch = quietest.At(MachineLoad.SinglePatch);
        double? factor = FactorNeeded(space, factories, limits);
        if (Closest(space, factories, limits.WithoutResources()) is { } candidate)
        {
            SizedMachine closest = new MachineDetail(space, factories).Of(candidate);
            double strength = closest.State.Strength.Mean;
            string sentence = $"A machine would do, but not within the limits: {OverLimits(closest, limits)}.{Relaxed(space, factories, limits)}{Lower(space, factor)}";
            return new NoAnswer(
                Obstacle.Limits, sentence, strength, factor * strength, BlameOf(closest.Ledger, strength, factor * strength), closest);
        }

        if (onePatch.Strength.Worse >= 1)
        {
            double strength = onePatch.Strength.Mean;
            string sentence = $"The noise is {Show.Significant(strength, 3)} times the threshold: no code distance helps.{Lower(space, factor)}";
            return new NoAnswer(
                Obstacle.AboveThreshold, sentence, strength, factor * strength, BlameOf(MachineDetail.LedgerOf(quietest, onePatch), strength, factor * strength), null);
        }

        OperatingState full = quietest.At(space.AtTypicalSize);
        bool unlimitedWouldDo = WithoutGroups(space) is { } unlimited
            && Closest(unlimited, new FactoryChoice(unlimited, new FactoryCatalogue()), limits.WithoutResources()) is not null;
        double mean = full.Strength.Mean;
        return new NoAnswer(
            Obstacle.FailureProbability,
            TooLarge(space, onePatch, full) + (unlimitedWouldDo ? GroupsAreTheObstacle : "") + Lower(space, factor),
            mean,
            factor * mean,
            BlameOf(MachineDetail.LedgerOf(quietest, full), mean, factor * mean),
            null);
    }

    private static string TooLarge(SearchSpace space, in OperatingState onePatch, in OperatingState full) =>
        $"No code distance up to {SearchSpace.LargestDistance} and no factory offered reaches the allowed failure probability. " +
        $"A single patch has a round of {Show.Duration(onePatch.Times.RoundSeconds)} and noise at {Show.Significant(onePatch.Strength.Mean, 2)} of the threshold; " +
        $"with all {Show.Significant(space.Layouts[0].Tiles, 3)} tiles at distance {SearchSpace.TypicalDistance} it is {Show.Duration(full.Times.RoundSeconds)} " +
        $"and {Show.Significant(full.Strength.Mean, 2)}, as limits on what is served at once lengthen the round.";

    private const string GroupsAreTheObstacle =
        " Without limits on the pairs, checks and atoms served at once a machine would do: these limits are the obstacle.";

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

    private static string Lower(SearchSpace space, double? factor)
    {
        string held = space.Scenario.Method.InjectedError is null ? "" : " The injected error is fixed by the scenario and stays as it is.";
        return factor switch
        {
            null => $" Lower noise alone is not enough.{held}",
            > 0.9 => $" All noise together would have to fall by {Show.Percent(1 - factor.Value)}.{held}",
            _ => $" All noise together would have to fall by a factor of {Show.Significant(1 / factor.Value, 2)}.{held}",
        };
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

    private static string OverLimits(SizedMachine closest, SearchLimits limits)
    {
        var over = new List<string>();
        if (closest.Atoms.Total > limits.AtomsAtMost)
        {
            over.Add($"the preferred machine takes {Show.Atoms(closest.Atoms.Total)} atoms, the limit is {Show.Atoms(limits.AtomsAtMost)}");
        }

        if (closest.Elapsed.Seconds is not { } elapsed)
        {
            over.Add("its run does not finish between stops");
        }
        else if (elapsed > limits.ElapsedAtMost)
        {
            over.Add($"it takes {Show.Significant(elapsed / SecondsPerDay, 4)} days, the limit is {Show.Significant(limits.ElapsedAtMost / SecondsPerDay, 4)}");
        }

        if (closest.LossPerSecond > limits.SupplyPerSecond)
        {
            over.Add($"it loses {Show.Atoms(closest.LossPerSecond)} atoms per second, {Show.Atoms(limits.SupplyPerSecond)} are delivered");
        }

        return over.Count > 0 ? string.Join("; ", over) : "each machine that keeps one of them breaks another";
    }

    /// <summary>For each limit the value that would do if the others stayed.</summary>
    private static string Relaxed(SearchSpace space, FactoryChoice factories, SearchLimits limits)
    {
        MachineDetail detail = new(space, factories);
        var enough = new List<string>();
        if (Least(limits with { AtomsAtMost = double.PositiveInfinity }, machine => machine.Atoms.Total) is { } atoms && atoms > limits.AtomsAtMost)
        {
            enough.Add($"{Show.Atoms(atoms)} atoms");
        }

        if (Least(limits with { ElapsedAtMost = double.PositiveInfinity }, machine => machine.Elapsed.Seconds ?? double.PositiveInfinity) is { } seconds
            && seconds > limits.ElapsedAtMost)
        {
            enough.Add($"{Show.Significant(seconds / SecondsPerDay, 4)} days on the wall clock");
        }

        if (Least(limits with { SupplyPerSecond = double.PositiveInfinity }, machine => machine.LossPerSecond) is { } supply
            && supply > limits.SupplyPerSecond)
        {
            enough.Add($"{Show.Atoms(supply)} atoms delivered per second");
        }

        return enough.Count > 0 ? $" What would do, with the other limits and the noise as they are: {string.Join(", or ", enough)}." : "";

        double? Least(SearchLimits relaxed, Func<SizedMachine, double> measure)
        {
            if (relaxed == limits)
            {
                return null;
            }

            double least = double.PositiveInfinity;
            foreach (Candidate candidate in AllOf(space, factories, relaxed))
            {
                least = Math.Min(least, measure(detail.Of(candidate)));
            }

            return double.IsFinite(least) ? least : null;
        }
    }

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
