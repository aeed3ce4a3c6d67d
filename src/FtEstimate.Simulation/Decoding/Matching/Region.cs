namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>
/// A defect, or a blossom: an odd ring of regions that act as one. Its radius, the dual variable of the matching, is linear in time.
/// </summary>
internal struct Region
{
    /// <summary>Radius extrapolated to time 0.</summary>
    public long Intercept;

    /// <summary>1 where the region grows, -1 where it shrinks (both: in an alternating tree), 0 where it rests.</summary>
    public int Slope;

    /// <summary>The slope before the change that is under way.</summary>
    public int SlopeBefore;

    /// <summary>Time of the earliest event of the region in the queue.</summary>
    public long Queued;

    /// <summary>The blossom it is part of; -1 if none.</summary>
    public int Blossom;

    /// <summary>One region of the ring; -1 for a defect.</summary>
    public int Child;

    /// <summary>The next region in the ring of its blossom.</summary>
    public int Next;

    /// <summary>The region before it in the ring.</summary>
    public int Previous;

    /// <summary>Path to the next region in the ring.</summary>
    public TightPath Ring;

    /// <summary>Path to its partner. In a tree: of a shrinking region to its child, of a growing one to its parent.</summary>
    public TightPath Match;

    /// <summary>Path to its parent in the tree; none for the root.</summary>
    public TightPath Parent;

    /// <summary>Tree, -1 if none.</summary>
    public int Tree;

    /// <summary>Neighbours in the list of the regions of its tree; -1 at the ends.</summary>
    public int MemberAfter;

    /// <summary>See <see cref="MemberAfter"/>.</summary>
    public int MemberBefore;

    /// <summary>The vertex at which it arrived last; -1 if none.</summary>
    public int LastVertex;

    /// <summary>Stamp of the last search for a common ancestor that passed here; while pairs are listed: whether it has been.</summary>
    public int Mark;

    public readonly long RadiusAt(long time) => Intercept + (Slope * time);

    /// <summary>From this time on the radius goes another way.</summary>
    public void Turn(int slope, long time)
    {
        Intercept = RadiusAt(time) - (slope * time);
        SlopeBefore = Slope;
        Slope = slope;
    }
}
