using System.Numerics;
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
    private readonly DefectSite[] sites;
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
        sites = this.graph.DefectSites();
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
            sites[vertex].Nearest = nobody;
        }

        foreach (int vertex in defects)
        {
            MeetLater(vertex);
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
        LaterNeighbours later = graph.Later;
        for (int from = 0; from < later.RowLength; from += LaterNeighbours.Chunk)
        {
            for (int marked = later.MarkedAmongEight(vertex, from, fired); marked != 0; marked &= marked - 1)
            {
                int place = later.FirstEdge(vertex) + from + BitOperations.TrailingZeroCount(marked) - 1;
                HalfEdge edge = graph.HalfEdges[place];
                ref DefectSite here = ref sites[vertex];
                ref DefectSite there = ref sites[edge.Other];
                here.Nearest = Nearer(here.Nearest, edge);
                there.Nearest = Nearer(there.Nearest, edge.To(vertex));
            }
        }
    }

    private static HalfEdge Nearer(HalfEdge one, HalfEdge other) => other.Length < one.Length ? other : one;

    // Settles what growth would settle in the same way: two defects that are each other's nearest, or one and the boundary, if they meet before
    // anything else can meet either. Whatever grows near them later finds them as growth would have left them. Told edges may be shorter than
    // the surroundings know.
    private bool TrySettle(int vertex, bool anyTold)
    {
        ref readonly DefectSite around = ref sites[vertex];
        HalfEdge near = around.Nearest;
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
        if (other == graph.BoundaryVertex || sites[other].Nearest.Other != vertex
            || near.Length > Math.Min(around.QuietDiameter, sites[other].QuietDiameter)
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
