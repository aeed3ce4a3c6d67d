using CsCheck;
using FtEstimate.Simulation.Decoding;
using FtEstimate.Simulation.Decoding.Matching;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Decoding.Matching;

public sealed class DecoderMemoryTests
{
    private static readonly DetectorGraph Layered = RotatedCode.WithLayers(5, 6, 0.02);

    [Fact]
    public void The_same_shot_gives_the_same_paths_whatever_was_decoded_before() => Gen.ULong.Sample(
        seed =>
        {
            RandomBits random = new(seed, 0);
            MatchingDecoder used = new(Layered);
            for (int shot = 0; shot < 5; shot++)
            {
                used.Decode(Defects(ref random, 60), Told(ref random));
            }

            int[] defects = Defects(ref random, 20);
            ToldEdge[] told = Told(ref random);
            MatchingDecoder fresh = new(Layered);

            Assert.Equal(fresh.Decode(defects, told), used.Decode(defects, told));
            Assert.Equal(fresh.LastPaths, used.LastPaths);
            Assert.Equal(fresh.LastDual, used.LastDual);
        },
        iter: 400);

    [Fact]
    public void A_warm_decoder_allocates_nothing()
    {
        RandomBits random = new(5, 0);
        MatchingDecoder decoder = new(Layered);
        (int[] Defects, ToldEdge[] Told)[] shots = [.. Enumerable.Range(0, 200).Select(_ => (Defects(ref random, 80), Told(ref random)))];
        DecodeAll(decoder, shots);

        long before = GC.GetAllocatedBytesForCurrentThread();
        DecodeAll(decoder, shots);

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
    }

    private static void DecodeAll(MatchingDecoder decoder, (int[] Defects, ToldEdge[] Told)[] shots)
    {
        foreach ((int[] defects, ToldEdge[] told) in shots)
        {
            decoder.Decode(defects, told);
        }
    }

    private static int[] Defects(ref RandomBits random, int draws)
    {
        SortedSet<int> defects = [];
        for (int draw = 0; draw < draws; draw++)
        {
            defects.Add(random.NextBelow(Layered.VertexCount));
        }

        return [.. defects];
    }

    private static ToldEdge[] Told(ref RandomBits random)
    {
        SortedSet<int> edges = [];
        for (int draw = 0; draw < 10; draw++)
        {
            edges.Add(random.NextBelow(Layered.Edges.Length));
        }

        double weight = random.NextBelow(2);
        return [.. edges.Select(edge => new ToldEdge(edge, weight))];
    }
}
