namespace FtEstimate.Simulation.Decoding.Matching;

// What concerns all vertices of a region, those of the regions inside it included.
internal sealed partial class AlternatingForest
{
    /// <summary>Names the outermost region over all vertices of a region and of those inside it.</summary>
    private void Cover(int region, int top, long more)
    {
        for (int inner = region; inner >= 0; inner = NextInside(inner, region))
        {
            for (int vertex = regions[inner].LastVertex; vertex >= 0; vertex = vertices[vertex].Below)
            {
                vertices[vertex].Top = top;
                vertices[vertex].Offset += more;
            }
        }
    }

    private void BeginAll(int region)
    {
        for (int inner = region; inner >= 0; inner = NextInside(inner, region))
        {
            for (int vertex = regions[inner].LastVertex; vertex >= 0; vertex = vertices[vertex].Below)
            {
                Begin(vertex);
            }
        }
    }

    private void AnnounceAll(int region)
    {
        for (int inner = region; inner >= 0; inner = NextInside(inner, region))
        {
            for (int vertex = regions[inner].LastVertex; vertex >= 0; vertex = vertices[vertex].Below)
            {
                Announce(vertex);
            }
        }
    }

    /// <summary>Walks a region and all inside it, outer ones first; -1 after the last.</summary>
    private int NextInside(int inner, int outermost)
    {
        if (regions[inner].Child >= 0)
        {
            return regions[inner].Child;
        }

        while (inner != outermost)
        {
            int around = regions[inner].Blossom;
            if (regions[inner].Next != regions[around].Child)
            {
                return regions[inner].Next;
            }

            inner = around;
        }

        return -1;
    }
}
