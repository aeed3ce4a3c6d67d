using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>The detectors within some steps of given ones.</summary>
/// <param name="graph">Detectors and mechanisms.</param>
internal sealed class Neighbourhood(DetectorGraph graph)
{
    private readonly GraphEdge[] edges = [.. graph.Edges];
    private readonly int[] seen = new int[graph.VertexCount];
    private readonly int[] vertices = new int[graph.VertexCount];
    private int count;
    private int stamp;

    /// <summary>The detectors, nearest first.</summary>
    public ReadOnlySpan<int> Vertices => vertices.AsSpan(0, count);

    /// <summary>Forgets all.</summary>
    public void Clear()
    {
        stamp++;
        count = 0;
    }

    /// <summary>Adds a detector; the boundary is none.</summary>
    public void Add(int vertex)
    {
        if (vertex != DetectorGraph.Boundary && seen[vertex] != stamp)
        {
            seen[vertex] = stamp;
            vertices[count++] = vertex;
        }
    }

    /// <summary>Adds what is some steps away from those that were added.</summary>
    public void Grow(int steps)
    {
        int from = 0;
        for (int step = 0; step < steps; step++)
        {
            int until = count;
            for (; from < until; from++)
            {
                foreach (int edge in graph.EdgesAt(vertices[from]))
                {
                    Add(edges[edge].Other(vertices[from]));
                }
            }
        }
    }

    /// <summary>Whether both ends of a mechanism are here; the boundary is everywhere.</summary>
    public bool Holds(int edge) => Has(edges[edge].A) && (edges[edge].MeetsBoundary || Has(edges[edge].B));

    /// <summary>Whether an end of a mechanism is here.</summary>
    public bool Touches(int edge) => Has(edges[edge].A) || (!edges[edge].MeetsBoundary && Has(edges[edge].B));

    private bool Has(int vertex) => seen[vertex] == stamp;
}
