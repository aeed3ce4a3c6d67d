namespace FtEstimate.Simulation.Decoding.Matching;

// A tree alternates between growing regions and shrinking ones; a shrinking region is matched with its only child. The root alone is unmatched.
internal sealed partial class AlternatingForest
{
    /// <summary>The defects next to each other or to the boundary are matched before anything grows.</summary>
    private void Settle(ReadOnlySpan<int> defects)
    {
        foreach (int vertex in defects)
        {
            Schedule(vertex, FirstMeeting(vertex).Time);
        }
    }

    private void MeetBoundary(int region, TightPath path)
    {
        Augment(region, path);
        Rest(regions[region].Tree);
    }

    /// <summary>A growing region meets one that grows or rests.</summary>
    private void Meet(int region, int other, TightPath path)
    {
        ref Region it = ref regions[region];
        ref Region met = ref regions[other];
        if (met.Slope > 0)
        {
            if (met.Tree == it.Tree)
            {
                Join(region, other, path);
                return;
            }

            int otherTree = met.Tree;
            Augment(region, path);
            Augment(other, path.Reversed());
            Rest(it.Tree);
            Rest(otherTree);
        }
        else if (met.Match.MeetsBoundary)
        {
            Augment(region, path);
            met.Match = path.Reversed();
            Rest(it.Tree);
        }
        else
        {
            Take(region, other, path);
        }
    }

    /// <summary>A resting region and its partner become part of the tree.</summary>
    private void Take(int region, int other, TightPath path)
    {
        int tree = regions[region].Tree;
        int partner = vertices[regions[other].Match.To].Top;
        regions[other].Parent = path.Reversed();
        regions[other].Turn(-1, now);
        Join(tree, other);
        regions[partner].Parent = regions[partner].Match;
        regions[partner].Turn(1, now);
        Join(tree, partner);
        ScheduleShrinking(other, now);
        BeginAll(partner);
    }

    /// <summary>Exchanges matched and unmatched paths from a region to the root, whose partner is found.</summary>
    private void Augment(int region, TightPath path)
    {
        while (true)
        {
            regions[region].Match = path;
            if (!regions[region].Parent.Exists)
            {
                return;
            }

            int shrinking = vertices[regions[region].Parent.To].Top;
            TightPath up = regions[shrinking].Parent;
            regions[shrinking].Match = up;
            path = up.Reversed();
            region = vertices[up.To].Top;
        }
    }

    /// <summary>All regions of a tree are matched and stop.</summary>
    private void Rest(int tree)
    {
        int first = firstMember[tree];
        firstMember[tree] = -1;
        treeCount--;
        for (int member = first; member >= 0; member = regions[member].MemberAfter)
        {
            regions[member].Turn(0, now);
            regions[member].Tree = -1;
        }

        for (int member = first; member >= 0; member = regions[member].MemberAfter)
        {
            // of those that grew the neighbours expected no less
            if (regions[member].SlopeBefore < 0)
            {
                AnnounceAll(member);
            }
        }
    }

    private void Join(int tree, int region)
    {
        ref Region it = ref regions[region];
        int first = firstMember[tree];
        it.Tree = tree;
        it.MemberBefore = -1;
        it.MemberAfter = first;
        if (first >= 0)
        {
            regions[first].MemberBefore = region;
        }

        firstMember[tree] = region;
    }

    private void Leave(int region)
    {
        ref Region it = ref regions[region];
        if (it.MemberBefore >= 0)
        {
            regions[it.MemberBefore].MemberAfter = it.MemberAfter;
        }
        else
        {
            firstMember[it.Tree] = it.MemberAfter;
        }

        if (it.MemberAfter >= 0)
        {
            regions[it.MemberAfter].MemberBefore = it.MemberBefore;
        }

        it.Tree = -1;
    }
}
