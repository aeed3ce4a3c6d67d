namespace FtEstimate.Simulation.Decoding.Matching;

// A tree alternates between growing regions and shrinking ones; a shrinking region is matched with its only child. The root alone is unmatched.
internal sealed partial class AlternatingForest
{
    /// <summary>
    /// Before anything grows, matches the defects that are each other's nearest neighbours or nearest to the boundary. Their regions stay on their
    /// own edges, so that all radii are those of a dual solution, and the search may start from there.
    /// </summary>
    private void Settle(ReadOnlySpan<int> defects)
    {
        for (int region = 0; region < defects.Length; region++)
        {
            if (regions[region].Slope == 0)
            {
                continue;
            }

            int vertex = defects[region];
            Meeting first = FirstMeeting(vertex);
            int other = first.Along.Other;
            if (first.Time == Never)
            {
                continue;
            }

            if (other < 0)
            {
                Settle(region, first.Time, new TightPath(vertex, -2 | first.Along.Parity));
            }
            else if (vertices[other].Top >= 0 && regions[vertices[other].Top].Slope > 0 && FirstMeeting(other).Time == first.Time)
            {
                TightPath path = new(vertex, (other << 1) | first.Along.Parity);
                Settle(region, first.Time, path);
                Settle(vertices[other].Top, first.Time, path.Reversed());
            }
            else
            {
                Schedule(vertex, first.Time);
            }
        }
    }

    private void Settle(int region, long radius, TightPath path)
    {
        ref Region it = ref regions[region];
        it.Intercept = radius;
        it.Slope = 0;
        it.Match = path;
        firstMember[region] = -1;
        it.Tree = -1;
        treeCount--;
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
