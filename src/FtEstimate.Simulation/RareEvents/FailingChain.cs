using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>
/// A random walk over the sets of mechanisms that fail, with their probabilities at a noise level as its stationary distribution: a change is proposed,
/// decoded, and kept if the set still fails (Metropolis and others 1953; for decoders Bravyi 2013, arXiv:1308.6270).
/// </summary>
/// <remarks>
/// Flipping one mechanism chosen evenly would nearly always propose an unlikely addition. So changes are drawn as noise itself would draw them:
/// <list type="bullet">
/// <item>a window of neighbouring mechanisms is drawn anew, which changes noise far from the logical error in few decodings;</item>
/// <item>a mechanism is replaced by another one at the same detector, which moves the logical error;</item>
/// <item>one is added, drawn by its probability, or one of those present is removed.</item>
/// </list>
/// Each is in detailed balance with the noise, hence with the noise restricted to failing sets.
/// </remarks>
/// <param name="ladder">Mechanisms and decoder.</param>
internal sealed class FailingChain(NoiseLadder ladder)
{
    private readonly int[] order = ladder.Order;
    private readonly int[] rank = ladder.Rank;
    private readonly GraphEdge[] edges = [.. ladder.DecoderGraph.Edges];
    private readonly MatchingDecoder decoder = new(ladder.DecoderGraph);
    private readonly int[] toggled = new int[2 * ladder.DecoderGraph.Edges.Length];
    private int toggledCount;

    /// <summary>Where the walk stands.</summary>
    public FaultSet Set { get; } = new(ladder.DecoderGraph);

    /// <summary>Whether the decoder is wrong about the set.</summary>
    public bool Fails() => decoder.Decode(Set.Defects(), []) != Set.ObservableFlipped;

    /// <summary>Draws a set from the noise, failing or not.</summary>
    public void DrawAnew(NoiseLevel level, ref RandomBits random)
    {
        Set.SetTo([]);
        AddNoise(level, 0, order.Length, ref random);
        toggledCount = 0;
    }

    /// <summary>Proposes changes to a failing set.</summary>
    /// <returns>How many were made.</returns>
    public int Walk(NoiseLevel level, int moves, ref RandomBits random)
    {
        int made = 0;
        for (int move = 0; move < moves; move++)
        {
            toggledCount = 0;
            switch (random.NextBelow(10))
            {
                case < 4:
                    RedrawAnyLength(level, ref random);
                    break;
                case < 6:
                    RedrawAnyScale(level, ref random);
                    break;
                case < 9:
                    Replace(level, ref random);
                    break;
                default:
                    AddOrRemove(level, ref random);
                    break;
            }

            if (toggledCount > 0 && Settle())
            {
                made++;
            }
        }

        return made;
    }

    private bool Settle()
    {
        if (Fails())
        {
            return true;
        }

        while (toggledCount > 0)
        {
            Set.Toggle(toggled[--toggledCount]);
        }

        return false;
    }

    private void Toggle(int edge)
    {
        Set.Toggle(edge);
        toggled[toggledCount++] = edge;
    }

    private void RedrawAnyLength(NoiseLevel level, ref RandomBits random) => Redraw(level, random.NextUnit(), ref random);

    // lengths spread evenly over the scales from one expected fault to everything
    private void RedrawAnyScale(NoiseLevel level, ref RandomBits random) =>
        Redraw(level, Math.Pow(Math.Max(level.ExpectedFaults, 1), random.NextUnit() - 1), ref random);

    // a window that reaches beyond the last mechanism goes on with the first
    private void Redraw(NoiseLevel level, double share, ref RandomBits random)
    {
        int length = Math.Clamp((int)(share * order.Length), 1, order.Length);
        int first = random.NextBelow(order.Length);
        int beyond = Math.Max(first + length - order.Length, 0);
        foreach (int edge in Set.Faults)
        {
            if ((rank[edge] >= first && rank[edge] < first + length) || rank[edge] < beyond)
            {
                toggled[toggledCount++] = edge;
            }
        }

        foreach (int edge in toggled.AsSpan(0, toggledCount))
        {
            Set.Toggle(edge);
        }

        AddNoise(level, first, first + length - beyond, ref random);
        AddNoise(level, 0, beyond, ref random);
    }

    // a mechanism happens if at least one point of a Poisson process falls on its stretch of the summed hazard
    private void AddNoise(NoiseLevel level, int first, int end, ref RandomBits random)
    {
        double point = level.HazardBefore[first] - Math.Log(random.NextUnit());
        while (point < level.HazardBefore[end])
        {
            int found = level.RankAt(point);
            Toggle(order[found]);
            point = level.HazardBefore[found + 1] - Math.Log(random.NextUnit());
        }
    }

    // the other way round takes the same end of the new mechanism and the old one among as many at that detector
    private void Replace(NoiseLevel level, ref RandomBits random)
    {
        if (Set.Count == 0)
        {
            return;
        }

        int old = Set.Faults[random.NextBelow(Set.Count)];
        int vertex = random.NextBelow(2) == 0 ? edges[old].A : edges[old].B;
        if (vertex == DetectorGraph.Boundary)
        {
            return;
        }

        ReadOnlySpan<int> choices = ladder.DecoderGraph.EdgesAt(vertex);
        int chosen = choices[random.NextBelow(choices.Length)];
        if (!Set.Has(chosen) && random.NextUnit() * level.Odds[old] <= level.Odds[chosen])
        {
            Toggle(old);
            Toggle(chosen);
        }
    }

    private void AddOrRemove(NoiseLevel level, ref RandomBits random)
    {
        if (random.NextBelow(2) == 0)
        {
            int added = order[level.RankAt(level.Hazard * (1 - random.NextUnit()))];
            if (!Set.Has(added) && random.NextUnit() * (Set.Count + 1) <= Favour(level, added))
            {
                Toggle(added);
            }

            return;
        }

        if (Set.Count > 0)
        {
            int removed = Set.Faults[random.NextBelow(Set.Count)];
            if (random.NextUnit() * Favour(level, removed) <= Set.Count)
            {
                Toggle(removed);
            }
        }
    }

    /// <summary>Odds of a mechanism over the chance that it is the one proposed for addition; the hazard of all, but for second orders of p.</summary>
    private double Favour(NoiseLevel level, int edge) =>
        level.Odds[edge] * level.Hazard / (level.HazardBefore[rank[edge] + 1] - level.HazardBefore[rank[edge]]);
}
