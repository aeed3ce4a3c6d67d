using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Decoding;

/// <summary>The smallest weight of a set of mechanisms that no detector sees and that flips the observable.</summary>
internal static class LightestLogicalFlip
{
    /// <summary>Dijkstra from every vertex to itself over pairs of vertex and parity; infinite if there is none.</summary>
    public static double Of(DetectorGraph graph)
    {
        int boundary = graph.VertexCount;
        (int A, int B, double Weight, bool Flips)[] edges =
        [
            .. graph.Edges.Select(edge => (edge.A, edge.MeetsBoundary ? boundary : edge.B, DetectorGraph.WeightOf(edge.Probability), edge.FlipsObservable)),
        ];
        ILookup<int, (int To, double Weight, bool Flips)> ways = edges
            .SelectMany(edge => new[] { (From: edge.A, To: edge.B, edge.Weight, edge.Flips), (From: edge.B, To: edge.A, edge.Weight, edge.Flips) })
            .ToLookup(way => way.From, way => (way.To, way.Weight, way.Flips));
        return Enumerable.Range(0, boundary + 1).Min(start => ShortestLoop(ways, start));
    }

    private static double ShortestLoop(ILookup<int, (int To, double Weight, bool Flips)> ways, int start)
    {
        HashSet<(int, bool)> done = [];
        PriorityQueue<(int Vertex, bool Flipped), double> queue = new([((start, false), 0.0)]);
        while (queue.TryDequeue(out (int Vertex, bool Flipped) here, out double weight))
        {
            if (here == (start, true))
            {
                return weight;
            }

            if (done.Add(here))
            {
                queue.EnqueueRange(ways[here.Vertex].Select(way => ((way.To, here.Flipped ^ way.Flips), weight + way.Weight)));
            }
        }

        return double.PositiveInfinity;
    }
}
