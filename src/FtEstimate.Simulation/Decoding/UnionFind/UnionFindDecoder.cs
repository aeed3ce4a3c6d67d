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
    private const byte Quiet = 0;
    private const byte Fired = 1;
    private const byte Told = 2;

    private readonly GrowthGraph graph;
    private readonly DetectorGraph detectors;
    private readonly ClusterGrowth growth;

    // what is special about a vertex in this shot
    private readonly byte[] marks;
    private readonly Nearest[] nearest;
    private readonly int[] unsettled;
    private int[] replaced = new int[64];

    /// <summary>Prepares the working memory for a graph.</summary>
    /// <param name="graph">Detectors and mechanisms of one type.</param>
    public UnionFindDecoder(DetectorGraph graph)
    {
        detectors = graph;
        this.graph = new GrowthGraph(graph);
        growth = new ClusterGrowth(this.graph);
        marks = new byte[graph.VertexCount + 1];
        nearest = new Nearest[graph.VertexCount];
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
        foreach (int vertex in defects)
        {
            marks[vertex] |= Fired;
        }

        foreach (int vertex in defects)
        {
            nearest[vertex] = NearestTo(vertex);
        }

        int count = 0;
        foreach (int vertex in defects)
        {
            if (!TrySettle(vertex))
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
            marks[vertex] = Quiet;
        }

        Restore(told);
        return growth.Finish() != 0;
    }

    // the nearest neighbour that fired; none counts if a told edge is within two edges
    private Nearest NearestTo(int vertex)
    {
        int length = GrowthGraph.Never;
        int place = -1;
        int seen = marks[vertex];
        int end = graph.First[vertex + 1];
        for (int i = graph.First[vertex]; i < end; i++)
        {
            HalfEdge edge = graph.HalfEdges[i];
            byte mark = marks[edge.Other];
            if (mark != Quiet)
            {
                seen |= mark;
                if ((mark & Fired) != 0 && edge.Length < length)
                {
                    length = edge.Length;
                    place = i;
                }
            }
        }

        return new Nearest(place, (seen & Told) != 0 ? 0 : length);
    }

    // Settles what growth would settle in the same way: two defects that are each other's nearest, or one and the boundary, if they meet before
    // anything else can meet either. Whatever grows near them later finds them as growth would have left them.
    private bool TrySettle(int vertex)
    {
        Nearest near = nearest[vertex];
        ref readonly Surroundings around = ref graph.Surroundings[vertex];
        if (near.Length > around.BoundaryDiameter)
        {
            growth.AddSettled(vertex, around.BoundaryDiameter / 2, around.BoundaryFlips ? 1 : 0);
            return true;
        }

        if (near.Place < 0 || near.Length == 0)
        {
            return false;
        }

        HalfEdge edge = graph.HalfEdges[near.Place];
        int other = edge.Other;
        Nearest back = nearest[other];
        if (back.Length == 0 || back.Place < 0 || graph.HalfEdges[back.Place].Other != vertex
            || near.Length > Math.Min(around.QuietDiameter, graph.Surroundings[other].QuietDiameter))
        {
            return false;
        }

        if (vertex < other)
        {
            growth.AddSettledPair(vertex, other, (near.Length + 1) / 2, edge.FlipsObservable);
        }

        return true;
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
            marks[edge.A] |= Told;
            marks[edge.MeetsBoundary ? edge.A : edge.B] |= Told;
        }
    }

    private void Restore(ReadOnlySpan<ToldEdge> told)
    {
        for (int i = 0; i < told.Length; i++)
        {
            GraphEdge edge = detectors.Edges[told[i].Edge];
            graph.ReplaceLength(told[i].Edge, replaced[i]);
            marks[edge.A] = Quiet;
            marks[edge.MeetsBoundary ? edge.A : edge.B] = Quiet;
        }
    }

    /// <summary>The nearest neighbour that fired.</summary>
    /// <param name="Place">Place of the half edge to it, −1 for none.</param>
    /// <param name="Length">Length of that edge; 0 if nothing may be settled here.</param>
    private readonly record struct Nearest(int Place, int Length);
}
