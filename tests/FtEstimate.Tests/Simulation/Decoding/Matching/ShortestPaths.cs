using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

/// <summary>Lengths of the cheapest paths between defects, for each parity of the observable, by plain Dijkstra on the doubled graph.</summary>
internal sealed class ShortestPaths
{
    public const long None = long.MaxValue / 1024;

    private readonly Dictionary<int, long[]> from = [];

    public ShortestPaths(DetectorGraph graph, ReadOnlySpan<int> defects, ReadOnlySpan<ToldEdge> told)
    {
        long[] weights = [.. graph.Edges.Select(edge => (long)WeightedEdges.UnitsOf(DetectorGraph.WeightOf(edge.Probability)))];
        foreach (ToldEdge edge in told)
        {
            weights[edge.Edge] = WeightedEdges.UnitsOf(edge.Weight);
        }

        foreach (int defect in defects)
        {
            from[defect] = From(graph, weights, defect);
        }
    }

    /// <summary>Length of the cheapest path of a parity; <paramref name="end"/> may be the boundary.</summary>
    public long Length(int defect, int end, int parity) => from[defect][(2 * (end + 1)) + parity];

    public long Length(int defect, int end) => Math.Min(Length(defect, end, 0), Length(defect, end, 1));

    private static long[] From(DetectorGraph graph, long[] weights, int defect)
    {
        // vertex v of parity q has the index 2 (v + 1) + q: the boundary comes first
        long[] lengths = new long[2 * (graph.VertexCount + 1)];
        Array.Fill(lengths, None);
        lengths[2 * (defect + 1)] = 0;
        PriorityQueue<int, long> queue = new();
        queue.Enqueue(2 * (defect + 1), 0);
        while (queue.TryDequeue(out int state, out long length))
        {
            int vertex = (state / 2) - 1;
            if (length > lengths[state] || vertex < 0)
            {
                continue;
            }

            foreach (int index in graph.EdgesAt(vertex))
            {
                GraphEdge edge = graph.Edges[index];
                int next = (2 * (edge.Other(vertex) + 1)) + ((state & 1) ^ (edge.FlipsObservable ? 1 : 0));
                if (length + weights[index] < lengths[next])
                {
                    lengths[next] = length + weights[index];
                    queue.Enqueue(next, lengths[next]);
                }
            }
        }

        return lengths;
    }
}
