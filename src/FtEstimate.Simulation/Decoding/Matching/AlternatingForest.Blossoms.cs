namespace FtEstimate.Simulation.Decoding.Matching;

internal sealed partial class AlternatingForest
{
    /// <summary>Two growing regions of one tree have met: the ring they close becomes a blossom.</summary>
    /// <param name="first">One of them.</param>
    /// <param name="second">The other.</param>
    /// <param name="path">From the first to the second.</param>
    private void Join(int first, int second, TightPath path)
    {
        int ancestor = CommonAncestor(first, second);
        int tree = regions[ancestor].Tree;
        int blossom = freeRegions[--freeCount];
        regions[blossom] = Fresh();
        ref Region it = ref regions[blossom];
        it.Child = ancestor;
        it.Match = regions[ancestor].Match;
        it.Parent = regions[ancestor].Parent;

        // the ring runs up from the first to the ancestor, down to the second, and back to the first
        for (int below = first; below != ancestor;)
        {
            int above = vertices[regions[below].Parent.To].Top;
            Link(below, above, regions[below].Parent);
            below = above;
        }

        for (int below = second; below != ancestor;)
        {
            int above = vertices[regions[below].Parent.To].Top;
            Link(above, below, regions[below].Parent.Reversed());
            below = above;
        }

        Link(second, first, path.Reversed());
        it.Turn(1, now);
        int child = ancestor;
        do
        {
            Enclose(child, blossom);
            child = regions[child].Next;
        }
        while (child != ancestor);

        Join(tree, blossom);
        do
        {
            if (regions[child].SlopeBefore < 0)
            {
                BeginAll(child);
            }

            child = regions[child].Next;
        }
        while (child != ancestor);
    }

    /// <summary>A shrinking defect has no radius left: its parent and its child in the tree meet over it.</summary>
    private void Squeeze(int region)
    {
        TightPath up = regions[region].Parent;
        TightPath down = regions[region].Match;
        Join(vertices[up.To].Top, vertices[down.To].Top, new TightPath(up.To, down.Code ^ up.Parity));
    }

    /// <summary>A shrinking blossom has no radius left: its ring opens, the even way round it stays in the tree, the rest is paired.</summary>
    private void Shatter(int blossom)
    {
        ref Region it = ref regions[blossom];
        int tree = it.Tree;
        int top = ChildWith(it.Parent.From, blossom);
        int bottom = ChildWith(it.Match.From, blossom);
        int length = 0;
        for (int child = top; child != bottom; child = regions[child].Next)
        {
            length++;
        }

        bool forwards = length % 2 == 0;
        int opened = top;
        do
        {
            Release(opened);
            opened = regions[opened].Next;
        }
        while (opened != top);

        Leave(blossom);
        regions[top].Parent = it.Parent;
        int shrinking = top;
        while (shrinking != bottom)
        {
            int growing = Step(shrinking, forwards);
            int below = Step(growing, forwards);
            Pair(shrinking, growing, forwards);
            regions[growing].Parent = regions[growing].Match;
            regions[below].Parent = PathBetween(growing, below, forwards).Reversed();
            regions[shrinking].Turn(-1, now);
            regions[growing].Turn(1, now);
            Join(tree, shrinking);
            Join(tree, growing);
            shrinking = below;
        }

        regions[bottom].Match = it.Match;
        regions[bottom].Turn(-1, now);
        Join(tree, bottom);
        for (int resting = Step(bottom, forwards); resting != top;)
        {
            int partner = Step(resting, forwards);
            Pair(resting, partner, forwards);
            resting = Step(partner, forwards);
        }

        it.Slope = 0;
        it.Child = -1;
        freeRegions[freeCount++] = blossom;
        do
        {
            Resume(opened);
            opened = regions[opened].Next;
        }
        while (opened != top);
    }

    private void Resume(int child)
    {
        switch (regions[child].Slope)
        {
            case 1:
                BeginAll(child);
                break;
            case 0:
                AnnounceAll(child);
                break;
            default:
                ScheduleShrinking(child, now);
                break;
        }
    }

    private int Step(int region, bool forwards) => forwards ? regions[region].Next : regions[region].Previous;

    private TightPath PathBetween(int region, int step, bool forwards) => forwards ? regions[region].Ring : regions[step].Ring.Reversed();

    private void Pair(int region, int step, bool forwards)
    {
        TightPath path = PathBetween(region, step, forwards);
        regions[region].Match = path;
        regions[step].Match = path.Reversed();
    }

    private void Link(int region, int next, TightPath path)
    {
        regions[region].Next = next;
        regions[region].Ring = path;
        regions[next].Previous = region;
    }

    private void Enclose(int child, int blossom)
    {
        Leave(child);
        regions[child].Turn(0, now);
        regions[child].Blossom = blossom;
        Cover(child, blossom, regions[child].Intercept);
    }

    private void Release(int child)
    {
        regions[child].Blossom = -1;
        Cover(child, child, -regions[child].Intercept);
    }

    private int CommonAncestor(int first, int second)
    {
        stamp++;
        regions[first].Mark = stamp;
        while (regions[first].Parent.Exists)
        {
            first = vertices[regions[first].Parent.To].Top;
            regions[first].Mark = stamp;
        }

        while (regions[second].Mark != stamp)
        {
            second = vertices[regions[second].Parent.To].Top;
        }

        return second;
    }

    private int ChildWith(int defectVertex, int blossom)
    {
        int region = vertices[defectVertex].Owner;
        while (regions[region].Blossom != blossom)
        {
            region = regions[region].Blossom;
        }

        return region;
    }
}
