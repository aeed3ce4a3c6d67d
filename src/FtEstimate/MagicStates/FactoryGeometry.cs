namespace FtEstimate.MagicStates;

/// <summary>How many atoms a factory takes, whatever the noise (Litinski 2019, arXiv:1905.06903; two atoms per site, one data and one check).</summary>
public static class FactoryGeometry
{
    /// <summary>Atoms of a whole factory. Half of them are data, half checks.</summary>
    /// <remarks>
    /// One level: 2[(dX+4dZ)·3dX + 2dm]. Two levels, n feeders, capitals for the last block:
    /// 2[(DX+4DZ)·3DX + n((dX+4dZ)(3dX+Dm/2) + 2dm) + 20Dm² + 2DX·Dm].
    /// </remarks>
    public static int Atoms(FactoryDesign design)
    {
        PatchDistances last = design.Last.Distances;
        if (design.Feeders is not { } feeders)
        {
            return 2 * (BlockSites(last) + 2 * last.M);
        }

        PatchDistances feeder = feeders.Block.Distances;
        int feederSites = BlockSites(feeder) + 2 * feeder.M;
        int feederLane = Width(feeder) * last.M; // half a lane of width dm2, times the 2 atoms per site
        int crossing = 20 * last.M * last.M + 2 * last.X * last.M;
        return 2 * (BlockSites(last) + crossing) + feeders.Count * (2 * feederSites + feederLane);
    }

    /// <summary>Length in sites of the path of a state from its feeder to the last block, 10Dm + (n/4)(dX+4dZ).</summary>
    internal static double MoveLength(FeederBlocks feeders, PatchDistances last) =>
        10.0 * last.M + feeders.Count / 4.0 * Width(feeders.Block.Distances);

    private static int BlockSites(PatchDistances distances) => Width(distances) * 3 * distances.X;

    private static int Width(PatchDistances distances) => distances.X + 4 * distances.Z;
}
