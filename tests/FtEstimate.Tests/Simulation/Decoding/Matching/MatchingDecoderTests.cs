using CsCheck;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

public sealed class MatchingDecoderTests
{
    private const int Boundary = DetectorGraph.Boundary;

    [Fact]
    public void The_weight_is_the_least_of_all_pairings() => Gen.ULong.Sample(
        seed => AssertLeastOfAllPairings(DecodingCase.Of(seed, 14, 10)), iter: 20_000);

    [Fact]
    public void The_weight_of_many_defects_is_the_least_of_all_pairings() => Gen.ULong.Sample(
        seed => AssertLeastOfAllPairings(DecodingCase.Of(seed, 40, 15)), iter: 200);

    // weak duality: no pairing weighs less than the sum of the radii if no two defects are nearer than what separates them (Edmonds 1965)
    [Fact]
    public void The_radii_prove_the_matching_of_hundreds_of_defects() => Gen.ULong.Sample(
        seed => AssertProvenByRadii(DecodingCase.Of(seed, 500, 250)), iter: 40);

    [Fact]
    public void The_radii_prove_the_matching_of_a_code_over_rounds() => Gen.ULong.Sample(
        seed => AssertProvenByRadii(LayeredCase(seed)), iter: 20);

    [Fact]
    public void An_isolated_pair_is_matched_along_the_cheapest_path()
    {
        DetectorGraph graph = new(3, [Edge(0, 1, 0.01), Edge(0, 2, 0.2, true), Edge(2, 1, 0.2), Edge(0, Boundary, 0.001), Edge(1, Boundary, 0.001)]);

        // ln 99 = 4.6 against 2 ln 4 = 2.8
        Assert.True(new MatchingDecoder(graph).Decode([0, 1], []));
    }

    [Fact]
    public void Of_two_mechanisms_with_the_same_defects_the_likelier_one_is_answered()
    {
        DetectorGraph graph = new(2, [Edge(0, 1, 0.01), Edge(0, 1, 0.011, true)]);

        Assert.True(new MatchingDecoder(graph).Decode([0, 1], []));
        Assert.False(new MatchingDecoder(graph).Decode([0, 1], [new ToldEdge(0, 0)]));
    }

    [Fact]
    public void A_defect_is_matched_over_an_edge_that_cannot_happen_if_there_is_no_other()
    {
        DetectorGraph graph = new(2, [Edge(0, 1, 0), Edge(1, Boundary, 0, true)]);

        Assert.True(new MatchingDecoder(graph).Decode([0], []));
        Assert.False(new MatchingDecoder(graph).Decode([0, 1], []));
    }

    [Fact]
    public void No_defects_mean_no_flip() => Assert.False(new MatchingDecoder(RotatedCode.WithPerfectChecks(3, 0.1)).Decode([], []));

    // an odd number on a ring without boundary: two are matched, one stays alone
    [Fact]
    public void A_defect_without_partner_and_boundary_stays_alone()
    {
        DetectorGraph graph = new(5, [Edge(0, 1, 0.1), Edge(1, 2, 0.1), Edge(2, 0, 0.1), Edge(3, 4, 0.1, true), Edge(4, Boundary, 0.1)]);
        MatchingDecoder decoder = new(graph);

        Assert.True(decoder.Decode([0, 1, 2, 3], []));
        Assert.Equal(2, decoder.LastPaths.Length);
    }

    private static GraphEdge Edge(int a, int b, double probability, bool flips = false) => new(a, b, probability, flips);

    private static DecodingCase LayeredCase(ulong seed)
    {
        RandomBits random = new(seed, 0);
        DetectorGraph graph = RotatedCode.WithLayers(9, 6, 0.02);
        bool[] fired = new bool[graph.VertexCount];
        List<ToldEdge> told = [];
        for (int index = 0; index < graph.Edges.Length; index++)
        {
            bool isErased = random.NextBelow(20) == 0;
            GraphEdge edge = graph.Edges[index];
            if (isErased)
            {
                told.Add(new ToldEdge(index, 0));
            }

            if (random.NextUnit() < (isErased ? 0.5 : edge.Probability))
            {
                fired[edge.A] ^= true;
                if (!edge.MeetsBoundary)
                {
                    fired[edge.B] ^= true;
                }
            }
        }

        return new DecodingCase(graph, [.. Enumerable.Range(0, fired.Length).Where(vertex => fired[vertex])], [.. told]);
    }

    private static void AssertLeastOfAllPairings(DecodingCase given)
    {
        MatchingDecoder decoder = new(given.Graph);
        ShortestPaths shortest = new(given.Graph, given.Defects, given.Told);
        (long even, long odd) = EveryPairing.LeastWeights(given.Defects, shortest);

        bool flipped = decoder.Decode(given.Defects, given.Told);

        long least = Math.Min(even, odd);
        if (least < ShortestPaths.None)
        {
            Assert.Equal(least, WeightOf(decoder, shortest));
            Assert.Equal(least, decoder.LastDual);
            Assert.Equal(least, flipped ? odd : even);
            AssertEachDefectIsMatchedOnce(decoder, given.Defects);
        }
    }

    private static void AssertProvenByRadii(DecodingCase given)
    {
        MatchingDecoder decoder = new(given.Graph);
        ShortestPaths shortest = new(given.Graph, given.Defects, given.Told);

        decoder.Decode(given.Defects, given.Told);

        if ((2 * decoder.LastPaths.Length) - CountOfBoundaryPaths(decoder) < given.Defects.Length)
        {
            // somebody stayed alone: there is no perfect matching
            return;
        }

        AssertEachDefectIsMatchedOnce(decoder, given.Defects);
        Assert.Equal(decoder.LastDual, WeightOf(decoder, shortest));
        Assert.True(decoder.LastForest.RadiiAreDistances(given.Defects));
        foreach (int first in given.Defects)
        {
            Assert.True(decoder.LastForest.SeparationOf(first, Boundary) <= shortest.Length(first, Boundary));
            foreach (int second in given.Defects)
            {
                Assert.True(decoder.LastForest.SeparationOf(first, second) <= shortest.Length(first, second));
            }
        }
    }

    private static int CountOfBoundaryPaths(MatchingDecoder decoder)
    {
        int count = 0;
        foreach (TightPath path in decoder.LastPaths)
        {
            count += path.MeetsBoundary ? 1 : 0;
        }

        return count;
    }

    private static long WeightOf(MatchingDecoder decoder, ShortestPaths shortest)
    {
        long sum = 0;
        foreach (TightPath path in decoder.LastPaths)
        {
            sum += shortest.Length(path.From, path.To, path.Parity);
        }

        return sum;
    }

    private static void AssertEachDefectIsMatchedOnce(MatchingDecoder decoder, int[] defects)
    {
        List<int> matched = [];
        foreach (TightPath path in decoder.LastPaths)
        {
            matched.Add(path.From);
            if (!path.MeetsBoundary)
            {
                matched.Add(path.To);
            }
        }

        matched.Sort();
        Assert.Equal(defects, matched);
    }
}
