using System.Numerics;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.RareEvents;

/// <summary>The failure probability of a small graph without sampling: the joint distribution of syndrome and observable, mechanism by mechanism.</summary>
internal static class ExactFailure
{
    /// <summary>Failure probability of shots from one graph, decoded with the weights of another one with the same mechanisms.</summary>
    /// <param name="graph">Up to some 16 detectors.</param>
    /// <param name="weights">Graph of the decoder.</param>
    public static double Of(DetectorGraph graph, DetectorGraph weights)
    {
        double[] distribution = new double[2 << graph.VertexCount];
        distribution[0] = 1;
        foreach (GraphEdge edge in graph.Edges)
        {
            int flips = (1 << edge.A) ^ (edge.MeetsBoundary ? 0 : 1 << edge.B) ^ (edge.FlipsObservable ? 1 << graph.VertexCount : 0);
            double[] before = [.. distribution];
            for (int state = 0; state < distribution.Length; state++)
            {
                distribution[state] = ((1 - edge.Probability) * before[state]) + (edge.Probability * before[state ^ flips]);
            }
        }

        MatchingDecoder decoder = new(weights);
        double failure = 0;
        for (int syndrome = 0; syndrome < 1 << graph.VertexCount; syndrome++)
        {
            failure += distribution[syndrome | (decoder.Decode(Defects(syndrome), []) ? 0 : 1 << graph.VertexCount)];
        }

        return failure;
    }

    private static int[] Defects(int syndrome)
    {
        int[] defects = new int[BitOperations.PopCount((uint)syndrome)];
        for (int index = 0; index < defects.Length; index++)
        {
            defects[index] = BitOperations.TrailingZeroCount(syndrome);
            syndrome &= syndrome - 1;
        }

        return defects;
    }
}
