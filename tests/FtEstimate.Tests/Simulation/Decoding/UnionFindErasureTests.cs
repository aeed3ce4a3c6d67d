using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Decoding.UnionFind;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding;

/// <summary>
/// Erased qubits, perfect checks. The best a decoder can do fails in half of the cases in which the erased qubits support a logical operator:
/// numbers from an enumeration of all erasures outside this project; 1/4 at one half follows from duality.
/// </summary>
public sealed class UnionFindErasureTests
{
    [Theory]
    [InlineData(0.1, 3.670556e-3)]
    [InlineData(0.2, 2.6305792e-2)]
    [InlineData(0.5, 0.25)]
    public void Erasures_at_distance_3_fail_as_seldom_as_is_possible(double erasure, double expected)
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfPerfectChecks(3, 0.001);
        var decoder = new UnionFindDecoder(graph);
        double failure = 0;
        for (int bits = 0; bits < 1 << 9; bits++)
        {
            int[] erased = Subsets.OfBits(bits, 9);
            double probability = Math.Pow(erasure / 2, erased.Length) * Math.Pow(1 - erasure, 9 - erased.Length);
            failure += probability * Failures(graph, decoder, erased);
        }

        // both numbers are exact; the expected one is given to seven digits
        Assert.Equal(expected, failure, 1e-9);
    }

    [Theory]
    [InlineData(0.2, 6.496735997337e-3)]
    [InlineData(0.3, 3.971816428050e-2)]
    [InlineData(0.5, 0.25)]
    public void Erasures_at_distance_5_fail_as_seldom_as_is_possible(double erasure, double expected)
    {
        const int Shots = 100_000;
        DetectorGraph graph = SurfaceCodeGraphs.OfPerfectChecks(5, 0);
        var decoder = new UnionFindDecoder(graph);
        var random = new RandomBits(5, 0);
        int failures = 0;
        for (int shot = 0; shot < Shots; shot++)
        {
            int[] erased = Draw(ref random, erasure, 25);
            failures += ErrorSet.Sample(graph, ref random, erased).IsCorrectedBy(decoder, Erase(erased)) ? 0 : 1;
        }

        // four standard deviations
        Assert.Equal(expected, failures / (double)Shots, 4 * Math.Sqrt(expected / Shots));
    }

    [Theory]
    [InlineData(3)]
    [InlineData(5)]
    public void Fewer_erasures_than_the_distance_are_always_corrected(int distance)
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfPerfectChecks(distance, 0.001);
        var decoder = new UnionFindDecoder(graph);

        Assert.DoesNotContain(Subsets.OfSize(distance - 1, graph.Edges.Length), erased => Failures(graph, decoder, erased) > 0);
    }

    // 2t + s < d: t flips in unknown places, s erasures
    [Fact]
    public void Erasures_and_a_flip_that_together_stay_below_the_distance_are_always_corrected()
    {
        DetectorGraph graph = SurfaceCodeGraphs.OfPerfectChecks(5, 0.001);
        var decoder = new UnionFindDecoder(graph);

        foreach (int[] erased in Subsets.OfSize(2, 25))
        {
            for (int flipped = 0; flipped < 25; flipped++)
            {
                int[][] sets = [[flipped], [flipped, erased[0]], [flipped, erased[1]], [flipped, .. erased]];
                Assert.All(
                    sets.Where(set => !erased.Contains(flipped)),
                    set => Assert.True(ErrorSet.Of(graph, set).IsCorrectedBy(decoder, Erase(erased))));
            }
        }
    }

    private static int Failures(DetectorGraph graph, UnionFindDecoder decoder, int[] erased)
    {
        ToldEdge[] told = Erase(erased);
        int failures = 0;
        for (int bits = 0; bits < 1 << erased.Length; bits++)
        {
            int[] flipped = [.. Subsets.OfBits(bits, erased.Length).Select(index => erased[index])];
            failures += ErrorSet.Of(graph, flipped).IsCorrectedBy(decoder, told) ? 0 : 1;
        }

        return failures;
    }

    private static int[] Draw(ref RandomBits random, double probability, int count)
    {
        List<int> drawn = [];
        for (int index = 0; index < count; index++)
        {
            if (random.NextUnit() <= probability)
            {
                drawn.Add(index);
            }
        }

        return [.. drawn];
    }

    private static ToldEdge[] Erase(int[] edges) => [.. edges.Select(edge => new ToldEdge(edge, 0))];
}
