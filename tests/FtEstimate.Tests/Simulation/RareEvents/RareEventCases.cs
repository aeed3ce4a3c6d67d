using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.RareEvents;

namespace FtEstimate.Tests.Simulation.RareEvents;

/// <summary>Experiments whose failures are counted in several tests.</summary>
internal static class RareEventCases
{
    public static RareEventEstimate Run(Func<double, MemoryModel> modelAt, LadderPlan plan, int threads = 2) =>
        Splitting.Estimate(modelAt, plan, threads, null, CancellationToken.None);

    public static MemoryModel ModelOf(DetectorGraph graph) => new(graph, [.. graph.Edges.Select(edge => edge.Probability)], []);

    public static MemoryModel Textbook(int distance, int rounds, PauliBasis basis, double p) =>
        FaultPropagation.Of(TextbookCircuit.Of(distance, rounds, basis, UniformNoise.EveryPlace(p)));
}
