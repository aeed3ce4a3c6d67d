using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding;

/// <summary>What a set of mechanisms does: the detectors that fire, and whether the observable flips.</summary>
internal sealed record ErrorSet(int[] Defects, bool FlipsObservable)
{
    /// <summary>The mechanisms of the given indices, all different.</summary>
    public static ErrorSet Of(DetectorGraph graph, params ReadOnlySpan<int> edges)
    {
        SortedSet<int> defects = [];
        bool flips = false;
        foreach (int index in edges)
        {
            GraphEdge edge = graph.Edges[index];
            flips ^= edge.FlipsObservable;
            Toggle(defects, edge.A);
            if (!edge.MeetsBoundary)
            {
                Toggle(defects, edge.B);
            }
        }

        return new ErrorSet([.. defects], flips);
    }

    /// <summary>Mechanisms drawn by their probabilities, and half of the erased ones.</summary>
    public static ErrorSet Sample(DetectorGraph graph, ref RandomBits random, params IReadOnlyCollection<int> erased)
    {
        List<int> edges = [];
        for (int edge = 0; edge < graph.Edges.Length; edge++)
        {
            double probability = erased.Contains(edge) ? 0.5 : graph.Edges[edge].Probability;
            if (random.NextUnit() <= probability)
            {
                edges.Add(edge);
            }
        }

        return Of(graph, [.. edges]);
    }

    /// <summary>Whether a decoder finds what happened to the observable.</summary>
    public bool IsCorrectedBy(IDecoder decoder, params ReadOnlySpan<ToldEdge> told) => decoder.Decode(Defects, told) == FlipsObservable;

    private static void Toggle(SortedSet<int> set, int vertex)
    {
        if (!set.Remove(vertex))
        {
            set.Add(vertex);
        }
    }
}
