namespace FtEstimate.Simulation.Graphs;

/// <summary>The fewest mechanisms that together flip the observable and no detector.</summary>
public static class CircuitDistance
{
    /// <summary>Length of the shortest walk from the boundary back to it that flips the observable an odd number of times; null if there is none.</summary>
    /// <remarks>Breadth-first search over (vertex, parity); exact.</remarks>
    public static int? Of(DetectorGraph graph)
    {
        int boundary = graph.VertexCount;
        int[] steps = new int[2 * (boundary + 1)];
        Array.Fill(steps, -1);
        int start = 2 * boundary;
        int goal = start + 1;
        int[] atBoundary = [.. Enumerable.Range(0, graph.Edges.Length).Where(index => graph.Edges[index].MeetsBoundary)];
        Queue<int> queue = new([start]);
        steps[start] = 0;
        while (queue.TryDequeue(out int state))
        {
            if (state == goal)
            {
                return steps[goal];
            }

            int vertex = state / 2;
            foreach (int index in vertex == boundary ? atBoundary : graph.EdgesAt(vertex))
            {
                GraphEdge edge = graph.Edges[index];
                int other = vertex == boundary ? edge.A : edge.Other(vertex);
                int next = (2 * (other == DetectorGraph.Boundary ? boundary : other)) + ((state + (edge.FlipsObservable ? 1 : 0)) % 2);
                if (steps[next] < 0)
                {
                    steps[next] = steps[state] + 1;
                    queue.Enqueue(next);
                }
            }
        }

        return null;
    }
}
