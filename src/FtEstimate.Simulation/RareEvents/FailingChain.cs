using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>
/// A random walk over the sets of mechanisms that fail, with their probabilities at a noise level as its stationary distribution: a change is proposed,
/// decoded, and made if the set still fails (Metropolis and others 1953; for decoders Bravyi 2013, arXiv:1308.6270).
/// </summary>
/// <remarks>
/// A mechanism chosen evenly is nearly always an unlikely addition far from the logical error. So changes are drawn as noise itself would draw them,
/// and most of them look at the logical error, a function of the set:
/// <list type="bullet">
/// <item>noise away from the logical error is drawn anew, which must leave the logical error what it is;</item>
/// <item>all noise near a detector of the logical error is drawn anew;</item>
/// <item>a mechanism of the logical error is replaced by another one at the same detector;</item>
/// <item>a stretch of mechanisms anywhere is drawn anew, which alone already leads everywhere.</item>
/// </list>
/// Each is in detailed balance with the noise restricted to failing sets.
/// </remarks>
/// <param name="ladder">Mechanisms and decoder.</param>
internal sealed class FailingChain(NoiseLadder ladder)
{
    private const int LargestRadius = 3;

    private readonly int[] order = ladder.Order;
    private readonly int[] rank = ladder.Rank;
    private readonly GraphEdge[] edges = [.. ladder.DecoderGraph.Edges];
    private readonly MatchingDecoder decoder = new(ladder.DecoderGraph);
    private readonly FaultSet set = new(ladder.DecoderGraph);
    private readonly Neighbourhood near = new(ladder.DecoderGraph);
    private readonly int[] toggled = new int[2 * ladder.DecoderGraph.Edges.Length];
    private LogicalCluster cluster = new(ladder.DecoderGraph);
    private LogicalCluster candidate = new(ladder.DecoderGraph);
    private int toggledCount;

    /// <summary>Where the walk stands.</summary>
    public ReadOnlySpan<int> Faults => set.Faults;

    /// <summary>Draws a set from the noise.</summary>
    /// <returns>Whether it fails.</returns>
    public bool DrawAnew(NoiseLevel level, ref RandomBits random)
    {
        set.SetTo([]);
        toggledCount = 0;
        AddNoise(level, 0, order.Length, awayOnly: false, ref random);
        return Fails();
    }

    /// <summary>Puts the walk on a failing set.</summary>
    public void StartFrom(ReadOnlySpan<int> faults)
    {
        set.SetTo(faults);
        Fails();
        cluster.Find(set.Faults, decoder.LastPaths);
    }

    /// <summary>Proposes changes.</summary>
    /// <returns>How many were made.</returns>
    public int Walk(NoiseLevel level, int moves, ref RandomBits random)
    {
        int made = 0;
        for (int move = 0; move < moves; move++)
        {
            toggledCount = 0;
            bool isMade = random.NextBelow(20) switch
            {
                < 5 => RedrawAway(level, ref random),
                < 11 => RedrawNear(level, ref random),
                < 17 => Replace(level, ref random),
                _ => RedrawStretch(level, ref random),
            };
            if (isMade)
            {
                (cluster, candidate) = (candidate, cluster);
                made++;
            }
            else
            {
                while (toggledCount > 0)
                {
                    set.Toggle(toggled[--toggledCount]);
                }
            }
        }

        return made;
    }

    private bool Fails() => decoder.Decode(set.Defects(), []) != set.ObservableFlipped;

    private bool StillFails()
    {
        if (!Fails())
        {
            return false;
        }

        candidate.Find(set.Faults, decoder.LastPaths);
        return true;
    }

    private void Toggle(int edge)
    {
        set.Toggle(edge);
        toggled[toggledCount++] = edge;
    }

    // with the same logical error the way back has the same noise to draw
    private bool RedrawAway(NoiseLevel level, ref RandomBits random)
    {
        near.Clear();
        foreach (int edge in cluster.Faults)
        {
            near.Add(edges[edge].A);
            near.Add(edges[edge].B);
        }

        near.Grow(1 + random.NextBelow(2));
        Redraw(level, random.NextUnit(), awayOnly: true, ref random);
        return StillFails() && candidate.Equals(cluster);
    }

