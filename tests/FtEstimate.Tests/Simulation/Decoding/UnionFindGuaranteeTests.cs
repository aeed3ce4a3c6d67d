using FtEstimate.Simulation.Decoding.UnionFind;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding;

/// <summary>What union-find must correct whatever its order of growth (Delfosse 2021, arXiv:1709.06218, theorem on distance; from memory).</summary>
public sealed class UnionFindGuaranteeTests
{
    [Theory]
    [InlineData(3)]
    [InlineData(5)]
    [InlineData(7)]
    public void Fewer_flips_than_half_the_distance_are_always_corrected(int distance)
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfPerfectChecks(distance, 0.01);
        var decoder = new UnionFindDecoder(graph);

        for (int size = 0; size <= (distance - 1) / 2; size++)
        {
            Assert.All(Subsets.OfSize(size, graph.Edges.Length), edges => Assert.True(ErrorSet.Of(graph, edges).IsCorrectedBy(decoder)));
        }
    }

    [Theory]
    [InlineData(3, 1)]
    [InlineData(5, 2)]
    public void Fewer_flips_and_misread_checks_than_half_the_distance_are_always_corrected(int distance, int size)
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfNoisyChecks(distance, 3, 0.01, 0.01);
        var decoder = new UnionFindDecoder(graph);

        Assert.DoesNotContain(Subsets.OfSize(size, graph.Edges.Length), edges => !ErrorSet.Of(graph, edges).IsCorrectedBy(decoder));
    }

    // the same proof holds for lengths: while a cluster is wrong it covers at least as much of the error as it grows
    [Fact]
    public void In_a_circuit_sets_lighter_than_half_the_lightest_logical_flip_are_always_corrected()
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfCircuit(5, 2, 2e-3, 3e-3, 1e-3, 5e-4);
        double[] weights = [.. graph.Edges.Select(edge => DetectorGraph.WeightOf(edge.Probability))];
        double lightest = LightestLogicalFlip.Of(graph);
        var decoder = new UnionFindDecoder(graph);

        int[][] light = [.. Subsets.OfSize(2, weights.Length).Where(pair => 2 * (weights[pair[0]] + weights[pair[1]]) < lightest - 0.01)];

        Assert.True(light.Length > 1000);
        Assert.DoesNotContain(light, pair => !ErrorSet.Of(graph, pair).IsCorrectedBy(decoder));
    }

    [Fact]
    public void In_any_graph_sets_lighter_than_half_the_lightest_logical_flip_are_always_corrected()
    {
        var random = new RandomBits(11, 0);
        int checkedSets = 0;
        for (int trial = 0; trial < 150; trial++)
        {
            DetectorGraph graph = RandomGraph(ref random);
            double lightest = LightestLogicalFlip.Of(graph);
            var decoder = new UnionFindDecoder(graph);
            for (int bits = 0; bits < 1 << graph.Edges.Length; bits++)
            {
                int[] edges = Subsets.OfBits(bits, graph.Edges.Length);

                // lengths are rounded to 1/1024
                if (2 * edges.Sum(edge => DetectorGraph.WeightOf(graph.Edges[edge].Probability)) < lightest - 0.03)
                {
                    checkedSets++;
                    Assert.True(ErrorSet.Of(graph, edges).IsCorrectedBy(decoder));
                }
            }
        }

        Assert.True(checkedSets > 10_000);
    }

    private static DetectorGraph RandomGraph(ref RandomBits random)
    {
        const int Vertices = 6;
        var edges = new GraphEdge[11];
        for (int index = 0; index < edges.Length; index++)
        {
            int a = random.NextBelow(Vertices);
            int b = (a + 1 + random.NextBelow(Vertices)) % (Vertices + 1);
            bool meetsBoundary = a == Vertices || b == Vertices;
            edges[index] = new GraphEdge(
                Math.Min(a, b),
                meetsBoundary ? DetectorGraph.Boundary : Math.Max(a, b),
                Math.Exp(-0.5 - (6 * random.NextUnit())),
                random.NextBelow(4) == 0);
        }

        return new DetectorGraph(Vertices, [.. edges]);
    }
}
