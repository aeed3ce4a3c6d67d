using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;
using FtEstimate.Simulation.Sampling;
using FtEstimate.Tests.Simulation.Decoding;

namespace FtEstimate.Tests.Simulation.Graphs;

/// <summary>
/// A code of distance d corrects (d − 1)/2 faults. With unequal weights that is certain only where the heaviest mechanism is less than d/(d − 1) times as
/// heavy as the lightest: at very small error rates, or if all count the same.
/// </summary>
public sealed class SmallErrorSetTests
{
    /// <summary>Here weights differ by less than a tenth.</summary>
    private const double VerySmall = 1e-15;

    [Theory]
    [InlineData(3, 1, VerySmall)]
    [InlineData(3, 2, VerySmall)]
    [InlineData(3, 3, VerySmall)]
    [InlineData(3, 3, 1e-3)]
    [InlineData(5, 2, VerySmall)]
    [InlineData(5, 2, 1e-3)]
    public void Matching_corrects_every_set_of_fewer_faults_than_half_the_distance(int distance, int rounds, double error) =>
        AssertAllCorrected(GraphOf(distance, rounds, error), DecoderKind.Matching, (distance - 1) / 2);

    [Theory]
    [InlineData(3, 1)]
    [InlineData(3, 2)]
    [InlineData(3, 3)]
    [InlineData(5, 2)]
    public void Union_find_corrects_every_such_set_if_all_mechanisms_count_the_same(int distance, int rounds) =>
        AssertAllCorrected(WithEqualWeights(GraphOf(distance, rounds, 1e-3)), DecoderKind.UnionFind, (distance - 1) / 2);

    [Fact]
    public void Three_faults_at_distance_7_are_corrected()
    {
        DetectorGraph graph = GraphOf(7, 4, VerySmall);
        DetectorGraph equal = WithEqualWeights(graph);
        IDecoder matching = Decoders.Make(DecoderKind.Matching, graph);
        IDecoder unionFind = Decoders.Make(DecoderKind.UnionFind, equal);
        RandomBits random = new(23, 0);
        for (int trial = 0; trial < 60_000; trial++)
        {
            int[] faults = NearbyFaults(graph, 3, ref random);
            ErrorSet set = ErrorSet.Of(graph, faults);
            Assert.True(set.IsCorrectedBy(matching), $"matching {string.Join(' ', faults)}");
            Assert.True(set.IsCorrectedBy(unionFind), $"union-find {string.Join(' ', faults)}");
        }
    }

    private static void AssertAllCorrected(DetectorGraph graph, DecoderKind kind, int size)
    {
        IDecoder decoder = Decoders.Make(kind, graph);
        for (int faults = 0; faults <= size; faults++)
        {
            foreach (int[] set in Subsets.OfSize(faults, graph.Edges.Length))
            {
                Assert.True(ErrorSet.Of(graph, set).IsCorrectedBy(decoder), string.Join(' ', set));
            }
        }
    }

    /// <summary>Faults at random; half of the time each touches a detector of the one before, as far-off ones are no trial.</summary>
    private static int[] NearbyFaults(DetectorGraph graph, int count, ref RandomBits random)
    {
        List<int> faults = [random.NextBelow(graph.Edges.Length)];
        while (faults.Count < count)
        {
            ReadOnlySpan<int> beside = graph.EdgesAt(graph.Edges[faults[^1]].A);
            int next = random.NextBelow(2) == 0 ? random.NextBelow(graph.Edges.Length) : beside[random.NextBelow(beside.Length)];
            if (!faults.Contains(next))
            {
                faults.Add(next);
            }
        }

        return [.. faults];
    }

    private static DetectorGraph WithEqualWeights(DetectorGraph graph) =>
        new(graph.VertexCount, [.. graph.Edges.Select(edge => edge with { Probability = 0.01 })]);

    private static DetectorGraph GraphOf(int distance, int rounds, double error) =>
        FaultPropagation.Of(TextbookCircuit.Of(distance, rounds, PauliBasis.Z, UniformNoise.EveryPlace(error))).Graph;
}
