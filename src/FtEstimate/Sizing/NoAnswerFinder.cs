using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.Noise;
using FtEstimate.Quantities;

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
        OperatingState state = quietest.At(MachineLoad.Of(2 * 9, 3));
        double strength = state.Strength.Mean;
        Candidate? closest = Closest(space, factories, limits.WithoutResources());
        double? factor = FactorNeeded(space, factories, limits);
        double? needed = factor * strength;
        SizedMachine? machine = closest is { } candidate ? new MachineDetail(space, factories).Of(candidate) : null;
        Obstacle obstacle = machine is not null ? Obstacle.Limits
            : state.Strength.Worse >= 1 ? Obstacle.AboveThreshold
            : Obstacle.FailureProbability;
        return new NoAnswer(
            obstacle,
            SentenceFor(obstacle, strength, needed, machine, limits)
                + (obstacle == Obstacle.Limits ? Relaxed(space, factories, limits) : ""),
            strength,
            needed,
            BlameOf(MachineDetail.LedgerOf(quietest, state), strength, needed),
            machine);
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
        return found.Count > 0 ? MachineSizing.Preferred(found, space.Scenario.Goal.Prefer) : null;
    }

    private static List<Candidate> AllOf(SearchSpace space, FactoryChoice factories, SearchLimits limits) =>
    [
        .. new MachineSearch(space, factories, limits, LogicStyle.LatticeSurgery).Run(),
        .. new MachineSearch(space, factories, limits, LogicStyle.Transversal).Run(),
    ];

    private static string SentenceFor(
        Obstacle obstacle, double strength, double? needed, SizedMachine? closest, SearchLimits limits)
    {
        string lower = needed is { } value
            ? $" All noise together would have to fall by a factor of {Show.Significant(strength / value, 2)}."
            : " Lower noise alone is not enough.";
        return obstacle switch
        {
            Obstacle.AboveThreshold =>
                $"The noise is {Show.Significant(strength, 3)} times the threshold: no code distance helps.{lower}",
            Obstacle.FailureProbability =>
                $"No code distance up to {SearchSpace.LargestDistance} and no factory offered reaches the allowed failure probability " +
                $"at {Show.Significant(strength, 2)} of the threshold.{lower}",
            _ => $"A machine would do, but not within the limits: {OverLimits(closest!, limits)}.{lower}",
        };
    }

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
            over.Add($"it takes {Show.Duration(elapsed)}, the limit is {Show.Duration(limits.ElapsedAtMost)}");
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
            enough.Add($"{Show.Duration(seconds)} on the wall clock");
        }

        if (Least(limits with { SupplyPerSecond = double.PositiveInfinity }, machine => machine.LossPerSecond) is { } supply
            && supply > limits.SupplyPerSecond)
        {
            enough.Add($"{Show.Atoms(supply)} atoms delivered per second");
        }

        return enough.Count > 0 ? $" What would do, the other limits kept: {string.Join(", or ", enough)}." : "";

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
