using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Graphs;

/// <summary>Everything about a small memory by going through all states of its detectors and its observable; the observable is the highest bit.</summary>
internal static class ExactMemory
{
    /// <summary>Probability of each state: the mechanisms folded in one after another.</summary>
    public static double[] Distribution(DetectorGraph graph)
    {
        double[] states = new double[2 << graph.VertexCount];
        states[0] = 1;
        foreach (GraphEdge edge in graph.Edges)
        {
            int mask = MaskOf(graph, edge);
            int lowest = mask & -mask;
            for (int state = 0; state < states.Length; state++)
            {
                if ((state & lowest) == 0)
                {
                    double without = states[state];
                    double with = states[state ^ mask];
                    states[state] = without + (edge.Probability * (with - without));
                    states[state ^ mask] = with + (edge.Probability * (without - with));
                }
            }
        }

        return states;
    }

    /// <summary>Probability that the observable is flipped, nobody correcting it.</summary>
    public static double RawFlip(DetectorGraph graph) => Distribution(graph).Skip(1 << graph.VertexCount).Sum();

    /// <summary>Probability that the lightest set of mechanisms with the defects seen is of the wrong kind.</summary>
    /// <returns>The value where ties are always decided rightly, and where always wrongly.</returns>
    public static (double Low, double High) LeastWeightFailure(DetectorGraph graph)
    {
        // weights in the decoder are rounded to 2⁻¹⁷ each
        const double Tie = 1e-3;
        double[] weights = LeastWeights(graph);
        double[] probabilities = Distribution(graph);
        int flipped = 1 << graph.VertexCount;
        double low = 0;
        double high = 0;
        for (int state = 0; state < flipped; state++)
        {
            double difference = weights[state | flipped] - weights[state];
            bool isTie = Math.Abs(difference) < Tie;
            double wrong = difference > 0 ? probabilities[state | flipped] : probabilities[state];
            low += isTie ? Math.Min(probabilities[state], probabilities[state | flipped]) : wrong;
            high += isTie ? Math.Max(probabilities[state], probabilities[state | flipped]) : wrong;
        }

        return (low, high);
    }

    /// <summary>½(1 − Π(1 − 2p)) over the mechanisms at a detector (exact).</summary>
    public static double FiringRate(DetectorGraph graph, int detector)
    {
        double product = 1;
        foreach (int edge in graph.EdgesAt(detector))
        {
            product *= 1 - (2 * graph.Edges[edge].Probability);
        }

        return (1 - product) / 2;
    }

    private static double[] LeastWeights(DetectorGraph graph)
    {
        double[] least = new double[2 << graph.VertexCount];
        Array.Fill(least, double.PositiveInfinity);
        least[0] = 0;
        foreach (GraphEdge edge in graph.Edges)
        {
            double weight = DetectorGraph.WeightOf(edge.Probability);
            int mask = MaskOf(graph, edge);
            int lowest = mask & -mask;
            for (int state = 0; state < least.Length; state++)
            {
                if ((state & lowest) == 0)
                {
                    double without = least[state];
                    double with = least[state ^ mask];
                    least[state] = Math.Min(without, with + weight);
                    least[state ^ mask] = Math.Min(with, without + weight);
                }
            }
        }

        return least;
    }

    private static int MaskOf(DetectorGraph graph, GraphEdge edge) =>
        (1 << edge.A) | (edge.MeetsBoundary ? 0 : 1 << edge.B) | (edge.FlipsObservable ? 1 << graph.VertexCount : 0);
}
