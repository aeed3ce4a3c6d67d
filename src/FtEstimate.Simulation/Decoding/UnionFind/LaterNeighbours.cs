namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>The neighbours of each vertex that have larger numbers: two neighbours see each other once, from the smaller number.</summary>
/// <remarks>
/// A row of numbers for each vertex, all equally long: the place of the first edge to one of them, and the neighbours in the order of these edges; the rest is filled
/// with the boundary. Looking at whole rows needs no count and hardly a branch.
/// </remarks>
internal sealed class LaterNeighbours
{
    /// <summary>Places looked at together.</summary>
    public const int Chunk = 8;

    private readonly int[] rows;

    /// <summary>Lists the neighbours.</summary>
    public LaterNeighbours(GrowthGraph graph)
    {
        int vertexCount = graph.BoundaryVertex;
        int[] firstEdge = new int[vertexCount];
        int most = 0;
        for (int vertex = 0; vertex < vertexCount; vertex++)
        {
            int end = graph.First[vertex + 1];
            int place = graph.First[vertex];
            while (place < end && (graph.HalfEdges[place].Other < vertex || graph.HalfEdges[place].Other == graph.BoundaryVertex))
            {
                place++;
            }

            firstEdge[vertex] = place;
            most = Math.Max(most, end - place);
        }

        RowLength = (1 + most + Chunk - 1) / Chunk * Chunk;
        rows = new int[RowLength * vertexCount];
        Array.Fill(rows, graph.BoundaryVertex);
        for (int vertex = 0; vertex < vertexCount; vertex++)
        {
            int row = vertex * RowLength;
            rows[row] = firstEdge[vertex];
            for (int place = firstEdge[vertex]; place < graph.First[vertex + 1]; place++)
            {
                rows[row + 1 + place - firstEdge[vertex]] = graph.HalfEdges[place].Other;
            }
        }
    }

    /// <summary>Numbers in a row, a multiple of eight.</summary>
    public int RowLength { get; }

    /// <summary>Where the edges to the later neighbours begin.</summary>
    public int FirstEdge(int vertex) => rows[vertex * RowLength];

    /// <summary>Which of eight places of a row hold a marked vertex.</summary>
    /// <param name="vertex">Whose row.</param>
    /// <param name="from">The first place, a multiple of eight; place 0 holds no vertex and counts as unmarked.</param>
    /// <param name="marks">0 or 1 for each vertex, 0 for the boundary.</param>
    /// <returns>Bit i for place from + i, which belongs to the edge <see cref="FirstEdge"/> + from + i − 1.</returns>
    public int MarkedAmongEight(int vertex, int from, byte[] marks)
    {
        ReadOnlySpan<int> row = rows.AsSpan((vertex * RowLength) + from, Chunk);
        int first = from == 0 ? 0 : marks[row[0]];
        return first | (marks[row[1]] << 1) | (marks[row[2]] << 2) | (marks[row[3]] << 3)
            | (marks[row[4]] << 4) | (marks[row[5]] << 5) | (marks[row[6]] << 6) | (marks[row[7]] << 7);
    }
}
