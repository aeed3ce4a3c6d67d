namespace FtEstimate.Workloads;

/// <summary>A square lattice of sites, rows × columns, with bonds between nearest neighbours.</summary>
/// <remarks>One row is a chain, or a ring if periodic. A side of two sites is never wrapped: the bond is there already.</remarks>
/// <param name="Rows">Rows, 1 or more.</param>
/// <param name="Columns">Columns, 1 or more.</param>
/// <param name="Periodic">Whether opposite edges are joined.</param>
public sealed record SquareLattice(int Rows, int Columns, bool Periodic)
{
    /// <summary>Number of sites.</summary>
    public double Sites => (double)Rows * Columns;

    /// <summary>Number of bonds.</summary>
    public double Bonds => (double)Rows * BondsAlong(Columns) + (double)Columns * BondsAlong(Rows);

    /// <summary>Bonds of the site that has most.</summary>
    public int Coordination => NeighboursAlong(Rows) + NeighboursAlong(Columns);

    /// <summary>
    /// Layers of bonds that share no site, coloured direction by direction: 2 per direction, 3 round a ring of odd length.
    /// </summary>
    public int BondLayers => LayersAlong(Rows) + LayersAlong(Columns);

    private bool IsWrapped(int length) => Periodic && length > 2;

    private int BondsAlong(int length) => IsWrapped(length) ? length : length - 1;

    private static int NeighboursAlong(int length) => length switch
    {
        1 => 0,
        2 => 1,
        _ => 2,
    };

    private int LayersAlong(int length) => length switch
    {
        1 => 0,
        2 => 1,
        _ => IsWrapped(length) && int.IsOddInteger(length) ? 3 : 2,
    };
}
