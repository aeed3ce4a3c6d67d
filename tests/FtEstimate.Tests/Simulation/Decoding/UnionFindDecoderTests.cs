using System.Collections.Immutable;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Decoding.UnionFind;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding;

public sealed class UnionFindDecoderTests
{
    private const int Boundary = DetectorGraph.Boundary;

    private readonly DetectorGraph circuit = SurfaceCodeGraphs.OfCircuit(5, 6, 1.5e-2, 2e-2, 8e-3, 5e-3);

    [Fact]
    public void No_defects_need_no_correction() => Assert.False(new UnionFindDecoder(circuit).Decode([], []));

    [Theory]
    [InlineData(0.01, 0.02, true)]
    [InlineData(0.02, 0.01, false)]
    public void Of_two_mechanisms_with_the_same_defects_the_likelier_one_is_taken(double plain, double flipping, bool expected)
    {
        var decoder = new UnionFindDecoder(new DetectorGraph(2, [new(0, 1, plain, false), new(0, 1, flipping, true), new(1, Boundary, 1e-9, false)]));

        Assert.Equal(expected, decoder.Decode([0, 1], []));
    }

    // ln((1−p)/p) of 0.05 and twice that of 0.2 are 2.9 and 2.8; of 0.07 it is 2.6
    [Theory]
    [InlineData(0.05, true)]
    [InlineData(0.07, false)]
    public void A_way_of_two_likely_mechanisms_beats_one_unlikely_mechanism(double direct, bool expected)
    {
        var decoder = new UnionFindDecoder(
            new DetectorGraph(3, [new(0, 2, direct, false), new(0, 1, 0.2, true), new(1, 2, 0.2, false), new(0, Boundary, 1e-6, false)]));

        Assert.Equal(expected, decoder.Decode([0, 2], []));
    }

    [Theory]
    [InlineData(0.5, true)]
    [InlineData(6.0, false)]
    public void A_told_weight_replaces_that_of_the_graph(double weight, bool expected)
    {
        var decoder = new UnionFindDecoder(new DetectorGraph(2, [new(0, 1, 0.01, false), new(0, 1, 0, true)]));

        Assert.Equal(expected, decoder.Decode([0, 1], [new ToldEdge(1, weight)]));
        Assert.False(decoder.Decode([0, 1], []));
    }

    [Fact]
    public void A_mechanism_of_probability_zero_is_used_where_there_is_no_other()
    {
        var decoder = new UnionFindDecoder(new DetectorGraph(3, [new(0, 1, 0, true), new(1, 2, 0.01, false), new(2, Boundary, 0, false)]));

        Assert.True(decoder.Decode([0], []));
        Assert.False(decoder.Decode([1], []));
        Assert.True(decoder.Decode([0, 1], []));
    }

    [Fact]
    public void Defects_that_cannot_be_explained_stop_nothing()
    {
        var decoder = new UnionFindDecoder(
            new DetectorGraph(5, [new(0, 1, 0.01, false), new(1, 2, 0.01, false), new(3, Boundary, 0.01, true)]));

        Assert.True(decoder.Decode([0, 3, 4], []));
        Assert.True(decoder.Decode([0, 1, 2, 3], []));
    }

    [Fact]
    public void Each_neighbour_of_a_vertex_with_many_is_matched_along_its_own_edge()
    {
        const int Neighbours = 30;
        bool[] flips = [.. Enumerable.Range(0, Neighbours).Select(index => index * index % 7 < 2)];
        var decoder = new UnionFindDecoder(
            new DetectorGraph(Neighbours + 1, [.. flips.Select((flip, index) => new GraphEdge(0, index + 1, 0.01, flip))]));

        Assert.Equal(flips, Enumerable.Range(1, Neighbours).Select(neighbour => decoder.Decode([0, neighbour], [])));
    }

