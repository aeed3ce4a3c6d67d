using FtEstimate.Noise;

namespace FtEstimate.Sizing;

/// <summary>The atoms of a machine, by what they are for.</summary>
/// <param name="TileAtoms">Atoms of the tiles as in the patch convention, half data and half checks.</param>
/// <param name="FactoryAtoms">Atoms of the factories, likewise.</param>
/// <param name="MoreCheckAtoms">Check atoms on top: further banks and ensembles.</param>
/// <param name="Spares">Spare atoms.</param>
public readonly record struct AtomCount(double TileAtoms, double FactoryAtoms, double MoreCheckAtoms, double Spares)
{
    /// <summary>All atoms held in traps.</summary>
    public double Total => TileAtoms + FactoryAtoms + MoreCheckAtoms + Spares;

    /// <summary>Sites of tiles and factories, one atom each.</summary>
    public double Sites => TileAtoms + FactoryAtoms;

    /// <summary>Counts a machine.</summary>
    /// <param name="tileAtoms">Atoms of the tiles.</param>
    /// <param name="factoryAtoms">Atoms of the factories.</param>
    /// <param name="point">Banks and ensembles.</param>
    /// <param name="spareFraction">Spares per data and check atom.</param>
    public static AtomCount Of(double tileAtoms, double factoryAtoms, OperatingPoint point, double spareFraction)
    {
        double more = (tileAtoms + factoryAtoms) / 2 * (point.CheckAtomsPerSite - 1);
        return new AtomCount(tileAtoms, factoryAtoms, more, Math.Ceiling((tileAtoms + factoryAtoms + more) * spareFraction));
    }
}
