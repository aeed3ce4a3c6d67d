using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>The edges of a detector graph, packed by vertex, with whole even weights.</summary>
internal sealed class WeightedEdges
{
    /// <summary>Units of weight per 1 of ln((1−p)/p).</summary>
    public const double UnitsPerNat = 1 << 18;

    /// <summary>No weight is larger, so that each fits 31 bits; far above the weight of an edge that cannot happen.</summary>
    private const double LargestNats = 4000;

    private readonly int[] start;
    private readonly HalfEdge[] halves;
    private readonly int[] ownCodes;
    private readonly int[] halfAtA;
    private readonly int[] halfAtB;

    public WeightedEdges(DetectorGraph graph)
    {
        start = new int[graph.VertexCount + 1];
        ownCodes = new int[graph.Edges.Length];
        halfAtA = new int[graph.Edges.Length];
        halfAtB = new int[graph.Edges.Length];
        List<HalfEdge> listed = [];
        for (int vertex = 0; vertex < graph.VertexCount; vertex++)
        {
            foreach (int index in graph.EdgesAt(vertex))
            {
                GraphEdge edge = graph.Edges[index];
                (edge.A == vertex ? halfAtA : halfAtB)[index] = listed.Count;
                ownCodes[index] = UnitsOf(DetectorGraph.WeightOf(edge.Probability)) | (edge.FlipsObservable ? 1 : 0);
                listed.Add(new HalfEdge { Other = edge.Other(vertex), Code = ownCodes[index] });
            }

            start[vertex + 1] = listed.Count;
        }

        for (int index = 0; index < graph.Edges.Length; index++)
        {
            if (graph.Edges[index].MeetsBoundary)
            {
                halfAtB[index] = halfAtA[index];
            }
        }

        halves = [.. listed];
    }

    public ReadOnlySpan<HalfEdge> At(int vertex) => halves.AsSpan(start[vertex], start[vertex + 1] - start[vertex]);

    public void Override(ReadOnlySpan<ToldEdge> told)
    {
        foreach (ToldEdge edge in told)
        {
            Set(edge.Edge, UnitsOf(edge.Weight) | (ownCodes[edge.Edge] & 1));
        }
    }

    public void Restore(ReadOnlySpan<ToldEdge> told)
    {
        foreach (ToldEdge edge in told)
        {
            Set(edge.Edge, ownCodes[edge.Edge]);
        }
    }

    /// <summary>A weight in units, even, so that regions which meet half-way do so at a whole time.</summary>
    public static int UnitsOf(double weight) => 2 * (int)Math.Round(Math.Clamp(weight, 0, LargestNats) * (UnitsPerNat / 2));

    private void Set(int edge, int code)
    {
        halves[halfAtA[edge]].Code = code;
        halves[halfAtB[edge]].Code = code;
    }
}

/// <summary>An edge as seen from one of its ends.</summary>
internal struct HalfEdge
{
    /// <summary>The vertex at the other end, or the boundary.</summary>
    public int Other;

    /// <summary>Weight in units, which is even, plus 1 if the edge flips the observable.</summary>
    public int Code;

    public readonly int Weight => Code & ~1;

    public readonly int Parity => Code & 1;
}
