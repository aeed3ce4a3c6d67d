using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Tests.Simulation.Circuits;

namespace FtEstimate.Tests.Simulation.Graphs;

public sealed class CircuitDistanceTests
{
    private static readonly ImmutableArray<Corner> RowLast = [Corner.NorthWest, Corner.NorthEast, Corner.SouthWest, Corner.SouthEast];
    private static readonly ImmutableArray<Corner> ColumnLast = [Corner.NorthWest, Corner.SouthWest, Corner.NorthEast, Corner.SouthEast];

    public static TheoryData<int, PauliBasis> Memories { get; } = Pairs.Of<int, PauliBasis>([3, 5, 7, 9, 11], [PauliBasis.X, PauliBasis.Z]);

    [Theory]
    [MemberData(nameof(Memories))]
    public void No_fewer_faults_than_the_code_distance_flip_the_observable_unseen(int distance, PauliBasis basis)
    {
        ImmutableArray<Circuit> circuits =
        [
            TextbookCircuit.Of(distance, 3, basis, UniformNoise.EveryPlace(1e-3)),
            TextbookCircuit.Of(distance, distance, basis, UniformNoise.SlowReadout(1e-3)),
            AtomCircuit.Of(distance, 3, basis, TestCircuits.EverywhereOnAtoms(1e-3)),
            AtomCircuit.Of(distance, distance, basis, TestCircuits.EverywhereOnAtoms(1e-3) with { DataLossPerSlot = 1e-3, CheckLossPerSlot = 1e-3 }),
        ];

        Assert.All(circuits, circuit => Assert.Equal(distance, CircuitDistance.Of(FaultPropagation.Of(circuit).Graph)));
    }

    // Dennis 2002 (arXiv:quant-ph/0110143), Tomita 2014 (arXiv:1404.3747): hook errors along the logical operator halve the distance
    [Theory]
    [InlineData(3)]
    [InlineData(5)]
    [InlineData(7)]
    public void The_wrong_order_of_partners_halves_the_distance(int distance)
    {
        foreach (PauliBasis basis in Enum.GetValues<PauliBasis>())
        {
            Assert.Equal(distance, CircuitDistance.Of(FaultPropagation.Of(TestCircuits.WithOrder(distance, basis, RowLast, ColumnLast)).Graph));
            Assert.Equal((distance + 1) / 2, CircuitDistance.Of(FaultPropagation.Of(TestCircuits.WithOrder(distance, basis, ColumnLast, RowLast)).Graph));
        }
    }

    // the assertion is in Symptom: more than two detectors of a type throw
    [Theory]
    [MemberData(nameof(Memories))]
    public void Every_fault_flips_at_most_two_detectors_of_each_type(int distance, PauliBasis basis)
    {
        foreach (PauliBasis type in Enum.GetValues<PauliBasis>())
        {
            Assert.NotEmpty(FaultPropagation.Of(TextbookCircuit.Of(distance, 3, basis, UniformNoise.EveryPlace(1e-3)), type).Graph.Edges);
            Assert.NotEmpty(FaultPropagation.Of(AtomCircuit.Of(distance, 3, basis, TestCircuits.EverywhereOnAtoms(1e-3)), type).Graph.Edges);
        }
    }

    // own exact enumeration with another implementation
    [Theory]
    [InlineData(1, 8, 23)]
    [InlineData(2, 12, 39)]
    [InlineData(3, 16, 55)]
    [InlineData(4, 20, 71)]
    public void The_textbook_memory_of_distance_3_has_these_detectors_and_mechanisms(int rounds, int detectors, int mechanisms)
    {
        DetectorGraph graph = FaultPropagation.Of(TextbookCircuit.Of(3, rounds, PauliBasis.Z, UniformNoise.EveryPlace(1e-3))).Graph;

        Assert.Equal(detectors, graph.VertexCount);
        Assert.Equal(mechanisms, graph.Edges.Length);
    }

    [Fact]
    public void Without_mechanisms_there_is_no_distance() => Assert.Null(CircuitDistance.Of(new DetectorGraph(3, [])));
}
