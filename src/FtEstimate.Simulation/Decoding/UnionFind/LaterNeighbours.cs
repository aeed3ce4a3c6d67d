namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>The neighbours of each vertex that have larger numbers: pairs of neighbours are seen once, from the smaller number.</summary>
/// <remarks>As many places for each vertex, the rest filled with the boundary, so that the loop over them is the same for all.</remarks>
internal sealed class LaterNeighbours
{
    private const int Stride = 4;

    private readonly int[] neighbours;
    private readonly int places;

    /// <summary>Lists the neighbours.</summary>
    public LaterNeighbours(GrowthGraph graph)
    {
        FirstEdge = new int[graph.BoundaryVertex];
        for (int vertex = 0; vertex < FirstEdge.Length; vertex++)
        {
            int place = graph.First[vertex];
            int end = graph.First[vertex + 1];
            while (place < end && (graph.HalfEdges[place].Other < vertex || graph.HalfEdges[place].Other == graph.BoundaryVertex))
            {
                place++;
            }

            FirstEdge[vertex] = place;
            places = Math.Max(places, end - place);
        }

        places = (places + Stride - 1) / Stride * Stride;
        neighbours = new int[places * FirstEdge.Length];
        Array.Fill(neighbours, graph.BoundaryVertex);
        for (int vertex = 0; vertex < FirstEdge.Length; vertex++)
        {
            for (int place = FirstEdge[vertex]; place < graph.First[vertex + 1]; place++)
            {
                neighbours[(vertex * places) + place - FirstEdge[vertex]] = graph.HalfEdges[place].Other;
            }
        }
    }

    /// <summary>Where the edges to them begin; they end where those of the vertex do.</summary>
    public int[] FirstEdge { get; }

    /// <summary>Whether any of them is marked.</summary>
    /// <param name="vertex">The vertex.</param>
    /// <param name="marks">One for each vertex and 0 for the boundary.</param>
    public bool AnyMarked(int vertex, byte[] marks)
    {
        int seen = 0;
        for (ReadOnlySpan<int> rest = neighbours.AsSpan(vertex * places, places); rest.Length >= Stride; rest = rest[Stride..])
        {
            seen |= marks[rest[0]] | marks[rest[1]] | marks[rest[2]] | marks[rest[3]];
        }

        return seen != 0;
    }
}
