using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Figures;

/// <summary>The figures of the clock ledger.</summary>
internal static class ClockFigures
{
    private static readonly FigureKind TStates = new("t_states", "Magic states used in one shot", FigureUnit.Count);
    private static readonly FigureKind Depth = new("reaction_depth", "Decisions that wait for one another", FigureUnit.Count);
    private static readonly FigureKind Round = new("round_s", "One syndrome round", FigureUnit.Seconds);
    private static readonly FigureKind Step = new("step_s", "One logical step", FigureUnit.Seconds);
    private static readonly FigureKind Reaction = new("reaction_s", "One reaction", FigureUnit.Seconds);
    private static readonly FigureKind Rounds = new("rounds", "Rounds in one shot", FigureUnit.Count);
    private static readonly FigureKind Supply = new("supply_limited_s", "If only the supply of magic states counted", FigureUnit.Seconds);
    private static readonly FigureKind Consumption = new("consumption_limited_s", "If only their consumption counted", FigureUnit.Seconds);
    private static readonly FigureKind ReactionLimited = new("reaction_limited_s", "If only the reactions counted", FigureUnit.Seconds);
    private static readonly FigureKind Run = new("run_s", "Run time of one shot: the longest of the three", FigureUnit.Seconds);
    private static readonly FigureKind Working = new("working_s", "One shot with its share of calibration", FigureUnit.Seconds);
    private static readonly FigureKind Between = new("mean_s_between_stops", "Mean time between stops", FigureUnit.Seconds);
    private static readonly FigureKind Stops = new("stops_per_shot", "Stops expected within one shot", FigureUnit.Number);
    private static readonly FigureKind Restart = new("restart_s", "Time to get going again after a stop", FigureUnit.Seconds);
    private static readonly FigureKind Start = new("start_s", "Loading and preparing, per shot", FigureUnit.Seconds);
    private static readonly FigureKind Shots = new("shots", "Shots that must succeed", FigureUnit.Count);
    private static readonly FigureKind Tries = new("tries_per_shot", "Completed tries per good shot", FigureUnit.Number);
    private static readonly FigureKind Elapsed = new("elapsed_s", "Expected elapsed time", FigureUnit.Seconds);

    /// <summary>What a shot is made of.</summary>
    public static ImmutableArray<Figure> Steps(SizedMachine machine) =>
    [
        new(TStates, machine.Demand.TStates),
        new(Depth, machine.Demand.ReactionDepth),
        new(Round, machine.Clock.RoundSeconds),
        new(Step, machine.Clock.StepSeconds, Note: machine.Layout.Style == LogicStyle.LatticeSurgery
            ? $"({machine.Distance} rounds, the code distance)"
            : $"({Quantities.Show.Significant(machine.Layout.GatesPerRound, 2)} transversal gates per round)"),
        new(Reaction, machine.ReactionSeconds, Note: "(readout, camera, decoding, feed-forward)"),
        new(Rounds, machine.Clock.Rounds),
    ];

    /// <summary>The three limits and the longest of them.</summary>
    public static ImmutableArray<Figure> Limits(RunClock clock) =>
    [
        new(Supply, clock.SupplySeconds, Note: Mark(clock.Pace == Pace.Supply)),
        new(Consumption, clock.ConsumptionSeconds, Note: Mark(clock.Pace == Pace.Consumption)),
        new(ReactionLimited, clock.ReactionSeconds, Note: Mark(clock.Pace == Pace.Reaction)),
        new(Run, clock.RunSeconds),
    ];

    /// <summary>From the run time to the wall clock.</summary>
    public static ImmutableArray<Figure> WallClock(SearchSpace space, SizedMachine machine)
    {
        Running running = space.Scenario.Machine.Running;
        return
        [
            new(Working, machine.Elapsed.WorkingSeconds, Note: $"({Quantities.Show.Percent(running.CalibrationFraction)} of the time is calibration)"),
            new(Between, running.MeanSecondsBetweenStops, Words: "no stops stated"),
            new(Stops, machine.Elapsed.StopsPerShot),
            new(Restart, running.RestartSeconds),
            new(Start, running.StartSeconds),
            new(Shots, space.Scenario.Workload.Shots),
            new(Tries, 1 / (1 - machine.Failure.Total)),
            new(Elapsed, machine.Elapsed.Seconds, Words: "does not finish"),
        ];
    }

    private static string Mark(bool setsThePace) => setsThePace ? "(sets the pace)" : "";
}
