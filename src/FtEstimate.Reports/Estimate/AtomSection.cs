using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>What the atoms are for, and what the optics must do.</summary>
internal static class AtomSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.AddRange(subject.Preface);
        if (subject.Machine is { } machine)
        {
            blocks.Add(new Paragraph(Sentence(subject.Space, machine)));
            blocks.Add(LedgerTable(subject.Space, machine));
            blocks.Add(new Paragraph("Counts are given in full so that they add up; three digits of them are meant."));
            AddOptics(blocks, machine.Optics);
        }

        return new ReportSection("Atom ledger", blocks.ToImmutable());
    }

    private static string Sentence(SearchSpace space, SizedMachine machine)
    {
        double perTile = machine.Atoms.TileAtoms / machine.Layout.Tiles;
        double extra = machine.Point.CheckAtomsPerSite - 1;
        string more = extra > 0
            ? $" Each check needs {Words.Whole(extra + 1)} atoms in all (second bank or ensemble); those beyond the first are listed apart."
            : "";
        return $"The algorithm has {Words.Count(space.Scenario.Workload.LogicalQubits, "logical qubit", "logical qubits")} on {Words.Count(machine.Layout.Tiles, "patch", "patches")} of " +
            $"{Words.Whole(perTile)} atoms ({space.Patch.Name} atoms at distance d = {machine.Distance}). " +
            $"Half of the atoms of patches and factories carry data, the other half are checks.{more}";
    }

    private static Table LedgerTable(SearchSpace space, SizedMachine machine)
    {
        ImmutableArray<Figure> ledger = AtomFigures.Ledger(space, machine);
        double[] shares = new double[ledger.Length];
        double total = machine.Atoms.Total;
        for (int i = 0; i < shares.Length; i++)
        {
            shares[i] = ledger[i].Value!.Value / total;
        }

        string[] shown = Apportion.ToPercent(shares);
        TableBuilder table = new(new Column("What for"), new Column("Atoms", Align.Right), new Column("Share", Align.Right));
        for (int i = 0; i < shares.Length; i++)
        {
            if (ledger[i].Value > 0)
            {
                table.Add(ledger[i].Kind.Label, ledger[i].Shown, shown[i]);
            }
        }

        table.AddStanding(AtomFigures.Total.Label, new Figure(AtomFigures.Total, total).Shown, "100.0 %");
        return table.Build();
    }

    private static void AddOptics(ImmutableArray<Block>.Builder blocks, OpticsNeed optics)
    {
        if (optics.FieldDiameterMetres is null)
        {
            return;
        }

        blocks.Add(new Paragraph("What the optics must hold. Packing losses, zones and paths for moves are not included."));
        blocks.Add(FigureTable.Of(AtomFigures.Optics(optics)));
        if (optics.Fields is > 1 and double fields)
        {
            blocks.Add(new Paragraph(
                $"The atoms do not fit into one field: {Words.Whole(fields)} are needed, and no link between fields is modelled. " +
                "The estimate treats them as one array.",
                Tone.Caution));
        }

        if (optics.TrapPowerWatts is { } power)
        {
            blocks.Add(new Paragraph(
                $"{Show.Significant(power, 2)} W is the light at the atoms; the lasers behind it are stronger. Beams above 0.5 W are class 4: dangerous to eyes and skin, and a fire hazard. " +
                "Local laser-safety codes and the laser-safety officer decide what is allowed. The figure is a planning number and no design value.",
                Tone.Caution));
        }
    }
}
