using System.Collections.Immutable;
using FtEstimate.MagicStates;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>The factory chosen, and what came close.</summary>
internal static class MagicStateSection
{
    private const int NeighboursShown = 4;

    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.AddRange(subject.Preface);
        if (subject.Machine is { Factory: { } factory } machine)
        {
            blocks.Add(new Paragraph(
                "T gates use up magic states. A state injected from physical qubits is too noisy, so factories distil many noisy ones into few good ones. " +
                Levels(factory)));
            blocks.Add(FigureTable.Of(FactoryFigures.Of(subject.Space, machine, factory)));
            AddNeighbours(blocks, subject, machine);
        }
        else if (subject.Machine is not null)
        {
            blocks.Add(new Paragraph("This workload uses no magic states, so there are no factories."));
        }

        return new ReportSection("Magic-state supply", blocks.ToImmutable());
    }

    private static string Levels(Factory factory) => factory.Design switch
    {
        { Feeders: { } feeders } =>
            $"The factory chosen works in two levels: {feeders.Count} blocks turn fifteen states into one each and feed a last block that does the same with better patches.",
        { } => "The factory chosen works in one level: fifteen states go in, one comes out.",
        null => "The factory is a fixed floor plan of eleven patches at the distance of the data; their logical errors count with those of all other patches.",
    };

    private static void AddNeighbours(ImmutableArray<Block>.Builder blocks, Subject subject, SizedMachine machine)
    {
        List<SizedMachine> neighbours = Neighbours(subject.Result.Unbeaten, machine);
        if (neighbours.Count == 0)
        {
            return;
        }

        blocks.Add(new Paragraph("What came close: the nearest machines in the list of the next section with other factories or another number of them; the chosen one is marked."));
        TableBuilder table = new(
            new Column("Factory", Verbatim: true),
            new Column("Count", Align.Right),
            new Column("Atoms of one", Align.Right),
            new Column("Output error", Align.Right),
            new Column("Atoms in all", Align.Right),
            new Column("Run time", Align.Right));
        foreach (SizedMachine near in neighbours)
        {
            ImmutableArray<string> cells =
            [
                near.Factory!.Name,
                Words.Whole(near.FactoryCount),
                Show.Atoms(near.Factory.Atoms),
                Show.Probability(near.Factory.OutputError),
                Show.Atoms(near.Atoms.Total),
                Show.Duration(near.RunSeconds),
            ];
            if (OtherMachinesSection.Same(near, machine))
            {
                table.AddStanding(cells);
            }
            else
            {
                table.Add(cells);
            }
        }

        blocks.Add(table.Build());
    }

    /// <summary>The machines nearest to the chosen one in the list whose factories differ, with the chosen one in its place.</summary>
    private static List<SizedMachine> Neighbours(ImmutableArray<SizedMachine> unbeaten, SizedMachine machine)
    {
        int chosen = OtherMachinesSection.IndexOf(unbeaten, machine);
        var near = new List<SizedMachine>();
        for (int i = 0; i < unbeaten.Length; i++)
        {
            bool other = unbeaten[i].Factory is { } factory && (factory.Name != machine.Factory!.Name || unbeaten[i].FactoryCount != machine.FactoryCount);
            if (i == chosen || (other && chosen >= 0 && Math.Abs(i - chosen) <= NeighboursShown / 2))
            {
                near.Add(unbeaten[i]);
            }
        }

        return near.Count > 1 ? near : [];
    }
}
