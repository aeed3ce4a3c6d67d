using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Scenarios;

namespace FtEstimate.Sizing;

/// <summary>Sizes the machine a scenario asks for. Exact on its grids, repeatable, and fast: planning calls it thousands of times.</summary>
/// <param name="catalogue">Factories already evaluated, shared between calls; safe for several threads.</param>
public sealed class MachineSizing(FactoryCatalogue catalogue)
{
    private static readonly LogicStyle[] Styles = [LogicStyle.LatticeSurgery, LogicStyle.Transversal];

    /// <summary>The preferred machine, the unbeaten ones beside it, or why there is none.</summary>
    public SizingResult Find(Scenario scenario)
    {
        SearchSpace space = SearchSpace.Of(scenario);
        SearchLimits limits = SearchLimits.Of(scenario);
        FactoryChoice factories = new(space, catalogue);
        var perStyle = new List<IReadOnlyList<Candidate>>();
        foreach (LogicStyle style in Styles)
        {
            IReadOnlyList<Candidate> found = new MachineSearch(space, factories, limits, style).Run();
            if (found.Count > 0)
            {
                perStyle.Add(found);
            }
        }

        if (perStyle.Count == 0)
        {
            return new SizingResult(space, null, null, [], NoAnswerFinder.Explain(space, factories, limits));
        }

        UnbeatenSet merged = new();
        foreach (Candidate candidate in perStyle.SelectMany(found => found))
        {
            merged.Offer(candidate);
        }

        MachineDetail detail = new(space, factories);
        Preference prefer = scenario.Goal.Prefer;
        Running running = scenario.Machine.Running;
        SizedMachine[] rows = [.. TradeOff.Thin(merged.Members, Preferred(merged.Members, prefer, running)).Select(detail.Of)];

        // at the exact noise of the factories run times shift by a little: enough to overtake a neighbour
        ImmutableArray<SizedMachine> unbeaten = [.. rows.Where(row => !rows.Any(other => Beats(other, row)))];
        SizedMachine best = unbeaten[^1];
        foreach (SizedMachine machine in unbeaten)
        {
            bool isBetter = machine.Elapsed.FinishesInPractice == best.Elapsed.FinishesInPractice
                ? Measure(machine, prefer) < Measure(best, prefer)
                : machine.Elapsed.FinishesInPractice;
            best = isBetter ? machine : best;
        }

        SizedMachine? otherStyle = perStyle
            .Select(found => Preferred(found, prefer, running))
            .Where(candidate => candidate.Layout.Style != best.Layout.Style)
            .Select(detail.Of)
            .FirstOrDefault();
        return new SizingResult(space, best, otherStyle, unbeaten, null);
    }

    private static bool Beats(SizedMachine one, SizedMachine other) =>
        one.Atoms.Total <= other.Atoms.Total && one.RunSeconds <= other.RunSeconds
        && (one.Atoms.Total < other.Atoms.Total || one.RunSeconds < other.RunSeconds);

    /// <summary>
    /// The candidate with the smallest preferred measure, ties going to fewer atoms. Machines whose run does not get through between stops
    /// are preferred only when there is no other.
    /// </summary>
    internal static Candidate Preferred(IReadOnlyList<Candidate> candidates, Preference preference, Running running)
    {
        Candidate best = candidates[0];
        foreach (Candidate candidate in candidates)
        {
            bool finishes = Finishes(candidate, running);
            double difference = Measure(candidate, preference) - Measure(best, preference);
            bool isBetter = finishes == Finishes(best, running)
                ? difference < 0 || (difference == 0 && candidate.Atoms < best.Atoms)
                : finishes;
            best = isBetter ? candidate : best;
        }

        return best;
    }

    private static bool Finishes(Candidate candidate, Running running) =>
        ElapsedTime.Of(candidate.RunSeconds, 1, 0, running).FinishesInPractice;

    /// <summary>What a preference wants small.</summary>
    internal static double Measure(Candidate candidate, Preference preference) =>
        Measure(candidate.Atoms, candidate.RunSeconds, preference);

    private static double Measure(SizedMachine machine, Preference preference) =>
        Measure(machine.Atoms.Total, machine.RunSeconds, preference);

    private static double Measure(double atoms, double runSeconds, Preference preference) => preference switch
    {
        Preference.FewestAtoms => atoms,
        Preference.ShortestRun => runSeconds,
        _ => atoms * runSeconds,
    };
}

/// <summary>Picks the few unbeaten machines a reader wants to see.</summary>
internal static class TradeOff
{
    /// <summary>Rows shown at most.</summary>
    private const int Rows = 12;

    /// <summary>Spreads the rows evenly over the logarithm of the run time; ends and the preferred machine stay.</summary>
    public static ImmutableArray<Candidate> Thin(IReadOnlyList<Candidate> unbeaten, Candidate preferred)
    {
        if (unbeaten.Count <= Rows)
        {
            return [.. unbeaten];
        }

        double longest = Math.Log(unbeaten[0].RunSeconds);
        double shortest = Math.Log(unbeaten[^1].RunSeconds);
        var kept = ImmutableArray.CreateBuilder<Candidate>(Rows + 1);
        int lastSlot = -1;
        for (int i = 0; i < unbeaten.Count; i++)
        {
            double place = (longest - Math.Log(unbeaten[i].RunSeconds)) / (longest - shortest);
            int slot = (int)Math.Floor(place * (Rows - 1));
            bool isPreferred = ReferenceEquals(unbeaten[i], preferred);
            if (slot > lastSlot || isPreferred || i == unbeaten.Count - 1)
            {
                kept.Add(unbeaten[i]);
                lastSlot = Math.Max(slot, lastSlot);
            }
        }

        return kept.ToImmutable();
    }
}
