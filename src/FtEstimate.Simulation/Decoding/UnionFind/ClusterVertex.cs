namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>What a shot knows of one vertex, and, in the vertex that gives a cluster its number, of the whole cluster. 32 bytes.</summary>
/// <remarks>
/// Growth is kept by vertex, not by edge: all edges of a vertex grow alike from the moment it is reached, so an edge is grown through once the
/// radii of its ends together are its length.
/// </remarks>
internal struct ClusterVertex
{
    /// <summary>Not reached by any cluster.</summary>
    public const int Unreached = -1;

    /// <summary>The boundary itself: part of no cluster.</summary>
    public const int Outside = -2;

    /// <summary>Number of the cluster.</summary>
    public int Cluster;

    /// <summary>The radius if at rest, else the radius less the time.</summary>
    public int Level;

    /// <summary>−1 while the cluster grows, else 0; a mask.</summary>
    public int Growing;

    /// <summary>When the next edge from here may be grown through; the event in the queue counts only if it is of this time.</summary>
    public int Due;

    /// <summary>The next vertex of the cluster, or −1.</summary>
    public int Next;

    /// <summary>The last vertex of the cluster.</summary>
    public int Last;

    /// <summary>Number of vertices of the cluster.</summary>
    public int Size;

    /// <summary>Whether observable flips on the way to the numbering vertex; of the cluster.</summary>
    public ClusterBits Bits;

    /// <summary>A vertex that no cluster has reached.</summary>
    public static ClusterVertex Untouched => new() { Cluster = Unreached };

    /// <summary>How far its edges are grown from here.</summary>
    public readonly int RadiusAt(int time) => Level + (time & Growing);
}

/// <summary>Parities of a vertex (the first) and of a cluster (the others), relative to the numbering vertex of the cluster.</summary>
internal struct ClusterBits
{
    /// <summary>1 if the observable flips on the way through the forest to the numbering vertex.</summary>
    public byte Flip;

    /// <summary>1 if the cluster holds an odd number of defects.</summary>
    public byte Odd;

    /// <summary>Sum of <see cref="Flip"/> over the defects, modulo 2.</summary>
    public byte Sum;

    /// <summary>2 if the cluster touches the boundary; plus 1 if the observable flips on the way from the numbering vertex out.</summary>
    public byte Exit;

    /// <summary>Whether the cluster has to grow.</summary>
    public readonly bool Restless => Odd != 0 && Exit == 0;

    /// <summary>
    /// 1 if the correction of the cluster flips the observable: the defects are joined through the numbering vertex, one left over goes out.
    /// </summary>
    public readonly int Correction => Sum ^ (Odd & Exit & 1);
}
