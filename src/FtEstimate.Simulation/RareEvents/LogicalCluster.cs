using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>
/// Which mechanisms of a failing set make up the logical error: those that hang together, through shared detectors and through what the decoder paired,
/// with an odd number of flips of the observable. The others do not matter for the failure.
/// </summary>
/// <param name="graph">The mechanisms.</param>
internal sealed class LogicalCluster(DetectorGraph graph)
{
    private readonly GraphEdge[] edges = [.. graph.Edges];
    private readonly int[] parent = new int[graph.VertexCount];
    private readonly bool[] isOdd = new bool[graph.VertexCount];
    private readonly int[] faults = new int[graph.Edges.Length];

    /// <summary>Number of mechanisms; at least one in a failing set.</summary>
    public int Count { get; private set; }

    /// <summary>Edges of the logical error, in no order.</summary>
    public ReadOnlySpan<int> Faults => faults.AsSpan(0, Count);

    /// <summary>Finds the logical error in a set that was just decoded.</summary>
    public void Find(ReadOnlySpan<int> set, ReadOnlySpan<TightPath> pairs)
    {
        foreach (int edge in set)
        {
            Begin(edges[edge].A);
            Begin(edges[edge].B);
        }

        foreach (int edge in set)
        {
            Join(edges[edge].A, edges[edge].B, edges[edge].FlipsObservable);
        }

        foreach (TightPath pair in pairs)
        {
            Join(pair.From, pair.To, pair.Parity != 0);
        }

        Count = 0;
        foreach (int edge in set)
        {
            if (isOdd[RootOf(edges[edge].A)])
            {
                faults[Count++] = edge;
            }
        }
    }

    /// <summary>Whether a mechanism belongs to the logical error.</summary>
    public bool Has(int edge) => Faults.Contains(edge);

    /// <summary>How many ends of mechanisms of the logical error lie at a detector.</summary>
    public int EndsAt(int vertex)
    {
        int ends = 0;
        foreach (int edge in Faults)
        {
            ends += (edges[edge].A == vertex ? 1 : 0) + (edges[edge].B == vertex ? 1 : 0);
        }

        return ends;
    }

    /// <summary>Whether two logical errors are the same.</summary>
    public bool Equals(LogicalCluster other)
    {
        if (other.Count != Count)
        {
            return false;
        }

        foreach (int edge in Faults)
        {
            if (!other.Has(edge))
            {
                return false;
            }
        }

        return true;
    }

    private void Begin(int vertex)
    {
        if (vertex != DetectorGraph.Boundary)
        {
            parent[vertex] = vertex;
            isOdd[vertex] = false;
        }
    }

    private void Join(int a, int b, bool flips)
    {
        int root = RootOf(a);
        if (b != DetectorGraph.Boundary)
        {
            int other = RootOf(b);
            if (other != root)
            {
                parent[other] = root;
                isOdd[root] ^= isOdd[other];
            }
        }

        isOdd[root] ^= flips;
    }

    private int RootOf(int vertex)
    {
        while (parent[vertex] != vertex)
        {
            parent[vertex] = parent[parent[vertex]];
            vertex = parent[vertex];
        }

        return vertex;
    }
}
