using System.Collections.Immutable;
using FtEstimate.MagicStates;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Figures;

/// <summary>The figures of the magic-state supply.</summary>
internal static class FactoryFigures
{
    private static readonly FigureKind Name = new("name", "Factory", FigureUnit.Words);
    private static readonly FigureKind Count = new("count", "Number of factories", FigureUnit.Count);
    private static readonly FigureKind Atoms = new("atoms", "Atoms of one factory", FigureUnit.Atoms);
    private static readonly FigureKind Injected = new("injected_error", "Error of a state that goes in", FigureUnit.Probability);
    private static readonly FigureKind OutputError = new("output_error", "Error of a state that comes out", FigureUnit.Probability);
    private static readonly FigureKind Accepted = new("accepted", "Batches accepted", FigureUnit.Percent);
    private static readonly FigureKind Rounds = new("rounds_per_output", "Rounds per state, rejected batches included", FigureUnit.Number);
    private static readonly FigureKind Seconds = new("s_per_output", "Time per state, one factory", FigureUnit.Seconds);
    private static readonly FigureKind Rate = new("outputs_per_s", "States per second, all factories", FigureUnit.Number);
    private static readonly FigureKind Needed = new("needed_per_s", "States used per second", FigureUnit.Number);

    /// <summary>The figures of the factories of a machine.</summary>
    public static ImmutableArray<Figure> Of(SearchSpace space, SizedMachine machine, Factory factory)
    {
        double seconds = factory.RoundsPerOutput * machine.Clock.RoundSeconds;
        return
        [
            Figure.Of(Name, factory.Name),
            new(Count, machine.FactoryCount),
            new(Atoms, factory.Atoms),
            new(Injected, machine.InjectedError),
            new(OutputError, factory.OutputError),
            new(Accepted, factory.Acceptance),
            new(Rounds, factory.RoundsPerOutput),
            new(Seconds, seconds),
            new(Rate, machine.FactoryCount / seconds),
            new(Needed, machine.Demand.TStates / machine.RunSeconds),
        ];
    }
}
