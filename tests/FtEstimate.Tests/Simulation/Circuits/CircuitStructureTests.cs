using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Tests.Simulation.Circuits;

public sealed class CircuitStructureTests
{
    public static TheoryData<string, int> Circuits { get; } = Pairs.Of<string, int>(["textbook", "atoms"], [3, 5, 7, 11]);

    [Theory]
    [MemberData(nameof(Circuits))]
    public void Within_a_layer_nothing_is_done_twice_to_an_atom(string name, int distance)
    {
        HashSet<int> busy = [];
        foreach (Operation operation in Noisy(name, distance, PauliBasis.X).Operations)
        {
            if (operation.Kind == OperationKind.EndOfLayer)
            {
                busy.Clear();
            }
            else if (operation.IsDone)
            {
                Assert.True(busy.Add(operation.A), $"{operation.Kind} of {operation.A}");
                Assert.True(operation.B < 0 || busy.Add(operation.B), $"{operation.Kind} of {operation.B}");
            }
        }
    }

    // each of the d² − 1 checks has four partners but the 2(d − 1) on the edges, which have two
    [Theory]
    [MemberData(nameof(Circuits))]
    public void A_round_has_four_times_d_times_d_minus_one_pair_gates(string name, int distance)
    {
        const int Rounds = 3;
        int pairs = Noisy(name, distance, PauliBasis.Z, Rounds).Operations
            .Count(operation => operation.Kind is OperationKind.ControlledX or OperationKind.ControlledZ);

        Assert.Equal(Rounds * 4 * distance * (distance - 1), pairs);
    }

    // docs/method.md, "Why four one-qubit layers": own derivation, to the digit given there. At distance 3 it says 2.2 = 20/9, which is the patch with the
    // types exchanged; counted by hand for this one: corners and centre 2 each, atoms 1 and 7 four, 3 and 5 two, together 22/9
    [Theory]
    [InlineData(3, 2.4)]
    [InlineData(5, 2.6)]
    [InlineData(7, 2.7)]
    [InlineData(11, 2.8)]
    public void Data_atoms_are_turned_as_often_as_the_method_page_says(int distance, double expected)
    {
        Circuit circuit = Noisy("atoms", distance, PauliBasis.Z, rounds: 1);
        int turns = circuit.Operations.Count(operation => operation.Kind == OperationKind.Hadamard && operation.A < distance * distance);

        Assert.Equal(expected, Math.Round((double)turns / (distance * distance), 1));
        Assert.Equal((double)turns / (distance * distance), AtomCircuit.GatesPerDataAtom(new RotatedPatch(distance)), 12);
    }

    // a stabiliser of what was just prepared changes nothing: a detector that noticed it would be random without any error
    [Theory]
    [MemberData(nameof(Circuits))]
    public void No_detector_depends_on_a_random_result(string name, int distance)
    {
        foreach (PauliBasis basis in Enum.GetValues<PauliBasis>())
        {
            Circuit quiet = name == "textbook"
                ? TextbookCircuit.Of(distance, 3, basis, UniformNoise.EveryPlace(0))
                : AtomCircuit.Of(distance, 3, basis, new RoundErrors());
            Circuit randomised = quiet with { Operations = [.. quiet.Operations.SelectMany(WithStabiliser)] };

            Assert.Contains(randomised.Operations, operation => operation.Kind == OperationKind.PauliNoise);
            Assert.Empty(FaultPropagation.Of(randomised, PauliBasis.X).Graph.Edges);
            Assert.Empty(FaultPropagation.Of(randomised, PauliBasis.Z).Graph.Edges);
        }
    }

    // a Z check sits out of the way of the operators of its own patch: rows cross columns once, checks cross both an even number of times
    [Theory]
    [InlineData(3)]
    [InlineData(7)]
    public void Checks_commute_with_each_other_and_with_the_logical_operators(int distance)
    {
        RotatedPatch patch = new(distance);
        int[] Support(PatchCheck check) => [.. Enum.GetValues<Corner>().Select(check.DataAt).OfType<int>()];
        ILookup<PauliBasis, int[]> supports = patch.Checks.ToLookup(check => check.Basis, Support);

        Assert.Equal(supports[PauliBasis.X].Count(), supports[PauliBasis.Z].Count());
        Assert.All(supports[PauliBasis.X], ofX => Assert.All(supports[PauliBasis.Z], ofZ => Assert.Equal(0, ofX.Intersect(ofZ).Count() % 2)));
        Assert.All(supports[PauliBasis.X], ofX => Assert.Equal(0, ofX.Intersect(patch.LogicalZ).Count() % 2));
        Assert.All(supports[PauliBasis.Z], ofZ => Assert.Equal(0, ofZ.Intersect(patch.LogicalX).Count() % 2));
        Assert.Single(patch.LogicalX.Intersect(patch.LogicalZ));
    }

    [Theory]
    [InlineData(2)]
    [InlineData(4)]
    [InlineData(1)]
    public void Even_and_tiny_distances_are_refused(int distance) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new RotatedPatch(distance));

    internal static Circuit Noisy(string name, int distance, PauliBasis basis, int rounds = 2) => name == "textbook"
        ? TextbookCircuit.Of(distance, rounds, basis, UniformNoise.EveryPlace(1e-3))
        : AtomCircuit.Of(distance, rounds, basis, TestCircuits.EverywhereOnAtoms(1e-3));

    private static IEnumerable<Operation> WithStabiliser(Operation operation) => operation.Kind switch
    {
        OperationKind.ResetZ => [operation, new Operation(OperationKind.PauliNoise, operation.A, Channel: new PauliChannel(0, 0, 0.5))],
        OperationKind.ResetX => [operation, new Operation(OperationKind.PauliNoise, operation.A, Channel: new PauliChannel(0.5, 0, 0))],
        _ => [operation],
    };
}
