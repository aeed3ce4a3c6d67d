namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <summary>
/// Clusters that grow, all at the same speed, until each holds an even number of defects or touches the boundary; event by event.
/// </summary>
/// <remarks>
/// Clusters are lists of vertices relabelled when the shorter joins the longer; each vertex keeps the parity of observable flips along the spanning
/// forest to the vertex that numbers its cluster. Peeling the forest (Delfosse 2021, arXiv:1709.06218) would give the edges of the correction; their
/// parity is the sum of those of the paths from the defects, so it is kept while clusters merge, and nothing is peeled.
/// </remarks>
internal sealed partial class ClusterGrowth
{
    private readonly GrowthGraph graph;
    private readonly ClusterVertex[] vertices;
    private readonly int[] touched;
    private int touchedCount;
    private int growing;
    private EventQueue events = new(64);

    /// <summary>No clusters yet.</summary>
    public ClusterGrowth(GrowthGraph graph)
    {
        this.graph = graph;
        touched = new int[graph.BoundaryVertex];
        vertices = new ClusterVertex[graph.BoundaryVertex + 1];
        Array.Fill(vertices, ClusterVertex.Untouched);
        vertices[graph.BoundaryVertex].Cluster = ClusterVertex.Outside;
    }

    /// <summary>A defect that grows from time 0.</summary>
    public void AddDefect(int vertex)
    {
        touched[touchedCount++] = vertex;
        ref ClusterVertex here = ref vertices[vertex];
        here.Cluster = vertex;
        here.Growing = -1;
        here.Next = -1;
        here.Last = vertex;
        here.Size = 1;
        here.Bits.Odd = 1;
        growing++;
    }

    /// <summary>A defect that reaches the boundary before anything else.</summary>
    public void AddSettled(int vertex, int radius, int flips)
    {
        AddDefect(vertex);
        growing--;
        ref ClusterVertex here = ref vertices[vertex];
        here.Growing = 0;
        here.Level = radius;
        here.Bits.Exit = (byte)(2 | flips);
    }

    /// <summary>Two defects that meet each other before anything else.</summary>
    public void AddSettledPair(int vertex, int other, int radius, int flips)
    {
        touched[touchedCount] = vertex;
        touched[touchedCount + 1] = other;
        touchedCount += 2;
        ref ClusterVertex here = ref vertices[vertex];
        here.Cluster = vertex;
        here.Level = radius;
        here.Next = other;
        here.Last = other;
        here.Size = 2;
        here.Bits.Sum = (byte)flips;
        ref ClusterVertex there = ref vertices[other];
        there.Cluster = vertex;
        there.Level = radius;
        there.Next = -1;
        there.Bits.Flip = (byte)flips;
    }

    /// <summary>Puts the first event of a defect that grows into the queue; all defects must have been added.</summary>
    public void Start(int vertex) => Schedule(vertex, 0);

    /// <summary>Lets everything happen; a cluster that has nowhere to go stays as it is.</summary>
    public void Run()
    {
        while (growing > 0 && events.Count > 0)
        {
            (int time, int vertex) = events.Pop();
            if (vertices[vertex].Due == time && vertices[vertex].Growing != 0)
            {
                Advance(vertex, time);
            }
        }

        events.Clear();
        growing = 0;
    }

    /// <summary>Sums the corrections and forgets all clusters.</summary>
    /// <returns>1 if the correction flips the observable.</returns>
    public int Finish()
    {
        int flips = 0;
        foreach (int vertex in touched.AsSpan(0, touchedCount))
        {
            ref ClusterVertex here = ref vertices[vertex];
            if (here.Cluster == vertex)
            {
                flips ^= here.Bits.Correction;
            }

            here = ClusterVertex.Untouched;
        }

        touchedCount = 0;
        return flips;
    }

    private void Schedule(int vertex, int time)
    {
        int wait = GrowthGraph.Never;
        ref ClusterVertex here = ref vertices[vertex];
        int radius = here.RadiusAt(time);
        foreach (ref readonly HalfEdge edge in graph.HalfEdges.AsSpan(graph.First[vertex]..graph.First[vertex + 1]))
        {
            ref ClusterVertex there = ref vertices[edge.Other];
            if (there.Cluster != here.Cluster)
            {
                wait = Math.Min(wait, Wait(edge.Length - radius, in there, time));
            }
        }

        Enqueue(ref here, vertex, time, wait);
    }

    // where both ends grow it takes half as long; rounded up, by half a step
    private static int Wait(int length, in ClusterVertex there, int time)
    {
        int both = there.Growing & 1;
        return (length - there.RadiusAt(time) + both) >> both;
    }

    private void Enqueue(ref ClusterVertex here, int vertex, int time, int wait)
    {
        if (wait != GrowthGraph.Never)
        {
            here.Due = time + Math.Max(wait, 0);
            events.Push(here.Due, vertex);
        }
    }

    // goes through all edges of a vertex that are grown through by now, and waits for the next
    private void Advance(int vertex, int time)
    {
        int wait = GrowthGraph.Never;
        ref ClusterVertex here = ref vertices[vertex];
        int radius = here.RadiusAt(time);
        foreach (ref readonly HalfEdge edge in graph.HalfEdges.AsSpan(graph.First[vertex]..graph.First[vertex + 1]))
        {
            ref ClusterVertex there = ref vertices[edge.Other];
            if (there.Cluster == here.Cluster)
            {
                continue;
            }

            int edgeWait = Wait(edge.Length - radius, in there, time);
            if (edgeWait > 0)
            {
                wait = Math.Min(wait, edgeWait);
                continue;
            }

            Cross(vertex, edge, time);
            if (here.Growing == 0)
            {
                return;
            }
        }

        Enqueue(ref here, vertex, time, wait);
    }
}
