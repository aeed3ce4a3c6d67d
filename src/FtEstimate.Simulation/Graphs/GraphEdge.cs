namespace FtEstimate.Simulation.Graphs;

/// <summary>One independent error mechanism, as a decoder sees it: the detectors it flips, how likely it is, and whether it flips the observable.</summary>
/// <param name="A">A vertex.</param>
/// <param name="B">Another vertex, or <see cref="DetectorGraph.Boundary"/> where the mechanism flips one detector only.</param>
/// <param name="Probability">Probability, 0 to 0.5; 0 where only a lost atom can cause it.</param>
/// <param name="FlipsObservable">Whether the logical observable is flipped.</param>
public readonly record struct GraphEdge(int A, int B, double Probability, bool FlipsObservable)
{
    /// <summary>The other end; the boundary is an end like any other.</summary>
    public int Other(int vertex) => vertex == A ? B : A;

    /// <summary>Whether one end is the boundary.</summary>
    public bool MeetsBoundary => B == DetectorGraph.Boundary;
}
