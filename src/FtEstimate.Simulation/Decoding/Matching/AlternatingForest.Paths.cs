namespace FtEstimate.Simulation.Decoding.Matching;

internal sealed partial class AlternatingForest
{
    private TightPath[] paths = [];
    private ClosedBlossom[] blossomsToOpen = [];
    private int pathCount;

    /// <summary>The paths of the matching, each once, and none for a defect that stayed alone.</summary>
    public ReadOnlySpan<TightPath> Paths => paths.AsSpan(0, pathCount);

    /// <summary>Sum of the radii of all regions: the weight of the matching, by duality.</summary>
    public long Dual { get; private set; }

    /// <summary>Sum of the radii of the regions that hold one of two defects and not the other, or one defect (the other being -1).</summary>
    public long SeparationOf(int first, int second)
    {
        long sum = 0;
        for (int region = vertices[first].Owner; region >= 0; region = regions[region].Blossom)
        {
            sum += Holds(region, second) ? 0 : regions[region].RadiusAt(now);
        }

        for (int region = second < 0 ? -1 : vertices[second].Owner; region >= 0; region = regions[region].Blossom)
        {
            sum += Holds(region, first) ? 0 : regions[region].RadiusAt(now);
        }

        return sum;
    }

    /// <summary>Whether no region has a radius below 0.</summary>
    public bool RadiiAreDistances(ReadOnlySpan<int> defects)
    {
        foreach (int vertex in defects)
        {
            for (int region = vertices[vertex].Owner; region >= 0; region = regions[region].Blossom)
            {
                if (regions[region].RadiusAt(now) < 0)
                {
                    return false;
                }
            }
        }

        return true;
    }

    private bool Holds(int region, int defectVertex)
    {
        int inner = defectVertex < 0 ? -1 : vertices[defectVertex].Owner;
        while (inner >= 0 && inner != region)
        {
            inner = regions[inner].Blossom;
        }

        return inner >= 0;
    }

    private int ListPaths(ReadOnlySpan<int> defects)
    {
        int parity = 0;
        int listed = ++stamp;
        foreach (int vertex in defects)
        {
            int top = vertices[vertex].Top;
            ref Region it = ref regions[top];
            if (it.Mark == listed)
            {
                continue;
            }

            it.Mark = listed;
            if (it.Match.Exists && (it.Match.MeetsBoundary || it.Match.From < it.Match.To))
            {
                parity ^= List(it.Match);
            }

            Dual += it.RadiusAt(now);
            if (it.Child >= 0)
            {
                parity ^= Open(top, it.Match.Exists ? it.Match.From : vertex);
            }
        }

        return parity;
    }

    /// <summary>Lists what is matched inside a blossom, one defect of which is matched outside.</summary>
    private int Open(int blossom, int entry)
    {
        int parity = 0;
        int waiting = 0;
        blossomsToOpen[waiting++] = new ClosedBlossom(blossom, entry);
        while (waiting > 0)
        {
            (int opened, int outward) = blossomsToOpen[--waiting];
            int outer = ChildWith(outward, opened);
            Enter(outer, outward, ref waiting);
            for (int first = regions[outer].Next; first != outer;)
            {
                TightPath path = regions[first].Ring;
                int second = regions[first].Next;
                parity ^= List(path);
                Enter(first, path.From, ref waiting);
                Enter(second, path.To, ref waiting);
                first = regions[second].Next;
            }
        }

        return parity;
    }

    private void Enter(int child, int outward, ref int waiting)
    {
        Dual += regions[child].Intercept;
        if (regions[child].Child >= 0)
        {
            blossomsToOpen[waiting++] = new ClosedBlossom(child, outward);
        }
    }

    private int List(TightPath path)
    {
        paths[pathCount++] = path;
        return path.Parity;
    }

    /// <summary>A blossom of the matching, and the vertex of its only defect that is matched outside.</summary>
    private readonly record struct ClosedBlossom(int Region, int Outward);
}
