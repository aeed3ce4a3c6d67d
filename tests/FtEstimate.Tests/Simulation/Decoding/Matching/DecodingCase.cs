using System.Collections.Immutable;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

/// <summary>A random graph with random defects and told edges: parallel edges, weights 0, ties and missing boundaries are frequent.</summary>
internal sealed record DecodingCase(DetectorGraph Graph, int[] Defects, ToldEdge[] Told)
{
    private static readonly double[] Probabilities = [0.5, 0.3, 0.1, 0.1, 0.01, 0.001, 0];

    public static DecodingCase Of(ulong seed, int largestVertexCount, int largestDefectCount)
    {
        RandomBits random = new(seed, 0);
        int vertexCount = 1 + random.NextBelow(largestVertexCount);
        bool hasTies = random.NextBelow(2) == 0;
        bool hasBoundary = random.NextBelow(8) > 0;
        int edgeCount = vertexCount + random.NextBelow(2 * vertexCount);
        int reach = 1 + random.NextBelow(vertexCount);
        var edges = ImmutableArray.CreateBuilder<GraphEdge>();
        for (int edge = 0; edge < edgeCount; edge++)
        {
            int a = random.NextBelow(vertexCount);
            int b = (a + 1 + random.NextBelow(reach)) % vertexCount;
            double probability = hasTies ? Probabilities[random.NextBelow(Probabilities.Length)] : 0.5 * random.NextUnit();
            if (a != b || hasBoundary)
            {
                bool meetsBoundary = a == b || (hasBoundary && random.NextBelow(6) == 0);
                edges.Add(new GraphEdge(a, meetsBoundary ? DetectorGraph.Boundary : b, probability, random.NextBelow(2) == 0));
            }
        }

        List<int> vertices = [.. Enumerable.Range(0, vertexCount)];
        int defectCount = random.NextBelow(Math.Min(vertexCount, largestDefectCount) + 1);
        while (vertices.Count > defectCount)
        {
            vertices.RemoveAt(random.NextBelow(vertices.Count));
        }

        List<ToldEdge> told = [];
        bool isTold = random.NextBelow(2) == 0;
        for (int edge = 0; isTold && edge < edges.Count; edge++)
        {
            if (random.NextBelow(4) == 0)
            {
                told.Add(new ToldEdge(edge, random.NextBelow(2) == 0 ? random.NextBelow(3) : 7 * random.NextUnit()));
            }
        }

        return new DecodingCase(new DetectorGraph(vertexCount, edges.ToImmutable()), [.. vertices], [.. told]);
    }
}