    // every edge told what it weighs anyway leaves nothing to settle beforehand; unequal probabilities leave no ties
    [Fact]
    public void Settling_what_is_plain_beforehand_changes_no_answer()
    {
        var random = new RandomBits(3, 0);
        ImmutableArray<GraphEdge>.Builder edges = ImmutableArray.CreateBuilder<GraphEdge>();
        foreach (GraphEdge edge in SurfaceCodeGraphs.OfCircuit(5, 12, 0.01, 0.01, 0.01, 0.01).Edges)
        {
            edges.Add(edge with { Probability = Math.Exp(-6.5 + (3 * random.NextUnit())) });
        }

        var graph = new DetectorGraph(13 * 12, edges.ToImmutable());
        ToldEdge[] all = [.. graph.Edges.Select((edge, index) => new ToldEdge(index, DetectorGraph.WeightOf(edge.Probability)))];
        var decoder = new UnionFindDecoder(graph);
        for (int shot = 0; shot < 3000; shot++)
        {
            ErrorSet errors = ErrorSet.Sample(graph, ref random);
            Assert.Equal(decoder.Decode(errors.Defects, all), decoder.Decode(errors.Defects, []));
        }
    }

    [Fact]
    public void The_answer_does_not_depend_on_what_was_decoded_before()
    {
        var random = new RandomBits(4, 0);
        var used = new UnionFindDecoder(circuit);
        for (int shot = 0; shot < 300; shot++)
        {
            int[] erased = [.. Subsets.OfBits(random.NextBelow(256), 8).Select(index => index * 17)];
            ToldEdge[] told = [.. erased.Select(edge => new ToldEdge(edge, shot % 3))];
            ErrorSet errors = ErrorSet.Sample(circuit, ref random, erased);
            Assert.Equal(new UnionFindDecoder(circuit).Decode(errors.Defects, told), used.Decode(errors.Defects, told));
        }
    }

    [Fact]
    public void Any_set_of_defects_is_decoded()
    {
        var random = new RandomBits(5, 0);
        var decoder = new UnionFindDecoder(circuit);
        int flips = 0;
        for (int shot = 0; shot < 1000; shot++)
        {
            int every = 2 + (shot % 7);
            int[] defects = [.. Enumerable.Range(0, circuit.VertexCount).Where(_ => random.NextBelow(every) == 0)];
            flips += decoder.Decode(defects, []) ? 1 : 0;
        }

        // defects without meaning: answers as if by a coin, ten standard deviations
        Assert.InRange(flips, 340, 660);
    }

    [Fact]
    public void Nothing_is_allocated_once_warm()
    {
        var random = new RandomBits(6, 0);
        ErrorSet[] shots = [.. Enumerable.Range(0, 200).Select(_ => ErrorSet.Sample(circuit, ref random))];
        ToldEdge[] told = [new(3, 0), new(70, 0), new(171, 1)];
        var decoder = new UnionFindDecoder(circuit);
        Run();
        long before = GC.GetAllocatedBytesForCurrentThread();
        Run();

        Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());

        void Run()
        {
            foreach (ErrorSet shot in shots)
            {
                decoder.Decode(shot.Defects, told);
            }
        }
    }

    // the threshold of union-find with perfect checks is 9.9 % (Delfosse 2021, arXiv:1709.06218, from memory)
    [Theory]
    [InlineData(0.05, true)]
    [InlineData(0.15, false)]
    public void A_larger_distance_helps_below_the_threshold_only(double flip, bool helps) =>
        Assert.Equal(helps, FailureRate(7, flip) < FailureRate(3, flip));

    private static double FailureRate(int distance, double flip)
    {
        const int Shots = 20_000;
        DetectorGraph graph = SurfaceCodeGraphs.OfPerfectChecks(distance, flip);
        var decoder = new UnionFindDecoder(graph);
        var random = new RandomBits(7, (ulong)distance);
        int failures = 0;
        for (int shot = 0; shot < Shots; shot++)
        {
            failures += ErrorSet.Sample(graph, ref random).IsCorrectedBy(decoder) ? 0 : 1;
        }

        return failures / (double)Shots;
    }
}
