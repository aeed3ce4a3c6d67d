using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>A detector graph packed for growth: the edges of a vertex side by side, with whole-number lengths.</summary>
/// <remarks>
/// Lengths are weights in steps of 1/1024, so that an ordinary weight of about 7 is good to 10⁻⁴: sums of whole numbers are the same in any order,
/// and ties are ties. The boundary is one more vertex behind the last, with no edges of its own.
/// </remarks>
internal sealed class GrowthGraph
{
    /// <summary>Stands for no edge, no event.</summary>
    public const int Never = int.MaxValue;

    private const double StepsPerUnit = 1024;

    // keeps a walk over thousands of the heaviest edges below the largest int
    private const int LongestLength = 1 << 17;

    private readonly int[] placeAtA;
    private readonly int[] placeAtB;

    /// <summary>Packs a graph.</summary>
    public GrowthGraph(DetectorGraph graph)
    {
        int vertexCount = graph.VertexCount;
        BoundaryVertex = vertexCount;
        placeAtA = new int[graph.Edges.Length];
        placeAtB = new int[graph.Edges.Length];
        Array.Fill(placeAtB, -1);
        First = new int[vertexCount + 1];
        var halfEdges = new List<HalfEdge>(2 * graph.Edges.Length);
        for (int vertex = 0; vertex < vertexCount; vertex++)
        {
            foreach (int index in InOrder(graph, vertex))
            {
                GraphEdge edge = graph.Edges[index];
                (edge.A == vertex ? placeAtA : placeAtB)[index] = halfEdges.Count;
                int other = edge.MeetsBoundary ? BoundaryVertex : edge.Other(vertex);
                halfEdges.Add(new HalfEdge(other, edge.FlipsObservable, LengthOf(DetectorGraph.WeightOf(edge.Probability))));
            }

            First[vertex + 1] = halfEdges.Count;
        }

        HalfEdges = [.. halfEdges];
        Later = new LaterNeighbours(this);
    }

    /// <summary>The number that stands for the boundary.</summary>
    public int BoundaryVertex { get; }

    /// <summary>Where the edges of each vertex begin in <see cref="HalfEdges"/>; one more entry than vertices.</summary>
    public int[] First { get; }

    /// <summary>Edges as seen from each of their ends: those to the boundary, shortest first, then by number of the other end.</summary>
    public HalfEdge[] HalfEdges { get; }

    /// <summary>The neighbours with larger numbers.</summary>
    public LaterNeighbours Later { get; }

    /// <summary>Gives an edge another weight for a while.</summary>
    /// <param name="edge">Index of the edge.</param>
    /// <param name="weight">The weight, 0 or more.</param>
    /// <returns>The length it had.</returns>
    public int Replace(int edge, double weight) => ReplaceLength(edge, LengthOf(weight));

    /// <summary>Gives an edge another length.</summary>
    /// <returns>The length it had.</returns>
    public int ReplaceLength(int edge, int length)
    {
        ref HalfEdge there = ref HalfEdges[placeAtA[edge]];
        int before = there.Length;
        there.Length = length;
        if (placeAtB[edge] >= 0)
        {
            HalfEdges[placeAtB[edge]].Length = length;
        }

        return before;
    }

    /// <summary>How near the next things are to a defect, for each vertex.</summary>
    public DefectSite[] DefectSites()
    {
        int[] shortest = new int[BoundaryVertex];
        for (int vertex = 0; vertex < BoundaryVertex; vertex++)
        {
            shortest[vertex] = Never;
            foreach (HalfEdge edge in HalfEdges.AsSpan(First[vertex]..First[vertex + 1]))
            {
                if (edge.Other != BoundaryVertex)
                {
                    shortest[vertex] = Math.Min(shortest[vertex], edge.Length);
                }
            }
        }

        var sites = new DefectSite[BoundaryVertex];
        for (int vertex = 0; vertex < BoundaryVertex; vertex++)
        {
            int twoSteps = Never;
            int boundary = Never;
            foreach (HalfEdge edge in HalfEdges.AsSpan(First[vertex]..First[vertex + 1]))
            {
                if (edge.Other != BoundaryVertex)
                {
                    twoSteps = Math.Min(twoSteps, edge.Length + shortest[edge.Other]);
                }
                else
                {
                    boundary = Math.Min(boundary, edge.Length);
                }
            }

            int twiceBoundary = boundary == Never ? Never : 2 * boundary;
            sites[vertex] = new DefectSite(Math.Min(twoSteps, twiceBoundary), twiceBoundary <= twoSteps ? twiceBoundary : Never);
        }

        return sites;
    }

    private static IEnumerable<int> InOrder(DetectorGraph graph, int vertex) => graph.EdgesAt(vertex).ToArray()
        .OrderBy(index => graph.Edges[index].Other(vertex))
        .ThenByDescending(index => graph.Edges[index].Probability);

    private static int LengthOf(double weight) => (int)Math.Round(Math.Clamp(weight * StepsPerUnit, 0, LongestLength));
}