    // the detector is chosen among the ends of the logical error: the way back chooses it with another probability
    private bool RedrawNear(NoiseLevel level, ref RandomBits random)
    {
        int vertex = AnEnd(cluster.Faults[random.NextBelow(cluster.Count)], ref random);
        if (vertex == DetectorGraph.Boundary)
        {
            return false;
        }

        near.Clear();
        near.Add(vertex);
        near.Grow(1 + random.NextBelow(LargestRadius));
        foreach (int edge in set.Faults)
        {
            if (near.Holds(edge))
            {
                toggled[toggledCount++] = edge;
            }
        }

        foreach (int edge in toggled.AsSpan(0, toggledCount))
        {
            set.Toggle(edge);
        }

        double untilNext = -Math.Log(random.NextUnit());
        foreach (int from in near.Vertices)
        {
            foreach (int edge in ladder.DecoderGraph.EdgesAt(from))
            {
                if (edges[edge].A == from && near.Holds(edge))
                {
                    untilNext -= level.HazardOf(rank[edge]);
                    if (untilNext < 0)
                    {
                        Toggle(edge);
                        untilNext = -Math.Log(random.NextUnit());
                    }
                }
            }
        }

        return StillFails()
            && random.NextUnit() * cluster.EndsAt(vertex) * candidate.Count <= (double)candidate.EndsAt(vertex) * cluster.Count;
    }

    // the way back takes the same end of the new mechanism, and the old one among as many at that detector
    private bool Replace(NoiseLevel level, ref RandomBits random)
    {
        int old = cluster.Faults[random.NextBelow(cluster.Count)];
        int vertex = AnEnd(old, ref random);
        if (vertex == DetectorGraph.Boundary)
        {
            return false;
        }

        ReadOnlySpan<int> choices = ladder.DecoderGraph.EdgesAt(vertex);
        int chosen = choices[random.NextBelow(choices.Length)];
        if (set.Has(chosen) || random.NextUnit() * level.Odds[old] > level.Odds[chosen])
        {
            return false;
        }

        Toggle(old);
        Toggle(chosen);
        return StillFails() && candidate.Has(chosen) && random.NextUnit() * candidate.Count <= cluster.Count;
    }

    // lengths spread evenly over the scales from one expected fault to everything
    private bool RedrawStretch(NoiseLevel level, ref RandomBits random)
    {
        Redraw(level, Math.Pow(Math.Max(level.ExpectedFaults, 1), random.NextUnit() - 1), awayOnly: false, ref random);
        return StillFails();
    }

    private int AnEnd(int edge, ref RandomBits random) => random.NextBelow(2) == 0 ? edges[edge].A : edges[edge].B;

    // a stretch that reaches beyond the last mechanism goes on with the first
    private void Redraw(NoiseLevel level, double share, bool awayOnly, ref RandomBits random)
    {
        int length = Math.Clamp((int)(share * order.Length), 1, order.Length);
        int first = random.NextBelow(order.Length);
        int beyond = Math.Max(first + length - order.Length, 0);
        foreach (int edge in set.Faults)
        {
            bool inside = (rank[edge] >= first && rank[edge] < first + length) || rank[edge] < beyond;
            if (inside && !(awayOnly && near.Touches(edge)))
            {
                toggled[toggledCount++] = edge;
            }
        }

        foreach (int edge in toggled.AsSpan(0, toggledCount))
        {
            set.Toggle(edge);
        }

        AddNoise(level, first, first + length - beyond, awayOnly, ref random);
        AddNoise(level, 0, beyond, awayOnly, ref random);
    }

    // a mechanism happens if at least one point of a Poisson process falls on its stretch of the summed hazard
    private void AddNoise(NoiseLevel level, int first, int end, bool awayOnly, ref RandomBits random)
    {
        double point = level.HazardBefore[first] - Math.Log(random.NextUnit());
        while (point < level.HazardBefore[end])
        {
            int found = level.RankAt(point);
            if (!(awayOnly && near.Touches(order[found])))
            {
                Toggle(order[found]);
            }

            point = level.HazardBefore[found + 1] - Math.Log(random.NextUnit());
        }
    }
}
