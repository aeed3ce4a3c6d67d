using System.Runtime.InteropServices;

namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>What growth has made of a detector in this shot. The fields read of neighbours come first; the size is half a cache line.</summary>
[StructLayout(LayoutKind.Sequential)]
internal struct CoveredVertex
{
    /// <summary>What the radius of <see cref="Top"/> lacks here: the region reaches beyond the vertex by its radius plus this.</summary>
    public long Offset;

    /// <summary>Outermost region over the vertex; -1 if there is none.</summary>
    public int Top;

    /// <summary>The region that arrived here, somewhere inside <see cref="Top"/>.</summary>
    public int Owner;

    /// <summary>Time of the earliest event of the vertex in the queue.</summary>
    public long Queued;

    /// <summary>Twice the vertex of the defect from which the region came, plus 1 if the way flips the observable.</summary>
    public int Source;

    /// <summary>The vertex at which the owner arrived before this one; -1 for its first.</summary>
    public int Below;
}
