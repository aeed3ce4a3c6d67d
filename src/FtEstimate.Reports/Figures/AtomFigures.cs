using System.Collections.Immutable;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Figures;

/// <summary>The figures of the atom ledger, and of the optics that hold the atoms.</summary>
internal static class AtomFigures
{
    /// <summary>Kind of the last line of the ledger.</summary>
    public static readonly FigureKind Total = new("total", "All atoms in traps", FigureUnit.AtomsInFull);

    private static readonly FigureKind Logical = new("logical_qubits", "Patches of the logical qubits", FigureUnit.AtomsInFull);
    private static readonly FigureKind Routing = new("routing", "Patches for routing", FigureUnit.AtomsInFull);
    private static readonly FigureKind Factories = new("factories", "Magic-state factories", FigureUnit.AtomsInFull);
    private static readonly FigureKind MoreChecks = new("more_checks", "More check atoms (second banks, ensembles)", FigureUnit.AtomsInFull);
    private static readonly FigureKind Spares = new("spares", "Spares", FigureUnit.AtomsInFull);
    private static readonly FigureKind Traps = new("traps", "Traps held", FigureUnit.Atoms);
    private static readonly FigureKind Field = new("field_diameter_m", "Diameter of one round field that holds them", FigureUnit.Metres);
    private static readonly FigureKind Fields = new("fields", "Fields of the stated diameter", FigureUnit.Count);
    private static readonly FigureKind Power = new("trap_power_w", "Trap light at the atoms", FigureUnit.Watts);

    /// <summary>What the atoms are for; the lines add up to the total as printed.</summary>
    public static ImmutableArray<Figure> Ledger(SearchSpace space, SizedMachine machine)
    {
        AtomCount atoms = machine.Atoms;
        double perTile = atoms.TileAtoms / machine.Layout.Tiles;
        double logical = Math.Min(space.Scenario.Workload.LogicalQubits, machine.Layout.Tiles) * perTile;
        double[] parts = [logical, atoms.TileAtoms - logical, atoms.FactoryAtoms, atoms.MoreCheckAtoms, atoms.Spares];
        double[] whole = Apportion.ToWhole(parts);
        return
        [
            new(Logical, whole[0]),
            new(Routing, whole[1]),
            new(Factories, whole[2]),
            new(MoreChecks, whole[3]),
            new(Spares, whole[4]),
        ];
    }

    /// <summary>What the optics must do.</summary>
    public static ImmutableArray<Figure> Optics(OpticsNeed optics) =>
    [
        new(Traps, optics.Traps),
        new(Field, optics.FieldDiameterMetres),
        new(Fields, optics.Fields),
        new(Power, optics.TrapPowerWatts),
    ];
}
