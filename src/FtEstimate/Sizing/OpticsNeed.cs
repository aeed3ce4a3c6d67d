using FtEstimate.Machines;

namespace FtEstimate.Sizing;

/// <summary>What a number of atoms asks of the optics.</summary>
/// <param name="Traps">Traps held.</param>
/// <param name="FieldDiameterMetres">Diameter of a round field that holds them; null for an abstract machine.</param>
/// <param name="Fields">Fields of the stated diameter needed; null when none is stated.</param>
/// <param name="TrapPowerWatts">Trap light at the atoms; null when no power per trap is stated.</param>
public sealed record OpticsNeed(double Traps, double? FieldDiameterMetres, double? Fields, double? TrapPowerWatts)
{
    /// <summary>
    /// The need of an apparatus: a data atom and its check share one square of the pitch, so each trap takes half a square.
    /// Packing losses, zones and paths are not included.
    /// </summary>
    public static OpticsNeed Of(Apparatus apparatus, double atoms)
    {
        if (apparatus is not AtomArray { Geometry: var geometry })
        {
            return new OpticsNeed(atoms, null, null, null);
        }

        double traps = atoms * geometry.TrapsPerStoredAtom;
        double area = traps * geometry.PitchMetres * geometry.PitchMetres / 2;
        double diameter = 2 * Math.Sqrt(area / Math.PI);
        double? fields = geometry.FieldDiameterMetres is { } field ? Math.Max(1, Math.Ceiling(area / (Math.PI * field * field / 4))) : null;
        return new OpticsNeed(traps, diameter, fields, traps * geometry.TrapPowerWatts);
    }
}
