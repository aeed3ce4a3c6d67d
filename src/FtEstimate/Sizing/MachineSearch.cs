using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.MagicStates;
using FtEstimate.Noise;

namespace FtEstimate.Sizing;

/// <summary>
/// The joint search over exposures, layouts, distances, factory designs and counts. It is exhaustive on its grids; what it skips is beaten by a machine
/// already found, by bounds that hold for every machine skipped (fewest atoms, shortest run).
/// </summary>
internal sealed class MachineSearch(SearchSpace space, FactoryChoice factories, SearchLimits limits, LogicStyle style)
{
    /// <summary>Machine sizes are walked in steps of this ratio; within a step all factories see the noise of its upper end.</summary>
    private const double SizeStep = 1.2;

    /// <summary>Once the tiles take less than this share of the allowed failure even in the slowest run, a larger distance buys nothing.</summary>
    private const double NegligibleShare = 0.05;

    /// <summary>At most this many factory counts are tried within one size step.</summary>
    private const int CountsPerSizeStep = 4;

    /// <summary>Noise is that of the upper end of a size step and rounded up where factories are looked up: a lower bound must take that back.</summary>
    private const double SafetyOfRounding = 0.7;

    private readonly CandidateTrial _trial = new(space, factories, limits);
    private readonly UnbeatenSet _unbeaten = new();

    /// <summary>Factories by size step, for the operating point being searched.</summary>
    private readonly Dictionary<int, FactoryOffer> _offers = [];

    /// <summary>Unbeaten machines of one style, fewest atoms first; empty when none meets the goal.</summary>
    public IReadOnlyList<Candidate> Run()
    {
        ImmutableArray<LeanerLayouts> layouts = LeanerLayouts.Of(space.Layouts, style);
        foreach (OperatingPoint point in space.Points)
        {
            _offers.Clear();
            foreach (LeanerLayouts layout in layouts)
            {
                SearchDistances(point, layout);
            }
        }

        return _unbeaten.Members;
    }

    private void SearchDistances(OperatingPoint point, LeanerLayouts layouts)
    {
        LogicLayout layout = layouts.Layout;
        for (int distance = SmallestWorthTrying(point, layout); distance <= SearchSpace.LargestDistance; distance += 2)
        {
            TrialBase bare = _trial.WithoutFactories(point, layout, distance);
            if (IsHopeless(bare))
            {
                // a larger distance has more atoms, longer layers and a longer run
                return;
            }

            if (bare.PatchFailure >= limits.FaultsAtMost)
            {
                continue;
            }

            double slowest = SearchFactories(bare, layouts.Leaner);
            if (bare.PatchFailure * slowest <= NegligibleShare * limits.FaultsAtMost * bare.RunSeconds)
            {
                return;
            }
        }
    }

    private bool IsHopeless(in TrialBase bare) =>
        bare.Strength.Worse >= 1
        || bare.Atoms > limits.AtomsAtMost
        || bare.RunSeconds > limits.ElapsedAtMost
        || _unbeaten.Beats(bare.Atoms, bare.RunSeconds);

    /// <summary>The smallest distance whose tiles alone keep the allowed failure, found in strides; the smallest of all when no stride meets one.</summary>
    private int SmallestWorthTrying(OperatingPoint point, LogicLayout layout)
    {
        const int smallest = 3;
        const int stride = 8;
        for (int distance = smallest; distance <= SearchSpace.LargestDistance; distance += stride)
        {
            TrialBase bare = _trial.WithoutFactories(point, layout, distance);
            if (bare.Strength.Worse >= 1)
            {
                break;
            }

            if (bare.PatchFailure < limits.FaultsAtMost)
            {
                return Math.Max(smallest, distance - stride + 2);
            }
        }

        return smallest;
    }

    /// <summary>Tries factories and counts; returns the longest run among them, since the patches of a slow machine fail more often.</summary>
    private double SearchFactories(in TrialBase bare, ImmutableArray<LogicLayout> leaner)
    {
        double slowest = bare.RunSeconds;
        if (bare.LeastTStates <= 0)
        {
            _trial.Try(bare, null, 0, _unbeaten);
            return slowest;
        }

        // the same for all layouts and distances, so that they share the catalogue's memory
        double errorAtMost = limits.FaultsAtMost / _trial.LeastTStates;
        for (int step = SizeStepOf(bare.TileAtoms + LeastFactoryAtoms(bare, leaner, errorAtMost)); ; step++)
        {
            double low = Math.Pow(SizeStep, step);
            double high = low * SizeStep;
            CycleTimes longest = CandidateTrial.TimesAt(bare.Point, bare.Layout, bare.Distance, high);
            FactoryOffer offer = OfferAt(bare, step, errorAtMost);
            if (offer.IsAboveThreshold || NeedsMoreAtomsThanDelivered(bare, low, longest))
            {
                return slowest;
            }

            double leastRoundSeconds = CandidateTrial.RoundAtLoad(bare, Math.Max(low, bare.TileAtoms));
            double leastAtoms = bare.Atoms + Math.Max(0, low - bare.TileAtoms);
            if (_unbeaten.Beats(leastAtoms, _trial.RunAtRound(bare, leastRoundSeconds)))
            {
                // larger still is beaten too: more atoms, longer rounds
                return slowest;
            }

            double longestUsefulRun = _trial.RunAtRound(bare, longest.RoundSeconds);
            double leanerRun = ShortestRun(bare, leaner, longest.RoundSeconds);
            bool moreIsUseful = false;
            foreach (Factory factory in offer.Factories)
            {
                double supplyRounds = bare.LeastTStates * factory.RoundsPerOutput;
                double supplySeconds = supplyRounds * leastRoundSeconds;
                double useful = space.Scenario.Method.FactoryCount
                    ?? Math.Ceiling(supplyRounds * longest.RoundSeconds / longestUsefulRun);
                double most = Math.Floor((high - bare.TileAtoms) / factory.Atoms);
                double least = Math.Max(1, Math.Floor((low - bare.TileAtoms) / factory.Atoms) + 1);
                moreIsUseful |= useful > most;
                if (space.Scenario.Method.FactoryCount is { } only)
                {
                    TryCounts(bare, factory, supplySeconds, Math.Max(least, only), Math.Min(most, only));
                }
                else
                {
                    // where supply sets the pace, a leaner layout with the same factories is as fast
                    double fasterThanLeaner = Math.Floor(supplySeconds / leanerRun) + 1;
                    double fewest = Math.Max(least, fasterThanLeaner);
                    TryCounts(bare, factory, supplySeconds, fewest, Math.Min(most, useful));
                    slowest = fewest <= most ? Math.Max(slowest, supplySeconds / fewest) : slowest;
                }
            }

            if (!moreIsUseful || bare.Atoms * (high / bare.TileAtoms) > limits.AtomsAtMost * SizeStep)
            {
                return slowest;
            }
        }
    }

