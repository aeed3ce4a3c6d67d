namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>What a defect at a vertex can meet, and how early; side by side because it is read together. 16 bytes.</summary>
/// <param name="quietDiameter">See <see cref="QuietDiameter"/>.</param>
/// <param name="boundaryDiameter">See <see cref="BoundaryDiameter"/>.</param>
internal struct DefectSite(int quietDiameter, int boundaryDiameter)
{
    /// <summary>Of this shot: the shortest edge to a neighbour that fired; an endless one to the boundary if there is none.</summary>
    public HalfEdge Nearest;

    /// <summary>Twice the radius up to which nothing can meet it but a neighbour that fired: neither the boundary nor anything two edges away.</summary>
    public readonly int QuietDiameter = quietDiameter;

    /// <summary>Twice the length of the shortest edge to the boundary if nothing two edges away can be met before, else <see cref="GrowthGraph.Never"/>.</summary>
    public readonly int BoundaryDiameter = boundaryDiameter;
}
