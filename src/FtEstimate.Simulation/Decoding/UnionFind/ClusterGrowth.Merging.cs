namespace FtEstimate.Simulation.Decoding.UnionFind;

/// <content>What happens where an edge is grown through.</content>
internal sealed partial class ClusterGrowth
{
    private void Cross(int vertex, HalfEdge edge, int time)
    {
        ref ClusterVertex here = ref vertices[vertex];
        int flip = here.Bits.Flip ^ edge.FlipsObservable;
        int reached = vertices[edge.Other].Cluster;
        if (reached == ClusterVertex.Unreached)
        {
            Absorb(here.Cluster, edge.Other, flip, time);
        }
        else if (reached == ClusterVertex.Outside)
        {
            vertices[here.Cluster].Bits.Exit = (byte)(2 | flip);
            Rest(here.Cluster, time);
        }
        else
        {
            Merge(here.Cluster, reached, flip ^ vertices[edge.Other].Bits.Flip, time);
        }
    }

    private void Absorb(int cluster, int vertex, int flip, int time)
    {
        touched[touchedCount++] = vertex;
        ref ClusterVertex number = ref vertices[cluster];
        ref ClusterVertex here = ref vertices[vertex];
        here.Cluster = cluster;
        here.Level = -time;
        here.Growing = -1;
        here.Next = -1;
        here.Bits.Flip = (byte)flip;
        vertices[number.Last].Next = vertex;
        number.Last = vertex;
        number.Size++;
        Schedule(vertex, time);
    }

    // the first one grows, the other may
    private void Merge(int cluster, int other, int flip, int time)
    {
        if (vertices[other].Growing != 0)
        {
            Rest(cluster, time);
            Rest(other, time);
            Join(cluster, other, flip);
        }
        else if (vertices[other].Bits.Exit != 0)
        {
            Rest(cluster, time);
            Join(cluster, other, flip);
        }
        else
        {
            int last = vertices[other].Last;
            for (int vertex = other; vertex >= 0; vertex = vertices[vertex].Next)
            {
                vertices[vertex].Level -= time;
                vertices[vertex].Growing = -1;
            }

            Join(cluster, other, flip);
            for (int vertex = other; ; vertex = vertices[vertex].Next)
            {
                Schedule(vertex, time);
                if (vertex == last)
                {
                    break;
                }
            }
        }
    }

    private void Rest(int cluster, int time)
    {
        growing--;
        for (int vertex = cluster; vertex >= 0; vertex = vertices[vertex].Next)
        {
            vertices[vertex].Level += time;
            vertices[vertex].Growing = 0;
        }
    }

    private void Join(int cluster, int other, int flip)
    {
        if (vertices[cluster].Size < vertices[other].Size)
        {
            (cluster, other) = (other, cluster);
        }

        ref ClusterVertex number = ref vertices[cluster];
        ref ClusterVertex joining = ref vertices[other];
        number.Bits.Sum ^= (byte)(joining.Bits.Sum ^ (joining.Bits.Odd & flip));
        number.Bits.Odd ^= joining.Bits.Odd;
        // never both: one of the two was growing
        if (joining.Bits.Exit != 0)
        {
            number.Bits.Exit = (byte)(joining.Bits.Exit ^ flip);
        }

        for (int vertex = other; vertex >= 0; vertex = vertices[vertex].Next)
        {
            vertices[vertex].Cluster = cluster;
            vertices[vertex].Bits.Flip ^= (byte)flip;
        }

        vertices[number.Last].Next = other;
        number.Last = joining.Last;
        number.Size += joining.Size;
    }
}
