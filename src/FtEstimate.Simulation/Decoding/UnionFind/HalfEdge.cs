namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>An edge as seen from one end.</summary>
internal struct HalfEdge(int other, bool flipsObservable, int length)
{
    private readonly int packed = (other << 1) | (flipsObservable ? 1 : 0);

    /// <summary>Length in steps.</summary>
    public int Length = length;

    /// <summary>The other end.</summary>
    public readonly int Other => packed >> 1;

    /// <summary>1 if the observable is flipped.</summary>
    public readonly int FlipsObservable => packed & 1;

    /// <summary>The same edge with another other end.</summary>
    public readonly HalfEdge To(int other) => new(other, FlipsObservable != 0, Length);
}
