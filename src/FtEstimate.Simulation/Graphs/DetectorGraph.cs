using System.Collections.Immutable;

namespace FtEstimate.Simulation.Graphs;

/// <summary>
/// The detectors of one type (vertices, numbered round by round) and the error mechanisms that flip one or two of them (edges, identical ones merged;
/// two edges may join the same vertices if one flips the observable and the other does not).
/// </summary>
public sealed class DetectorGraph
{
    /// <summary>The end of an edge that flips one detector only.</summary>
    public const int Boundary = -1;

    private readonly int[] start;
    private readonly int[] incident;

    /// <summary>Lists the edges of each vertex.</summary>
    /// <param name="vertexCount">Number of detectors.</param>
    /// <param name="edges">Mechanisms, all ends within range, A never the boundary.</param>
    public DetectorGraph(int vertexCount, ImmutableArray<GraphEdge> edges)
    {
        VertexCount = vertexCount;
        Edges = edges;
        start = new int[vertexCount + 1];
        foreach (GraphEdge edge in edges)
        {
            start[edge.A + 1]++;
            if (!edge.MeetsBoundary)
            {
                start[edge.B + 1]++;
            }
        }

        for (int vertex = 0; vertex < vertexCount; vertex++)
        {
            start[vertex + 1] += start[vertex];
        }

        incident = new int[start[vertexCount]];
        int[] next = start[..^1];
        for (int index = 0; index < edges.Length; index++)
        {
            GraphEdge edge = edges[index];
            incident[next[edge.A]++] = index;
            if (!edge.MeetsBoundary)
            {
                incident[next[edge.B]++] = index;
            }
        }
    }

    /// <summary>Number of detectors.</summary>
    public int VertexCount { get; }

    /// <summary>Mechanisms.</summary>
    public ImmutableArray<GraphEdge> Edges { get; }

    /// <summary>Indices of the edges at a vertex, those to the boundary included.</summary>
    public ReadOnlySpan<int> EdgesAt(int vertex) => incident.AsSpan(start[vertex]..start[vertex + 1]);

    /// <summary>Weight of a mechanism, ln((1−p)/p); never negative, and finite for p = 0.</summary>
    public static double WeightOf(double probability) =>
        Math.Log((1 - Math.Min(probability, 0.5)) / Math.Clamp(probability, SmallestProbability, 0.5));

    /// <summary>Stands in for probability 0: no sum of mechanisms that can happen is as unlikely.</summary>
    private const double SmallestProbability = 1e-30;
}
