namespace FtEstimate.Cycles;

/// <summary>How many atoms a round has to serve: what the machine-wide limits are held against.</summary>
/// <param name="DataAtoms">Data atoms of all tiles and factories.</param>
/// <param name="CheckSites">Checks of one bank; each is one atom or an ensemble.</param>
/// <param name="PairsPerLayer">Pairs in one CZ layer.</param>
public readonly record struct MachineLoad(double DataAtoms, double CheckSites, double PairsPerLayer)
{
    /// <summary>
    /// The load of a machine whose tiles and factories hold so many sites, half data and half checks:
    /// a patch of distance d has d(d−1) pairs per layer for its d² data atoms (exact for the rotated code).
    /// </summary>
    public static MachineLoad Of(double sites, int distance) =>
        new(sites / 2, sites / 2, sites / 2 * (distance - 1) / distance);

    /// <summary>The load of so many sites at whatever distance: a pair for every data atom, which no distance exceeds.</summary>
    public static MachineLoad AtMost(double sites) => new(sites / 2, sites / 2, sites / 2);

    /// <summary>A single patch of distance 3.</summary>
    public static MachineLoad SinglePatch => Of(2 * 9, 3);
}