    private void TryCounts(in TrialBase bare, Factory factory, double supplySecondsOfOne, double least, double most)
    {
        if (least > most || Beaten(bare, factory, supplySecondsOfOne, least, most))
        {
            return;
        }

        double stride = Math.Max(1, Math.Ceiling((most - least + 1) / CountsPerSizeStep));
        for (double count = most; count >= least; count -= stride)
        {
            if (!Beaten(bare, factory, supplySecondsOfOne, count, count))
            {
                _trial.Try(bare, factory, (int)count, _unbeaten);
            }
        }
    }

    /// <summary>Whether even the atoms of the least and the supply of the most of so many factories are beaten.</summary>
    private bool Beaten(in TrialBase bare, Factory factory, double supplySecondsOfOne, double least, double most) =>
        _unbeaten.Beats(bare.Atoms + (factory.Atoms * least), Math.Max(bare.RunSeconds, supplySecondsOfOne / most));

    /// <summary>
    /// Factory atoms below which supply sets the pace and a leaner layout is as fast: atoms times rounds of the cheapest factory at the noise of
    /// the bare layout, which larger machines only exceed.
    /// </summary>
    private double LeastFactoryAtoms(in TrialBase bare, ImmutableArray<LogicLayout> leaner, double errorAtMost)
    {
        if (leaner.IsEmpty || space.Scenario.Method.FactoryCount is not null)
        {
            return 0;
        }

        double roundSeconds = CandidateTrial.RoundAtLoad(bare, bare.TileAtoms);
        double cheapest = double.PositiveInfinity;
        foreach (Factory factory in OfferAt(bare, SizeStepOf(bare.TileAtoms), errorAtMost).Factories)
        {
            cheapest = Math.Min(cheapest, factory.Atoms * factory.RoundsPerOutput);
        }

        double atoms = cheapest * bare.LeastTStates * roundSeconds / ShortestRun(bare, leaner, roundSeconds);
        return double.IsFinite(atoms) ? SafetyOfRounding * atoms : 0;
    }

    private double ShortestRun(in TrialBase bare, ImmutableArray<LogicLayout> layouts, double roundSeconds)
    {
        double shortest = double.PositiveInfinity;
        foreach (LogicLayout layout in layouts)
        {
            shortest = Math.Min(shortest, _trial.RunAtRound(bare with { Layout = layout }, roundSeconds));
        }

        return shortest;
    }

    /// <summary>The factories at the noise of the upper end of a size step; tile factories follow the distance as well.</summary>
    private FactoryOffer OfferAt(in TrialBase bare, int step, double errorAtMost)
    {
        int key = factories.CountsAsTiles ? (step * SearchSpace.LargestDistance) + bare.Distance : step;
        if (_offers.TryGetValue(key, out FactoryOffer? known))
        {
            return known;
        }

        OperatingState state = bare.Point.At(MachineLoad.AtMost(Math.Pow(SizeStep, step + 1)));
        bool isAbove = state.Strength.Worse >= 1;
        FactoryOffer offer = new(isAbove, isAbove ? [] : factories.At(bare.Point, state, bare.Distance, errorAtMost));
        _offers.Add(key, offer);
        return offer;
    }

    private bool NeedsMoreAtomsThanDelivered(in TrialBase bare, double sites, in CycleTimes times) =>
        !double.IsPositiveInfinity(limits.SupplyPerSecond)
        && AtomSupply.DemandPerSecond(sites, bare.Point, bare.Point.StateOf(times)) > limits.SupplyPerSecond;

    /// <summary>What factories a machine of some size may use.</summary>
    private sealed record FactoryOffer(bool IsAboveThreshold, ImmutableArray<Factory> Factories);

    private static int SizeStepOf(double sites) => (int)Math.Floor(Math.Log(sites) / Math.Log(SizeStep));
}
