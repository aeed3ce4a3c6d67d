using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Sampling;

/// <summary>Adds up what the losses told in one shot mean for each mechanism: its own errors and all losses that may flip it.</summary>
/// <param name="graph">The graph of the decoder.</param>
internal sealed class ToldLosses(DetectorGraph graph)
{
    private readonly double[] flipProbability = new double[graph.Edges.Length];
    private readonly int[] touched = new int[graph.Edges.Length];
    private readonly ToldEdge[] told = new ToldEdge[graph.Edges.Length];
    private int count;

    /// <summary>Adds a loss in a window.</summary>
    public void Add(LossWindow window)
    {
        foreach (LossConsequence consequence in window.Consequences)
        {
            ref double flip = ref flipProbability[consequence.Edge];
            if (flip == 0)
            {
                touched[count++] = consequence.Edge;
                flip = graph.Edges[consequence.Edge].Probability;
            }

            flip = MechanismTable.EitherNotBoth(flip, consequence.Probability);
        }
    }

    /// <summary>The weights of this shot; the next one starts with none.</summary>
    public ReadOnlySpan<ToldEdge> Take()
    {
        ReadOnlySpan<ToldEdge> all = told.AsSpan(0, count);
        for (int index = 0; index < count; index++)
        {
            int edge = touched[index];
            told[index] = new ToldEdge(edge, DetectorGraph.WeightOf(flipProbability[edge]));
            flipProbability[edge] = 0;
        }

        count = 0;
        return all;
    }
}
