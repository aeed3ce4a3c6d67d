using CsCheck;
using FtEstimate.Simulation.Decoding.Matching;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

public sealed class MatchingDecoderTests
{
    private const int Boundary = -1;

    [Fact]
    public void The_weight_is_the_least_of_all_pairings() => Gen.ULong.Sample(
        seed => AssertLeastOfAllPairings(DecodingCase.Of(seed, 14, 10)), iter: Iterations(20_000));

    [Fact]
    public void The_weight_of_many_defects_is_the_least_of_all_pairings() => Gen.ULong.Sample(
        seed => AssertLeastOfAllPairings(DecodingCase.Of(seed, 40, 15)), iter: Iterations(200));

    // weak duality: no pairing weighs less than the sum of the radii if no two defects are nearer than what separates them (Edmonds 1965)
    [Fact]
    public void The_radii_prove_the_matching_of_hundreds_of_defects() => Gen.ULong.Sample(
        seed => AssertProvenByRadii(DecodingCase.Of(seed, 500, 250)), iter: Iterations(60));

    private static int Iterations(int count) =>
        int.Parse(Environment.GetEnvironmentVariable("MATCHING_FACTOR") ?? "1", System.Globalization.CultureInfo.InvariantCulture) * count;

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

        if (2 * decoder.LastPaths.Length - CountOfBoundaryPaths(decoder) < given.Defects.Length)
        {
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
