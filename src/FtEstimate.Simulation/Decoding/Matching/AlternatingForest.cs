namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>
/// The alternating trees that grow from the defects of a shot until every one is matched. This file holds the state and its beginning and end;
/// <c>Growth</c> moves the regions over the graph, <c>Trees</c> and <c>Blossoms</c> say what happens where they meet, <c>Inside</c> walks blossoms, <c>Paths</c> reads the matching off.
/// </summary>
internal sealed partial class AlternatingForest
{
    private const long Never = long.MaxValue;

    // owners of vertices under no region
    private const int Unseen = -1;
    private const int Left = -2;

    private readonly WeightedEdges edges;
    private readonly CoveredVertex[] vertices;
    private readonly EventQueue queue = new();
    private Region[] regions = [];
    private int[] firstMember = [];
    private int[] freeRegions = [];
    private int freeCount;
    private int[] touched = new int[64];
    private int touchedCount;
    private int defectCount;
    private int treeCount;
    private int stamp;
    private long now;

    public AlternatingForest(WeightedEdges edges, int vertexCount)
    {
        this.edges = edges;
        vertices = new CoveredVertex[vertexCount];
        Array.Fill(vertices, new CoveredVertex { Top = -1, Owner = Unseen, Queued = Never, Below = -1 });
    }

    /// <summary>Matches the defects and answers with the parity of the paths.</summary>
    public bool Match(ReadOnlySpan<int> defects)
    {
        Forget();
        Plant(defects);
        Settle(defects);
        while (treeCount > 0 && queue.Take(out QueuedEvent next))
        {
            now = next.Time;
            if (next.Subject >= 0)
            {
                if (vertices[next.Subject].Queued == now)
                {
                    vertices[next.Subject].Queued = Never;
                    Attend(next.Subject);
                }
            }
            else if (regions[~next.Subject].Queued == now)
            {
                regions[~next.Subject].Queued = Never;
                Shrink(~next.Subject);
            }
        }

        return ListPaths(defects) != 0;
    }

    /// <summary>Wipes the last shot, touching only what it touched.</summary>
    public void Forget()
    {
        foreach (int vertex in touched.AsSpan(0, touchedCount))
        {
            vertices[vertex] = new CoveredVertex { Top = -1, Owner = Unseen, Queued = Never, Below = -1 };
        }

        touchedCount = 0;
        queue.Clear();
        now = 0;
        pathCount = 0;
        Dual = 0;
        stamp = 0;
    }

    private void Plant(ReadOnlySpan<int> defects)
    {
        defectCount = defects.Length;
        treeCount = defectCount;
        MakeRoom();
        for (int region = 0; region < defectCount; region++)
        {
            int vertex = defects[region];
            vertices[vertex] = new CoveredVertex { Top = region, Owner = region, Queued = Never, Source = vertex << 1, Below = -1 };
            Touch(vertex);
            regions[region] = Fresh();
            regions[region].Slope = 1;
            regions[region].LastVertex = vertex;
            Join(region, region);
        }

        // the last one is taken first: names then do not depend on what was decoded before
        freeCount = 0;
        for (int region = (2 * defectCount) + 1; region >= defectCount; region--)
        {
            freeRegions[freeCount++] = region;
        }
    }

    private static Region Fresh() => new()
    {
        Queued = Never,
        Blossom = -1,
        Child = -1,
        Match = TightPath.None,
        Parent = TightPath.None,
        Tree = -1,
        MemberAfter = -1,
        MemberBefore = -1,
        LastVertex = -1,
    };

    // at most half as many blossoms as defects exist at a time
    private void MakeRoom()
    {
        int needed = (2 * defectCount) + 2;
        if (regions.Length < needed)
        {
            int room = Math.Max(2 * needed, 64);
            regions = new Region[room];
            firstMember = new int[room];
            freeRegions = new int[room];
            paths = new TightPath[room];
            blossomsToOpen = new ClosedBlossom[room];
        }

        firstMember.AsSpan(0, defectCount).Fill(-1);
    }

    private void Touch(int vertex)
    {
        if (touchedCount == touched.Length)
        {
            Array.Resize(ref touched, 2 * touchedCount);
        }

        touched[touchedCount++] = vertex;
    }
}
