
namespace FtEstimate.Sizing;

/// <summary>What sets the pace of a run.</summary>
public enum Pace
{
    /// <summary>Magic states arrive too slowly.</summary>
    Supply,

    /// <summary>The layout consumes them too slowly.</summary>
    Consumption,

    /// <summary>Measurement, decoding and feed-forward of one result before the next.</summary>
    Reaction,
}

/// <summary>The three times of which the longest is the run time of one shot.</summary>
/// <param name="SupplySeconds">Time for the factories to deliver all magic states.</param>
/// <param name="ConsumptionSeconds">Time for the layout to consume them.</param>
/// <param name="ReactionSeconds">Sequential reactions.</param>
/// <param name="StepSeconds">One logical step.</param>
/// <param name="RoundSeconds">One syndrome round, with patch moves in the transversal style.</param>
public readonly record struct RunClock(
    double SupplySeconds,
    double ConsumptionSeconds,
    double ReactionSeconds,
    double StepSeconds,
    double RoundSeconds)
{
    /// <summary>Run time of one shot.</summary>
    public double RunSeconds => Math.Max(SupplySeconds, Math.Max(ConsumptionSeconds, ReactionSeconds));

    /// <summary>Syndrome rounds in the run.</summary>
    public double Rounds => RunSeconds / RoundSeconds;

    /// <summary>Which of the three is longest.</summary>
    public Pace Pace => SupplySeconds >= Math.Max(ConsumptionSeconds, ReactionSeconds) ? Pace.Supply
        : ConsumptionSeconds >= ReactionSeconds ? Pace.Consumption
        : Pace.Reaction;

    /// <summary>
    /// The clock of a layout. Lattice surgery: a step is d rounds, each T state takes the block's steps, and dependent T states wait for a reaction
    /// (pre-decoded choices assumed). Transversal: a step is a share of a round and a patch move; a T state takes two steps and a reaction.
    /// </summary>
    /// <param name="layout">The layout.</param>
    /// <param name="demand">What is consumed.</param>
    /// <param name="distance">Code distance.</param>
    /// <param name="roundSeconds">One round, patch moves included.</param>
    /// <param name="reactionSeconds">One reaction.</param>
    /// <param name="supplyRoundsPerT">Rounds per magic state of all factories together; 0: unlimited.</param>
    /// <param name="batchRounds">Rounds of one batch, which the first state takes at least; 0: unlimited supply.</param>
    public static RunClock Of(
        LogicLayout layout,
        in TStateDemand demand,
        int distance,
        double roundSeconds,
        double reactionSeconds,
        double supplyRoundsPerT,
        double batchRounds = 0)
    {
        double supply = demand.TStates > 0 ? Math.Max(demand.TStates * supplyRoundsPerT, batchRounds) * roundSeconds : 0;
        double reaction = demand.ReactionDepth * reactionSeconds;
        if (layout.Style == LogicStyle.LatticeSurgery)
        {
            double step = distance * roundSeconds;
            double steps = Math.Max(demand.TStates * layout.StepsPerT, demand.StatedLayers);
            return new RunClock(supply, steps * step, reaction, step, roundSeconds);
        }

        double share = roundSeconds / layout.GatesPerRound;
        double sequential = Math.Max(demand.TStates / layout.Lanes, demand.ReactionDepth);
        double consumption = (sequential * ((layout.StepsPerT * share) + reactionSeconds)) + (demand.LogicalLayers * share);
        return new RunClock(supply, consumption, reaction, share, roundSeconds);
    }
}
