using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>
/// Union-find: clusters grow from the defects at equal speed along edges as long as their weights, merge where they meet, and stop when they hold an
/// even number of defects or touch the boundary; a spanning forest of each gives the correction. Every set of errors that weighs less than half of the
/// lightest undetected flip of the observable is corrected, and every erasure that no undetected flip fits into.
/// </summary>
/// <remarks>
/// Delfosse 2021 (arXiv:1709.06218) with weighted growth as in Huang 2020 (arXiv:2004.04693); both from memory. Edges of weight 0 are grown through at
/// once, as erased ones should be. A cluster with an odd number of defects that has neither boundary nor further edges is left as it is.
/// </remarks>
public sealed class UnionFindDecoder : IDecoder
{
    private readonly GrowthGraph graph;
    private readonly DetectorGraph detectors;
    private readonly ClusterGrowth growth;

    // which vertices fired, and which have a told edge
    private readonly byte[] fired;
    private readonly byte[] beside;
    private readonly HalfEdge[] nearest;
    private readonly int[] unsettled;
    private int[] replaced = new int[64];

    /// <summary>Prepares the working memory for a graph.</summary>
    /// <param name="graph">Detectors and mechanisms of one type.</param>
    public UnionFindDecoder(DetectorGraph graph)
    {
        detectors = graph;
        this.graph = new GrowthGraph(graph);
        growth = new ClusterGrowth(this.graph);
        fired = new byte[graph.VertexCount + 1];
        beside = new byte[graph.VertexCount + 1];
        nearest = new HalfEdge[graph.VertexCount];
        unsettled = new int[graph.VertexCount];
    }

    /// <inheritdoc/>
    public bool Decode(ReadOnlySpan<int> defects, ReadOnlySpan<ToldEdge> told)
    {
        if (defects.IsEmpty)
        {
            return false;
        }

        Replace(told);
        var nobody = new HalfEdge(graph.BoundaryVertex, false, GrowthGraph.Never);
        foreach (int vertex in defects)
        {
            fired[vertex] = 1;
            nearest[vertex] = nobody;
        }

        foreach (int vertex in defects)
        {
            if (graph.Later.AnyMarked(vertex, fired))
            {
                MeetLater(vertex);
            }
        }

        int count = 0;
        foreach (int vertex in defects)
        {
            if (!TrySettle(vertex, !told.IsEmpty))
            {
                unsettled[count++] = vertex;
            }
        }

        foreach (int vertex in unsettled.AsSpan(0, count))
        {
            growth.AddDefect(vertex);
        }

        foreach (int vertex in unsettled.AsSpan(0, count))
        {
            growth.Start(vertex);
        }

        growth.Run();
        foreach (int vertex in defects)
        {
            fired[vertex] = 0;
        }

        Restore(told);
        return growth.Finish() != 0;
    }

    // neighbours that fired learn of each other
    private void MeetLater(int vertex)
    {
        int end = graph.First[vertex + 1];
        for (int place = graph.Later.FirstEdge[vertex]; place < end; place++)
        {
            HalfEdge edge = graph.HalfEdges[place];
            if (fired[edge.Other] != 0)
            {
                nearest[vertex] = Nearer(nearest[vertex], edge);
                nearest[edge.Other] = Nearer(nearest[edge.Other], edge.To(vertex));
            }
        }
    }

    private static HalfEdge Nearer(HalfEdge one, HalfEdge other) => other.Length < one.Length ? other : one;

    // Settles what growth would settle in the same way: two defects that are each other's nearest, or one and the boundary, if they meet before
    // anything else can meet either. Whatever grows near them later finds them as growth would have left them. Told edges may be shorter than
    // the surroundings know.
    private bool TrySettle(int vertex, bool anyTold)
    {
        HalfEdge near = nearest[vertex];
        ref readonly Surroundings around = ref graph.Surroundings[vertex];
        if (near.Length > around.BoundaryDiameter)
        {
            if (anyTold && IsNearTold(vertex))
            {
                return false;
            }

            growth.AddSettled(vertex, around.BoundaryDiameter / 2, graph.HalfEdges[graph.First[vertex]].FlipsObservable);
            return true;
        }

        int other = near.Other;
        if (other == graph.BoundaryVertex || nearest[other].Other != vertex
            || near.Length > Math.Min(around.QuietDiameter, graph.Surroundings[other].QuietDiameter)
            || (anyTold && (IsNearTold(vertex) || IsNearTold(other))))
        {
            return false;
        }

        if (vertex < other)
        {
            growth.AddSettledPair(vertex, other, (near.Length + 1) / 2, near.FlipsObservable);
        }

        return true;
    }

    private bool IsNearTold(int vertex)
    {
        int seen = beside[vertex];
        foreach (ref readonly HalfEdge edge in graph.HalfEdges.AsSpan(graph.First[vertex]..graph.First[vertex + 1]))
        {
            seen |= beside[edge.Other];
        }

        return seen != 0;
    }

    private void Replace(ReadOnlySpan<ToldEdge> told)
    {
        if (told.Length > replaced.Length)
        {
            replaced = new int[2 * told.Length];
        }

        for (int i = 0; i < told.Length; i++)
        {
            GraphEdge edge = detectors.Edges[told[i].Edge];
            replaced[i] = graph.Replace(told[i].Edge, told[i].Weight);
            beside[edge.A] = 1;
            beside[edge.MeetsBoundary ? edge.A : edge.B] = 1;
        }
    }

    private void Restore(ReadOnlySpan<ToldEdge> told)
    {
        for (int i = 0; i < told.Length; i++)
        {
            GraphEdge edge = detectors.Edges[told[i].Edge];
            graph.ReplaceLength(told[i].Edge, replaced[i]);
            beside[edge.A] = 0;
            beside[edge.MeetsBoundary ? edge.A : edge.B] = 0;
        }
    }
}
