using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Memory;
using FtEstimate.Tests.Simulation.Circuits;
using FtEstimate.Tests.Simulation.Decoding;

namespace FtEstimate.Tests.Simulation.Memory;

public sealed class LossTests
{
    // own exact enumeration of all sets of erased atoms: half of those that hold the logical operator fail. Four standard errors.
    [Theory]
    [InlineData(3, 0.1, 3.670556e-3, DecoderKind.Matching)]
    [InlineData(3, 0.2, 2.6305792e-2, DecoderKind.Matching)]
    [InlineData(3, 0.5, 0.25, DecoderKind.Matching)]
    [InlineData(3, 0.2, 2.6305792e-2, DecoderKind.UnionFind)]
    [InlineData(5, 0.1, 2.349268176613e-4, DecoderKind.Matching)]
    [InlineData(5, 0.2, 6.496735997337e-3, DecoderKind.Matching)]
    [InlineData(5, 0.5, 0.25, DecoderKind.Matching)]
    [InlineData(5, 0.2, 6.496735997337e-3, DecoderKind.UnionFind)]
    [InlineData(5, 0.5, 0.25, DecoderKind.UnionFind)]
    public void Told_erasure_fails_as_often_as_counted(int distance, double erased, double exact, DecoderKind decoder)
    {
        const long Count = 200_000;
        ShotCount count = Shots.Run(TestCircuits.Erasure(distance, erased), Count, decoder);
        double sigma = Math.Sqrt(exact * (1 - exact) / Count);

        Assert.InRange(count.Rate(), exact - (4 * sigma), exact + (4 * sigma));
    }

    // the same enumeration with the graph of the code: distance 3, all 2⁹ sets
    [Theory]
    [InlineData(0.1, 3.670556e-3)]
    [InlineData(0.2, 2.6305792e-2)]
    [InlineData(0.5, 0.25)]
    public void Erased_sets_that_hold_the_logical_operator_are_as_many_as_counted(double erased, double exact)
    {
        MemoryModel model = FaultPropagation.Of(TestCircuits.Erasure(3, erased));
        GraphEdge[] ofAtom = [.. model.Windows.Select(window => model.Graph.Edges[Assert.Single(window.Consequences).Edge])];
        Assert.Equal(9, ofAtom.Length);
        double failure = 0;
        for (int bits = 0; bits < 1 << 9; bits++)
        {
            int[] set = Subsets.OfBits(bits, 9);
            bool holds = CircuitDistance.Of(new DetectorGraph(model.Graph.VertexCount, [.. set.Select(atom => ofAtom[atom])])) is not null;
            failure += holds ? 0.5 * Math.Pow(erased, set.Length) * Math.Pow(1 - erased, 9 - set.Length) : 0;
        }

        Assert.Equal(exact, failure, 1e-8);
    }

    // the margins are six standard errors or more
    [Theory]
    [InlineData(3, 1)]
    [InlineData(5, 1)]
    [InlineData(7, 1)]
    [InlineData(5, 3)]
    public void Told_loss_is_better_than_untold_loss(int distance, int roundsBetweenLooks)
    {
        RoundErrors errors = TestCircuits.EverywhereOnAtoms(5e-4) with { DataLossPerSlot = 0.01, RoundsBetweenLooks = roundsBetweenLooks };
        ShotCount told = Shots.Run(AtomCircuit.Of(distance, 3, PauliBasis.Z, errors with { DataLossTold = true }), 15_000);
        ShotCount untold = Shots.Run(AtomCircuit.Of(distance, 3, PauliBasis.Z, errors), 15_000);

        Assert.True(untold.Rate() - told.Rate() > 6 * (untold.StandardError() + told.StandardError()), $"{told} {untold}");
    }

    // told losses are erasures, of which about d are needed, untold ones errors, of which (d + 1)/2 are (Stace 2009, arXiv:0904.3556). Told ones are taken at
    // higher rates, where the curve is flatter, if at all
    [Theory]
    [InlineData(3, 0.004, 0.01, 400_000)]
    [InlineData(5, 0.006, 0.03, 200_000)]
    public void Told_loss_falls_off_more_steeply(int distance, double untoldLoss, double toldLoss, long shots)
    {
        double untold = Exponent(distance, untoldLoss, shots, isTold: false);
        double told = Exponent(distance, toldLoss, shots, isTold: true);

        Assert.InRange(untold, ((distance + 1) / 2) - 0.6, ((distance + 1) / 2) + 0.4);
        Assert.True(told > untold + 0.4, $"{told} {untold}");
    }

    // Z errors flip the logical X, and no X error is there to flip the logical Z but those of the rare gate errors
    [Theory]
    [InlineData(5)]
    [InlineData(7)]
    [InlineData(9)]
    public void Dephasing_sets_the_two_bases_apart(int distance)
    {
        RoundErrors errors = new() { OnData = new PauliChannel(0.0002, 0.0002, 0.02), CzGate = 5e-4, CheckFlip = 0.002 };
        ShotCount x = Shots.Run(AtomCircuit.Of(distance, distance, PauliBasis.X, errors), 10_000);
        ShotCount z = Shots.Run(AtomCircuit.Of(distance, distance, PauliBasis.Z, errors), 10_000);

        Assert.True(x.Failures > 50, $"{x}");
        Assert.True(x.Failures > 20 * (z.Failures + 1), $"{x} {z}");
    }

    private static double Exponent(int distance, double loss, long shots, bool isTold)
    {
        double Rate(double perSlot) => Shots.Run(
            AtomCircuit.Of(distance, 2, PauliBasis.Z, new RoundErrors { DataLossPerSlot = perSlot, DataLossTold = isTold }), shots).Rate();
        return Math.Log2(Rate(loss) / Rate(loss / 2));
    }
}
